package railwalk.diagnosis;

import java.util.ArrayList;
import java.util.EnumSet;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import railwalk.circuit.Bottle;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Resistor;
import railwalk.circuit.State;
import railwalk.circuit.StateChange;
import railwalk.device.TubeType;
import railwalk.source.NearNames;
import railwalk.units.Measure;
import railwalk.units.ValueReader;
import railwalk.units.ValueReading;

/** One fault in the words of the bench: a part, then what is wrong with it. */
final class FaultPhrase {
  private static final Pattern PHRASE = Pattern.compile("([^\\s=]+)\\s*(.*)");
  private static final Pattern TIMES = Pattern.compile("[x×*]\\s*(.+)");
  private static final Pattern WITH_VALUE = Pattern.compile("([a-z0-9]*)\\s*=\\s*(.+)");
  private static final Pattern PER_CENT = Pattern.compile("(.+?)\\s*(?:%|per ?cent)");
  private static final String LINE = "line";

  private final String phrase;
  private final Circuit circuit;
  private final List<Fault> all;
  private final List<TubeType> types;
  private String part = "";
  private List<Fault> own = List.of();

  FaultPhrase(String phrase, Circuit circuit, List<Fault> all, List<TubeType> types) {
    this.phrase = phrase.strip();
    this.circuit = circuit;
    this.all = all;
    this.types = types;
  }

  List<StatedFault> read() throws NotAFault {
    Matcher phrased = PHRASE.matcher(phrase);
    if (!phrased.matches()) {
      throw new NotAFault(
          "\"" + phrase + "\" names no part: write a part and its fault, such as \"R5 open\"");
    }
    part = part(phrased.group(1));
    own = ownFaults();
    String typed = phrased.group(2).strip();
    String word = typed.toLowerCase(Locale.ROOT).replaceAll("\\s+", " ");
    Matcher valued = WITH_VALUE.matcher(word);
    if (part.equals(LINE)) {
      String volts = word.replaceFirst("^=\\s*", "");
      return figure("line=VOLTS", volts, Measure.VOLTAGE, FaultKind.LINE_OFF);
    }
    Matcher times = TIMES.matcher(word);
    if (times.matches()) {
      return times(times.group(1));
    }
    if (valued.matches()) {
      String value = typed.substring(typed.indexOf('=') + 1).strip();
      return valued(valued.group(1), value);
    }
    return plain(word);
  }

  /** Returns the part's name as the netlist writes it. */
  private String part(String typed) throws NotAFault {
    Optional<Element> element = circuit.element(typed);
    if (element.isPresent() && element.get().bottle().isEmpty()) {
      return element.get().name();
    }
    Optional<Bottle> bottle = circuit.bottle(typed);
    if (bottle.isPresent()) {
      return bottle.get().name();
    }
    if (element.isPresent()) {
      return element.get().name();
    }
    if (typed.equalsIgnoreCase(LINE)) {
      if (!circuit.line().stated()) {
        throw new NotAFault("\"" + phrase + "\" needs a .line in the netlist");
      }
      return LINE;
    }
    Set<String> names = new LinkedHashSet<>();
    circuit.elements().forEach(e -> names.add(e.name()));
    circuit.bottles().forEach(b -> names.add(b.name()));
    names.add(LINE);
    String hint = NearNames.hint(typed, names);
    throw new NotAFault(
        "no part called " + typed + " in this netlist" + (hint.isEmpty() ? "" : ": " + hint));
  }

  /** Returns the faults of the part, or of a tube and all its sections. */
  private List<Fault> ownFaults() {
    List<Fault> found = new ArrayList<>();
    for (Fault fault : all) {
      boolean section =
          circuit.element(fault.element()).filter(e -> e.bottle().equals(part)).isPresent();
      if (fault.element().equals(part) || section) {
        found.add(fault);
      }
    }
    return found;
  }

  private List<StatedFault> plain(String word) throws NotAFault {
    return switch (word) {
      case "open" ->
          open(
              of(
                  FaultKind.RESISTOR_OPEN,
                  FaultKind.COIL_OPEN,
                  FaultKind.DIODE_OPEN,
                  FaultKind.CONTACT_OPEN,
                  FaultKind.WINDING_OPEN));
      case "short", "shorted" ->
          there(
              of(
                  FaultKind.RESISTOR_SHORTED,
                  FaultKind.CAPACITOR_SHORTED,
                  FaultKind.DIODE_SHORTED,
                  FaultKind.COIL_SHORTED));
      case "dead" -> dead();
      case "out", "pulled" -> pulled();
      case "silicon" -> there(of(FaultKind.SILICON_FITTED));
      case "wiper open" -> there(of(FaultKind.WIPER_OPEN));
      case "dark" -> there(of(FaultKind.REGULATOR_DARK, FaultKind.TUBE_DARK));
      default -> {
        if (word.startsWith("half ")) {
          yield half(word.substring("half ".length()));
        }
        if (word.startsWith("open ")) {
          yield winding(word.substring("open ".length()));
        }
        throw unknown();
      }
    };
  }

  private List<StatedFault> valued(String key, String value) throws NotAFault {
    return switch (key) {
      case "" -> ohms(positive("=VALUE", value, Measure.RESISTANCE));
      case "leak" -> figure("leak=VALUE", value, Measure.RESISTANCE, FaultKind.CAPACITOR_LEAKY);
      case "weak" -> share("weak=SHARE", value, FaultKind.SECTION_WEAK, FaultKind.RECTIFIER_WEAK);
      case "gas" -> figure("gas=AMPS", value, Measure.CURRENT, FaultKind.GRID_CURRENT);
      case "hk" -> figure("hk=VALUE", value, Measure.RESISTANCE, FaultKind.HEATER_LEAK);
      case "g2g1" -> figure("g2g1=VALUE", value, Measure.RESISTANCE, FaultKind.SCREEN_SHORT);
      case "turns" -> share("turns=SHARE", value, FaultKind.TURNS_SHORTED);
      case "type" -> type(value);
      default -> throw unknown();
    };
  }

  private List<Fault> of(FaultKind first, FaultKind... more) {
    EnumSet<FaultKind> kinds = EnumSet.of(first, more);
    List<Fault> found = new ArrayList<>();
    for (Fault fault : own) {
      if (kinds.contains(fault.kind())) {
        found.add(fault);
      }
    }
    return found;
  }

  private List<StatedFault> there(List<Fault> found) throws NotAFault {
    if (found.isEmpty()) {
      throw unknown();
    }
    return StatedFault.each(found, Double.NaN);
  }

  private List<StatedFault> open(List<Fault> found) throws NotAFault {
    if (found.size() > 1) {
      throw new NotAFault(
          "\""
              + phrase
              + "\": which half? Name the end that is off: \""
              + part
              + " open "
              + windingEnds().iterator().next()
              + "\"; ends are "
              + String.join(", ", windingEnds()));
    }
    return there(found);
  }

  private Set<String> windingEnds() {
    Set<String> ends = new LinkedHashSet<>();
    for (Fault fault : of(FaultKind.WINDING_OPEN)) {
      ends.addAll(List.of(fault.detail().split(" to ", 2)));
    }
    return ends;
  }

  private List<StatedFault> winding(String end) throws NotAFault {
    List<Fault> found = new ArrayList<>();
    for (Fault fault : of(FaultKind.WINDING_OPEN)) {
      List<String> ends = List.of(fault.detail().toLowerCase(Locale.ROOT).split(" to ", 2));
      if (ends.contains(end) || fault.detail().equalsIgnoreCase(end)) {
        found.add(fault);
      }
    }
    if (found.size() != 1) {
      Set<String> halves = new LinkedHashSet<>();
      of(FaultKind.WINDING_OPEN).forEach(f -> halves.add("open " + f.detail()));
      throw halves.isEmpty() ? unknown() : saying(halves);
    }
    return there(found);
  }

  private List<StatedFault> half(String plate) throws NotAFault {
    for (Fault fault : of(FaultKind.RECTIFIER_HALF)) {
      if (fault.detail().equalsIgnoreCase(plate)) {
        return there(List.of(fault));
      }
    }
    throw unknown();
  }

  private List<StatedFault> dead() throws NotAFault {
    boolean tube = circuit.bottle(part).isPresent();
    return there(tube ? of(FaultKind.TUBE_DARK) : of(FaultKind.SECTION_DEAD));
  }

  private List<StatedFault> pulled() throws NotAFault {
    if (circuit.bottle(part).isEmpty()) {
      throw unknown();
    }
    String tube = part;
    State out = new State(tube, List.of(new StateChange.TubeOut(tube)));
    return there(
        List.of(
            new Fault(
                FaultKind.TUBE_DARK,
                tube,
                StatedFault.PULLED,
                Range.NONE,
                (c, none) -> c.inState(out))));
  }

  private List<StatedFault> type(String name) throws NotAFault {
    Optional<Bottle> bottle = circuit.bottle(part);
    if (bottle.isEmpty()) {
      throw unknown();
    }
    for (Fault fault : of(FaultKind.OTHER_TYPE)) {
      if (fault.detail().equalsIgnoreCase(name)) {
        return there(List.of(fault));
      }
    }
    List<String> names = new ArrayList<>();
    for (TubeType type : types) {
      names.add(type.name());
      if (type.name().equalsIgnoreCase(name)) {
        return there(List.of(fitted(bottle.get(), type)));
      }
    }
    String near = NearNames.hint(name, names);
    throw new NotAFault(
        "\""
            + phrase
            + "\": no type "
            + name
            + " on file"
            + (near.isEmpty() ? "" : ": " + near)
            + "; 'railwalk tubes' lists all");
  }

  private Fault fitted(Bottle bottle, TubeType type) throws NotAFault {
    TubeType own = bottle.type();
    if (bottle.pins().isEmpty() || type.pins().isEmpty()) {
      throw new NotAFault("\"" + phrase + "\": pins are not known, so no other type can be fitted");
    }
    if (!type.family().equalsIgnoreCase(own.family())) {
      throw new NotAFault(
          "\""
              + phrase
              + "\": a "
              + type.name()
              + " is no "
              + own.family()
              + " like the "
              + own.name());
    }
    State state = new State(type.name(), List.of(new StateChange.TubeFitted(bottle.name(), type)));
    return new Fault(
        FaultKind.OTHER_TYPE, part, type.name(), Range.NONE, (c, none) -> c.inState(state));
  }

  private List<StatedFault> times(String factor) throws NotAFault {
    double times = positive("xN", factor, Measure.NUMBER);
    Optional<Element> element = circuit.element(part);
    if (element.isPresent() && element.get() instanceof Resistor r) {
      return ohms(times * r.ohms());
    }
    throw unknown();
  }

  private List<StatedFault> ohms(double ohms) throws NotAFault {
    boolean low =
        circuit.element(part).filter(e -> e instanceof Resistor r && ohms < r.ohms()).isPresent();
    List<Fault> found = of(low ? FaultKind.RESISTOR_LOW : FaultKind.RESISTOR_HIGH);
    there(found);
    return StatedFault.each(found, ohms);
  }

  private List<StatedFault> figure(String form, String value, Measure measure, FaultKind kind)
      throws NotAFault {
    there(of(kind));
    return StatedFault.each(of(kind), positive(form, value, measure));
  }

  private List<StatedFault> share(String form, String value, FaultKind kind, FaultKind... more)
      throws NotAFault {
    there(of(kind, more));
    Matcher perCent = PER_CENT.matcher(value);
    double share =
        perCent.matches()
            ? positive(form, perCent.group(1), Measure.NUMBER) / 100
            : positive(form, value, Measure.NUMBER);
    if (share > 1) {
      throw new NotAFault(
          "\"" + phrase + "\": " + form + " is a share up to 1, or per cent: 0.5 or 50%");
    }
    return StatedFault.each(of(kind, more), share);
  }

  private double positive(String form, String value, Measure measure) throws NotAFault {
    ValueReading reading = ValueReader.read(value, measure);
    if (reading instanceof ValueReading.Value v
        && v.amount() > 0
        && !v.remarks().contains(ValueReading.Remark.LETTERS_IGNORED)) {
      return v.amount();
    }
    String hint = reading instanceof ValueReading.Refused refused ? refused.hint() : "";
    throw new NotAFault(
        "\""
            + phrase
            + "\": "
            + (value.isEmpty() ? "nothing" : value)
            + " is no figure above zero for "
            + form
            + (hint.isEmpty() ? "" : ": " + hint));
  }

  private NotAFault unknown() {
    Set<String> forms = new LinkedHashSet<>();
    for (Fault fault : own) {
      form(fault).ifPresent(forms::add);
    }
    if (circuit.bottle(part).isPresent()) {
      forms.add("out");
      forms.add("type=TYPE");
    }
    return saying(forms);
  }

  private NotAFault saying(Set<String> forms) {
    return new NotAFault(
        "\""
            + phrase
            + "\": "
            + (forms.isEmpty()
                ? "no fault of " + part + " shows at DC"
                : part + " can be: " + String.join(", ", forms)));
  }

  /** Returns how a fault is written behind its part; empty for one that has no words. */
  private Optional<String> form(Fault fault) {
    return switch (fault.kind()) {
      case RESISTOR_OPEN ->
          fault.detail().isEmpty() || of(FaultKind.WIPER_OPEN).isEmpty()
              ? Optional.of("open")
              : Optional.empty();
      case COIL_OPEN, DIODE_OPEN, CONTACT_OPEN -> Optional.of("open");
      case RESISTOR_SHORTED, CAPACITOR_SHORTED, DIODE_SHORTED, COIL_SHORTED ->
          Optional.of("shorted");
      case RESISTOR_HIGH, RESISTOR_LOW -> Optional.of("xN, =VALUE");
      case WIPER_OPEN -> Optional.of("wiper open");
      case CAPACITOR_LEAKY -> Optional.of("leak=VALUE");
      case SECTION_DEAD -> Optional.of("dead");
      case TUBE_DARK -> Optional.of("dead");
      case SECTION_WEAK, RECTIFIER_WEAK -> Optional.of("weak=SHARE");
      case GRID_CURRENT -> Optional.of("gas=AMPS");
      case HEATER_LEAK -> Optional.of("hk=VALUE");
      case SCREEN_SHORT -> Optional.of("g2g1=VALUE");
      case OTHER_TYPE -> Optional.of("type=TYPE");
      case RECTIFIER_HALF -> Optional.of("half " + fault.detail());
      case SILICON_FITTED -> Optional.of("silicon");
      case REGULATOR_DARK -> Optional.of("dark");
      case WINDING_OPEN ->
          Optional.of(of(FaultKind.WINDING_OPEN).size() > 1 ? "open NODE" : "open");
      case TURNS_SHORTED -> Optional.of("turns=SHARE");
      case LINE_OFF -> Optional.of("line=VOLTS");
      case BOARD_LEAK, PINS_EXCHANGED, WRONG_SUPPLY -> Optional.empty();
    };
  }
}
