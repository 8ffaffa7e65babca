package railwalk.netlist;

import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.regex.Pattern;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Diode;
import railwalk.circuit.Node;
import railwalk.device.SiliconLaw;
import railwalk.device.TwoPoleLaw;
import railwalk.device.ZenerLaw;
import railwalk.units.Measure;
import railwalk.units.ValueReader;

/** Reads D lines: silicon by type or {@code .model}, {@code ZENER 12V}, {@code SELENIUM 130V}. */
final class DiodeReader {
  private static final Pattern MAYBE_ZENER =
      Pattern.compile("1N(47[2-6]\\d|53[3-8]\\d|52[2-8]\\d).*|BZ[XYTV].*");

  /** Rectifiers of the class that the generic law is drawn from. */
  private static final Pattern USUAL_RECTIFIER =
      Pattern.compile("1N400[1-7]|1N540[0-8]|UF400[1-7]|SILICON");

  /** kT/q at 300.15 K, SPICE's nominal temperature (CODATA k and q). */
  private static final double THERMAL_VOLTS = 0.025865;

  /** SPICE's own values where a diode model gives none. */
  private static final double DEFAULT_SATURATION_AMPS = 1e-14;

  private static final double DEFAULT_STRAIGHT_AMPS = 1;

  /** A breakdown above this is a rectifier's rating, not a regulator's volts. */
  private static final double HIGHEST_ZENER_VOLTS = 200;

  /**
   * Slope of a zener diode: {@code 0.035 · V²} ohm, at least 5 ohm. Close to 1 W types at their
   * test current, 5 ohm to 9 ohm at 12 V and 350 ohm at 100 V (from memory of such sheets).
   */
  private static final double SLOPE_OHMS_PER_SQUARE_VOLT = 0.035;

  private static final double LEAST_SLOPE_OHMS = 5;

  /** Volts rms that one selenium plate holds off, and what it drops at its rated current. */
  private static final double SELENIUM_RMS_PER_CELL = 26;

  private static final double SELENIUM_DROP_PER_CELL = 1;
  private static final double SELENIUM_SLOPE_VOLTS = 0.25;
  private static final double USUAL_SELENIUM_VOLTS = 130;
  private static final double USUAL_SELENIUM_AMPS = 0.1;

  private DiodeReader() {}

  static void diode(PartCard part) {
    List<Node> nodes = part.nodes(2);
    if (nodes == null) {
      return;
    }
    Word type = part.next();
    TwoPoleLaw law;
    if (type == null) {
      part.report().gather(Problem.DIODE_GENERIC, part.span(), part.name());
      law = SiliconLaw.generic();
    } else if (type.is("ZENER")) {
      law = zener(part);
    } else if (type.is("SELENIUM")) {
      law = selenium(part);
    } else {
      law = byName(part, type);
    }
    if (law == null) {
      return;
    }
    part.words().removeIf(word -> ValueReader.statedMeasure(word.text()).isPresent());
    part.done();
    String typeName = type == null ? "silicon" : type.text();
    part.draft()
        .add(new Diode(part.name(), nodes.get(0), nodes.get(1), typeName, law), part.span());
  }

  private static @Nullable TwoPoleLaw zener(PartCard part) {
    Word voltsWord = part.valueWord(Measure.VOLTAGE, "volts");
    if (voltsWord == null) {
      return null;
    }
    double volts = part.readPositive(voltsWord, Measure.VOLTAGE);
    Word slope = part.option("rz");
    return new ZenerLaw(
        volts, slope == null ? zenerOhms(volts) : part.readPositive(slope, Measure.RESISTANCE));
  }

  private static double zenerOhms(double volts) {
    return Math.max(LEAST_SLOPE_OHMS, SLOPE_OHMS_PER_SQUARE_VOLT * volts * volts);
  }

  /**
   * A selenium stack: one cell for every 26 V rms it stands, each dropping 1 V at the rated current
   * (common practice: about 5 V for a 130 V stack when new, more with age).
   */
  private static TwoPoleLaw selenium(PartCard part) {
    Word voltsWord = stated(part, Measure.VOLTAGE);
    Word ampsWord = stated(part, Measure.CURRENT);
    double volts =
        voltsWord == null ? USUAL_SELENIUM_VOLTS : part.readPositive(voltsWord, Measure.VOLTAGE);
    double amps =
        ampsWord == null ? USUAL_SELENIUM_AMPS : part.readPositive(ampsWord, Measure.CURRENT);
    double cells = Math.max(1, Math.ceil(volts / SELENIUM_RMS_PER_CELL));
    double saturation = amps / Math.expm1(SELENIUM_DROP_PER_CELL / SELENIUM_SLOPE_VOLTS);
    return new SiliconLaw(saturation, cells * SELENIUM_SLOPE_VOLTS, amps);
  }

  private static @Nullable Word stated(PartCard part, Measure measure) {
    for (Word word : part.words()) {
      if (ValueReader.statedMeasure(word.text()).filter(m -> m == measure).isPresent()) {
        part.words().remove(word);
        return word;
      }
    }
    return null;
  }

  private static TwoPoleLaw byName(PartCard part, Word type) {
    Card model = part.draft().model(type.text());
    if (model != null) {
      return byModel(part, type, model);
    }
    String upper = type.text().toUpperCase(Locale.ROOT);
    if (MAYBE_ZENER.matcher(upper).matches()) {
      part.report().add(Problem.DIODE_MAYBE_ZENER, type.span(), type.text());
    } else if (!USUAL_RECTIFIER.matcher(upper).matches()) {
      part.report().gather(Problem.DIODE_GENERIC, type.span(), part.name());
    }
    return SiliconLaw.generic();
  }

  private static TwoPoleLaw byModel(PartCard part, Word type, Card model) {
    Map<String, Word> constants = new HashMap<>();
    boolean diode = false;
    for (Field field : model.fields()) {
      if (field instanceof Field.Call call && call.name().is("D")) {
        diode = true;
        call.arguments().stream()
            .filter(Field.Option.class::isInstance)
            .map(Field.Option.class::cast)
            .forEach(o -> constants.put(o.key().text().toLowerCase(Locale.ROOT), o.value()));
      } else if (field instanceof Field.Option option) {
        constants.put(option.key().text().toLowerCase(Locale.ROOT), option.value());
      } else {
        diode |= field.first().is("D");
      }
    }
    if (!diode || constants.isEmpty()) {
      part.report().gather(Problem.DIODE_GENERIC, type.span(), part.name());
      return SiliconLaw.generic();
    }
    double breakdown = constant(part, constants, "bv", Double.POSITIVE_INFINITY);
    if (breakdown <= HIGHEST_ZENER_VOLTS) {
      return new ZenerLaw(breakdown, zenerOhms(breakdown));
    }
    if (!constants.containsKey("is")) {
      part.report().gather(Problem.DIODE_GENERIC, type.span(), part.name());
      return SiliconLaw.generic();
    }
    double saturation = constant(part, constants, "is", DEFAULT_SATURATION_AMPS);
    double slopeVolts = THERMAL_VOLTS * constant(part, constants, "n", 1);
    double bulkOhms = constant(part, constants, "rs", 0);
    double straight =
        bulkOhms > 0
            ? Math.min(DEFAULT_STRAIGHT_AMPS, slopeVolts / bulkOhms)
            : DEFAULT_STRAIGHT_AMPS;
    return new SiliconLaw(saturation, slopeVolts, straight);
  }

  private static double constant(
      PartCard part, Map<String, Word> constants, String key, double usual) {
    Word word = constants.get(key);
    if (word == null) {
      return usual;
    }
    double value = part.draft().values().number(word, part.draft().globalScope());
    if (value <= 0) {
      part.report().add(Problem.MODEL_CONSTANT, word.span(), key, word.text());
    }
    return value;
  }
}
