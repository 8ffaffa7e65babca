package railwalk.netlist;

import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.OptionalInt;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Fuse;
import railwalk.circuit.GlowLamp;
import railwalk.circuit.Lamp;
import railwalk.circuit.Node;
import railwalk.circuit.Potentiometer;
import railwalk.circuit.Switch;
import railwalk.device.GasLaw;
import railwalk.units.Measure;

/** Reads X lines of parts by keyword: POT, SWITCH, FUSE, LAMP, and neon lamps by their number. */
final class Switchgear {
  /** The words that make an X line one of these parts. */
  static final List<String> KEYWORDS = List.of("POT", "SWITCH", "FUSE", "LAMP");

  /**
   * Neon lamps: strike and maintaining volts, 0.1 mA to the rated current. Strike and maintaining
   * volts from the GE glow lamp manual; the slope from memory (some volts between the two
   * currents).
   */
  private static final Map<String, GasLaw> NEON_LAMPS =
      Map.of(
          "NE2", new GasLaw(90, 60, 0.3e-3, 8e3, 0.1e-3, 0.6e-3),
          "NE2H", new GasLaw(135, 70, 1.0e-3, 4e3, 0.3e-3, 1.9e-3),
          "NE51", new GasLaw(90, 60, 0.2e-3, 8e3, 0.1e-3, 0.3e-3),
          "NEON", new GasLaw(90, 60, 0.3e-3, 8e3, 0.1e-3, 0.6e-3));

  private static final Pattern TAPERED = Pattern.compile("[ABC]?(\\d+(?:\\.\\d+)?[kKM])[ABC]?");

  private Switchgear() {}

  /** Returns the law of the neon lamp called {@code name}; null when it is none. */
  static @Nullable GasLaw neonLaw(String name) {
    return NEON_LAMPS.get(name.toUpperCase(Locale.ROOT).replace("-", ""));
  }

  /** Reads a line whose keyword stands at {@code index} among its words. */
  static void read(PartCard part, int index) {
    String keyword = part.words().get(index).text().toUpperCase(Locale.ROOT);
    switch (keyword) {
      case "POT" -> pot(part, index);
      case "SWITCH" -> contact(part, index);
      case "FUSE" -> fuse(part, index);
      default -> lamp(part, index);
    }
  }

  private static void pot(PartCard part, int count) {
    if (count != 3) {
      part.report().add(Problem.POT_NODES, part.span(), part.name(), count);
      return;
    }
    List<Node> nodes = part.nodes(3);
    part.accept("POT");
    Word value = nodes == null ? null : part.valueWord(Measure.RESISTANCE, "r");
    if (nodes == null || value == null) {
      return;
    }
    double ohms = part.ohms(withoutTaper(value), "resistance");
    if (ohms == 0) {
      part.report().add(Problem.ZERO_VALUE, value.span(), part.name(), Measure.RESISTANCE.words());
    }
    Word set = part.option("set");
    double share = 0.5;
    if (set == null) {
      part.report().gather(Problem.POT_SET_ASSUMED, part.span(), part.name());
    } else {
      share = share(part, set);
    }
    part.words().clear();
    part.done();
    part.draft()
        .add(
            new Potentiometer(part.name(), nodes.get(0), nodes.get(1), nodes.get(2), ohms, share),
            part.span());
  }

  /** Returns the value without the taper letter that controls are marked with: A500k, 1MA. */
  private static Word withoutTaper(Word value) {
    Matcher marked = TAPERED.matcher(value.text());
    return marked.matches() ? new Word(marked.group(1), value.span(), value.form()) : value;
  }

  /** Returns a control's setting, 0 to 1. */
  private static double share(PartCard part, Word set) {
    double share = part.read(set, Measure.SHARE);
    if (share < 0 || share > 1) {
      part.report().add(Problem.POT_SET_RANGE, set.span(), set.text());
      return 0.5;
    }
    return share;
  }

  private static void contact(PartCard part, int count) {
    if (count < 2) {
      part.report().add(Problem.NODES_MISSING, part.span(), part.name(), 2, count);
      return;
    }
    List<Node> nodes = part.nodes(count);
    part.accept("SWITCH");
    Word word = part.next();
    if (nodes == null || word == null) {
      part.report().add(Problem.SWITCH_POSITION_MISSING, part.end(), part.name());
      return;
    }
    OptionalInt position = position(word, count - 1);
    if (position.isEmpty()) {
      part.report().add(Problem.SWITCH_POSITION, word.span(), word.text(), part.name(), count - 1);
      return;
    }
    part.done();
    part.draft()
        .add(
            new Switch(part.name(), nodes.get(0), nodes.subList(1, count), position.getAsInt()),
            part.span());
  }

  /** Returns the contact that {@code word} puts a switch of {@code poles} contacts on. */
  static OptionalInt position(Word word, int poles) {
    if (word.is("open") || word.is("off")) {
      return OptionalInt.of(0);
    }
    if ((word.is("closed") || word.is("on")) && poles == 1) {
      return OptionalInt.of(1);
    }
    for (int position = 0; position <= poles; position++) {
      if (word.is(String.valueOf(position))) {
        return OptionalInt.of(position);
      }
    }
    return OptionalInt.empty();
  }

  private static void fuse(PartCard part, int count) {
    List<Node> nodes = twoNodes(part, count);
    part.accept("FUSE");
    if (nodes == null) {
      return;
    }
    Word rated = part.next();
    double amps = Double.NaN;
    if (rated == null) {
      part.report().add(Problem.FUSE_UNRATED, part.end(), part.name());
    } else {
      amps = part.readPositive(rated, Measure.CURRENT);
    }
    part.words().clear();
    part.done();
    part.draft().add(new Fuse(part.name(), nodes.get(0), nodes.get(1), amps), part.span());
  }

  private static void lamp(PartCard part, int count) {
    List<Node> nodes = twoNodes(part, count);
    part.accept("LAMP");
    Word voltsWord = nodes == null ? null : part.next();
    Word currentWord = part.next();
    if (nodes == null) {
      return;
    }
    if (voltsWord == null || currentWord == null) {
      part.report().add(Problem.LAMP_RATING, part.end(), part.name());
      return;
    }
    double volts = part.readPositive(voltsWord, Measure.VOLTAGE);
    boolean watts = currentWord.text().toUpperCase(Locale.ROOT).endsWith("W");
    double amps =
        watts
            ? part.readPositive(currentWord, Measure.POWER) / volts
            : part.readPositive(currentWord, Measure.CURRENT);
    if (volts == 0 || amps == 0) {
      part.report().add(Problem.LAMP_RATING, voltsWord.span(), part.name());
    }
    part.done();
    part.draft().add(new Lamp(part.name(), nodes.get(0), nodes.get(1), volts, amps), part.span());
  }

  /** Reads a neon lamp whose type word is the last one left. */
  static void neon(PartCard part, Word type, GasLaw law) {
    List<Node> nodes = twoNodes(part, part.words().size());
    if (nodes == null) {
      return;
    }
    part.done();
    part.draft()
        .add(new GlowLamp(part.name(), nodes.get(0), nodes.get(1), type.text(), law), part.span());
  }

  private static @Nullable List<Node> twoNodes(PartCard part, int count) {
    if (count != 2) {
      part.report().add(Problem.NODES_MISSING, part.span(), part.name(), 2, count);
      return null;
    }
    return part.nodes(2);
  }
}
