package railwalk.readings;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.regex.Pattern;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Bottle;
import railwalk.circuit.Circuit;
import railwalk.circuit.State;
import railwalk.circuit.Switch;
import railwalk.source.NearNames;

/** Finds the state that a sheet names. */
final class StateFinder {
  private static final String STANDBY = "standby";
  private static final String VALVES_OUT = "valves out";
  private static final Pattern BLANKS = Pattern.compile("[\\s_-]+");

  private final Circuit circuit;

  StateFinder(Circuit circuit) {
    this.circuit = circuit;
  }

  /**
   * Returns the name of the state in {@code cell}, in any case, as the netlist has it; empty for
   * the amplifier as its netlist stands, which is also where ohms are read.
   */
  String state(Cell cell, ReadingKind kind) throws RowRefused {
    if (cell.isEmpty()) {
      return "";
    }
    String state = find(cell.text());
    if (kind == ReadingKind.OHMS) {
      if (!Reading.TUBES_OUT.equals(state)) {
        throw new RowRefused(SheetProblem.OHMS_STATE, cell.span(), cell.text());
      }
      return "";
    }
    if (state == null) {
      throw unknown(cell);
    }
    return state;
  }

  private @Nullable String find(String written) {
    String wanted = key(written);
    for (State state : circuit.states()) {
      if (key(state.name()).equals(wanted)) {
        return state.name();
      }
    }
    for (Bottle bottle : circuit.bottles()) {
      String name = key(bottle.name());
      if (wanted.equals(name + " pulled") || wanted.equals(name + " out")) {
        return Reading.pulled(bottle.name());
      }
    }
    boolean out = wanted.equals(Reading.TUBES_OUT) || wanted.equals(VALVES_OUT);
    return out ? Reading.TUBES_OUT : null;
  }

  private RowRefused unknown(Cell cell) {
    if (key(cell.text()).equals(STANDBY)) {
      List<Switch> switches = circuit.elements(Switch.class);
      String example = switches.isEmpty() ? "S1" : switches.get(0).name();
      return new RowRefused(
          SheetProblem.STANDBY_UNKNOWN, cell.span(), ".state standby " + example + "=open");
    }
    List<String> names = new ArrayList<>();
    circuit.states().forEach(state -> names.add(state.name()));
    names.add(Reading.TUBES_OUT);
    String near = NearNames.hint(cell.text(), names);
    String all = "known: " + String.join(", ", names) + "; empty is the amplifier as it stands";
    return new RowRefused(
        SheetProblem.STATE_UNKNOWN, cell.span(), cell.text(), near.isEmpty() ? all : near);
  }

  private static String key(String name) {
    return BLANKS.matcher(name.strip()).replaceAll(" ").toLowerCase(Locale.ROOT);
  }
}
