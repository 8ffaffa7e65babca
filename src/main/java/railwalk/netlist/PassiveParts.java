package railwalk.netlist;

import java.util.List;
import java.util.Locale;
import java.util.regex.Pattern;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Coupling;
import railwalk.circuit.CurrentSource;
import railwalk.circuit.Inductor;
import railwalk.circuit.Node;
import railwalk.circuit.Resistor;
import railwalk.circuit.Wire;
import railwalk.source.NearNames;
import railwalk.units.Measure;
import railwalk.units.ValueReader;
import railwalk.units.ValueReading;

/** Reads resistors, capacitors, coils, couplings and current sources. */
final class PassiveParts {
  /** Safety classes of line-to-chassis capacitors (IEC 60384-14), also as X1Y2. */
  private static final Pattern LINE_TO_CHASSIS_CLASS = Pattern.compile("(X[123])?/?Y[1234]");

  /** Safety classes of capacitors across the line: not fit from line to chassis. */
  private static final Pattern ACROSS_LINE_CLASS = Pattern.compile("X[123]");

  private PassiveParts() {}

  static void resistor(PartCard part) {
    List<Node> nodes = part.nodes(2);
    Word value = nodes == null ? null : part.valueWord(Measure.RESISTANCE, "r");
    if (nodes == null || value == null) {
      return;
    }
    double ohms;
    double tolerance = Double.NaN;
    if (value.isUnknown()) {
      ohms = part.ohms(value, "resistance");
    } else {
      Values.Figure figure =
          part.draft()
              .values()
              .figure(value, Measure.RESISTANCE, part.name(), part.frame().scope());
      ohms = figure.amount();
      tolerance = figure.tolerance();
      if (ohms < 0) {
        part.report()
            .add(Problem.NEGATIVE_VALUE, value.span(), value.text(), Measure.RESISTANCE.words());
      }
    }
    Word powerWord = rating(part, Measure.POWER, "watts", "power");
    double watts = powerWord == null ? Double.NaN : positiveRating(part, powerWord, Measure.POWER);
    Word toleranceWord = rating(part, Measure.SHARE, "tol", "tolerance");
    if (toleranceWord != null) {
      tolerance = positiveRating(part, toleranceWord, Measure.SHARE);
    }
    rating(part, Measure.VOLTAGE);
    secondValue(part, value, Measure.RESISTANCE);
    part.done();
    Node a = nodes.get(0);
    Node b = nodes.get(1);
    if (ohms == 0) {
      part.report().add(Problem.RESISTOR_IS_WIRE, value.span(), part.name());
      part.draft().add(new Wire(part.name(), a, b, ""), part.span());
    } else {
      part.draft().add(new Resistor(part.name(), a, b, ohms, watts, tolerance), part.span());
    }
  }

  static void capacitor(PartCard part) {
    List<Node> nodes = part.nodes(2);
    Word value = nodes == null ? null : part.valueWord(Measure.CAPACITANCE, "c");
    if (nodes == null || value == null) {
      return;
    }
    double farads = part.readPositive(value, Measure.CAPACITANCE);
    if (farads == 0) {
      part.report().add(Problem.ZERO_VALUE, value.span(), part.name(), Measure.CAPACITANCE.words());
    }
    Word ratedWord = rating(part, Measure.VOLTAGE, "volts");
    double volts =
        ratedWord == null ? Double.NaN : positiveRating(part, ratedWord, Measure.VOLTAGE);
    rating(part, Measure.SHARE, "tol", "tolerance");
    boolean safe = part.words().removeIf(PassiveParts::isSafetyMark);
    part.words().removeIf(PassiveParts::isAcrossLineMark);
    secondValue(part, value, Measure.CAPACITANCE);
    Word leak = part.option("leak");
    double leakOhms = Double.POSITIVE_INFINITY;
    if (leak != null) {
      leakOhms = part.readPositive(leak, Measure.RESISTANCE);
      if (leakOhms == 0) {
        part.report().add(Problem.ZERO_VALUE, leak.span(), part.name(), Measure.RESISTANCE.words());
      }
    }
    part.option("ic");
    part.done();
    part.draft()
        .add(
            new Capacitor(part.name(), nodes.get(0), nodes.get(1), farads, volts, leakOhms, safe),
            part.span());
  }

  private static boolean isSafetyMark(Word word) {
    String upper = word.text().toUpperCase(Locale.ROOT);
    return LINE_TO_CHASSIS_CLASS.matcher(upper).matches() || upper.equals("SAFETY");
  }

  private static boolean isAcrossLineMark(Word word) {
    return ACROSS_LINE_CLASS.matcher(word.text().toUpperCase(Locale.ROOT)).matches();
  }

  static void coil(PartCard part) {
    List<Node> nodes = part.nodes(2);
    if (nodes == null) {
      return;
    }
    Word ohmsWord = rating(part, Measure.RESISTANCE, "rdc", "dcr", "r");
    rating(part, Measure.CURRENT);
    rating(part, Measure.SHARE);
    Word value = part.option("l");
    value = value == null ? part.next() : value;
    double henries =
        value == null || value.isUnknown()
            ? Double.NaN
            : part.readPositive(value, Measure.INDUCTANCE);
    if (value != null) {
      secondValue(part, value, Measure.INDUCTANCE);
    }
    double ohms = Double.NaN;
    if (ohmsWord == null) {
      part.report().add(Problem.COIL_WITHOUT_RESISTANCE, part.span(), part.name());
    } else {
      ohms = part.ohms(ohmsWord, "winding resistance");
    }
    part.option("ic");
    part.done();
    part.draft()
        .add(new Inductor(part.name(), nodes.get(0), nodes.get(1), henries, ohms), part.span());
  }

  static void currentSource(PartCard part) {
    List<Node> nodes = part.nodes(2);
    if (nodes == null) {
      return;
    }
    Signals signals = Signals.take(part, Measure.CURRENT);
    if (!signals.given()) {
      part.report()
          .add(
              Problem.VALUE_MISSING,
              part.end(),
              part.name(),
              Measure.CURRENT.words(),
              Measure.CURRENT.example());
      return;
    }
    signals.noteSignal(part);
    part.done();
    part.draft()
        .add(new CurrentSource(part.name(), nodes.get(0), nodes.get(1), signals.dc()), part.span());
  }

  static void coupling(PartCard part) {
    List<Word> words = List.copyOf(part.words());
    if (words.size() < 3) {
      part.report().add(Problem.COUPLING_SHORT, part.span(), part.name());
      return;
    }
    part.words().clear();
    Word last = words.get(words.size() - 1);
    double factor = part.read(last, Measure.NUMBER);
    if (factor < -1 || factor > 1) {
      part.report().add(Problem.COUPLING_FACTOR, last.span(), last.text());
    }
    part.done();
    part.report().gather(Problem.COUPLED_COILS, part.span(), part.name());
    for (int i = 0; i + 2 < words.size(); i++) {
      String suffix = i == 0 ? "" : ":" + (i + 1);
      String first = coil(part, words.get(i));
      String second = coil(part, words.get(i + 1));
      part.draft().add(new Coupling(part.name() + suffix, first, second, factor), part.span());
    }
  }

  private static String coil(PartCard part, Word word) {
    String name = part.frame().part(word.text());
    part.draft()
        .later(
            () -> {
              if (part.draft().element(name).isEmpty()) {
                part.report()
                    .add(
                        Problem.NO_SUCH_PART,
                        word.span(),
                        name,
                        NearNames.hint(name, part.draft().names()));
              }
            });
    return name;
  }

  /** Refuses a second value: most often a node too many stands before the first. */
  private static void secondValue(PartCard part, Word value, Measure measure) {
    Word word = part.peek();
    if (word == null) {
      return;
    }
    boolean second =
        word.isExpression() || ValueReader.read(word.text(), measure) instanceof ValueReading.Value;
    if (second) {
      part.report().add(Problem.TWO_VALUES, word.span(), part.name(), value.text(), word.text());
      part.words().remove(0);
    }
  }

  /** Takes the rating of that measure: by key, or the first bare word with such a unit. */
  private static @Nullable Word rating(PartCard part, Measure measure, String... keys) {
    Word keyed = part.option(keys);
    if (keyed != null) {
      return keyed;
    }
    for (int i = 0; i < part.words().size(); i++) {
      Word word = part.words().get(i);
      boolean stated =
          !word.isExpression()
              && ValueReader.statedMeasure(word.text()).filter(m -> m == measure).isPresent();
      if (stated) {
        return part.words().remove(i);
      }
    }
    return null;
  }

  private static double positiveRating(PartCard part, Word word, Measure measure) {
    double amount = part.readPositive(word, measure);
    if (amount == 0) {
      part.report().add(Problem.ZERO_VALUE, word.span(), part.name(), measure.words());
    }
    return amount;
  }
}
