package railwalk.netlist;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Line;
import railwalk.circuit.Node;
import railwalk.circuit.Transformer;
import railwalk.circuit.Winding;
import railwalk.source.NearNames;
import railwalk.source.SourceSpan;
import railwalk.units.Measure;

/**
 * Reads a transformer winding, tapped or not, or the wall outlet.
 *
 * <p>{@code RMS 325-60-0-325} on four nodes: each figure is the volts from the tap marked 0. With
 * {@code load=} the figures are nameplate volts at that current, and the open-circuit volts are
 * {@code V + I · (R + Rp · (V / Vp)²)}: R the winding's resistance from the tap marked 0, Rp and Vp
 * resistance and volts of the primary of the transformer named by {@code on=}.
 *
 * <p>{@code amps=} is the greatest current rms that the winding's wire is made for; {@code load=}
 * says nothing of that, since a nameplate gives direct current for a high-voltage winding.
 *
 * <p>The wall outlet is a winding called LINE, WALL or MAINS (with anything around it), or a plain
 * two-node one with neither {@code on=} nor {@code rdc=}, {@code at=}, {@code load=} whose volts
 * are within 5 % of the line's, or are usual line volts where there is no {@code .line}.
 */
final class WindingReader {
  private static final Pattern WALL_NAME = Pattern.compile(".*(LINE|WALL|MAINS).*");
  private static final Pattern CENTRE_TAPPED =
      Pattern.compile("([\\d.]+)\\s*V?-?CT", Pattern.CASE_INSENSITIVE);
  private static final double NEAR_THE_LINE = 0.05;
  private static final double HERTZ_TOLERANCE = 0.5;

  private final PartCard part;
  private final List<Node> nodes;

  private WindingReader(PartCard part, List<Node> nodes) {
    this.part = part;
    this.nodes = nodes;
  }

  /** Reads {@code nodes… RMS figures}; {@code rmsIndex} is where the keyword stands. */
  static void read(PartCard part, int rmsIndex) {
    List<Node> nodes = part.nodes(rmsIndex);
    part.accept("RMS");
    Word figures = part.next();
    if (nodes == null || figures == null) {
      part.report()
          .add(
              Problem.VALUE_MISSING,
              part.end(),
              part.name(),
              Measure.VOLTAGE.words(),
              "RMS 325 or RMS 325-0-325");
      return;
    }
    read(part, nodes, figures);
  }

  /** Reads a winding whose nodes and figures have been taken off the line. */
  static void read(PartCard part, List<Node> nodes, Word figures) {
    WindingReader reader = new WindingReader(part, nodes);
    double[] volts = reader.volts(figures);
    if (volts != null) {
      reader.build(volts, figures.span());
    }
  }

  /** Returns whether a sine's frequency is the line's: then it stands for a winding. */
  static boolean isLineSine(PartCard part, List<Word> sine) {
    double hertz = part.read(sine.get(2), Measure.FREQUENCY);
    Line line = part.draft().line();
    if (line.stated()) {
      return Math.abs(hertz - line.hertz()) < HERTZ_TOLERANCE;
    }
    boolean usual =
        Math.abs(hertz - 50) < HERTZ_TOLERANCE || Math.abs(hertz - 60) < HERTZ_TOLERANCE;
    if (usual) {
      part.draft().sineAt(Math.rint(hertz));
    }
    return usual;
  }

  /** Reads a sine at the line's frequency as a winding of amplitude/√2. */
  static void readSine(PartCard part, List<Node> nodes, List<Word> sine) {
    double volts = part.readPositive(sine.get(1), Measure.VOLTAGE) / Math.sqrt(2);
    new WindingReader(part, nodes).build(new double[] {volts, 0}, sine.get(1).span());
  }

  private double @Nullable [] volts(Word figures) {
    Matcher centreTapped = CENTRE_TAPPED.matcher(figures.text());
    if (nodes.size() == 3 && centreTapped.matches()) {
      Word whole = new Word(centreTapped.group(1), figures.span(), Word.Form.PLAIN);
      double half = part.readPositive(whole, Measure.VOLTAGE) / 2;
      return new double[] {half, 0, half};
    }
    String text = figures.text();
    List<String> pieces =
        figures.isExpression() || text.startsWith("-") ? List.of(text) : List.of(text.split("-"));
    if (pieces.size() == 1 && nodes.size() == 2) {
      return new double[] {part.readPositive(figures, Measure.VOLTAGE), 0};
    }
    if (pieces.size() != nodes.size()) {
      part.report().add(Problem.TAP_COUNT, figures.span(), nodes.size(), text, example());
      return null;
    }
    double[] volts = new double[pieces.size()];
    int column = figures.span().column();
    for (int i = 0; i < volts.length; i++) {
      String piece = pieces.get(i);
      SourceSpan whole = figures.span();
      SourceSpan span =
          new SourceSpan(whole.text(), whole.line(), column, Math.max(1, piece.length()));
      volts[i] = part.read(new Word(piece, span, Word.Form.PLAIN), Measure.VOLTAGE);
      column += piece.length() + 1;
    }
    if (Arrays.stream(volts).anyMatch(Double::isNaN)) {
      return null;
    }
    if (!rising(volts)) {
      part.report().add(Problem.TAP_ORDER, figures.span(), text);
      return null;
    }
    return volts;
  }

  private String example() {
    return switch (nodes.size()) {
      case 2 -> "RMS 325";
      case 3 -> "RMS 325-0-325";
      default -> "RMS 325-60-0-325";
    };
  }

  /** Returns whether the figures rise from one tap marked 0 to both ends. */
  private static boolean rising(double[] volts) {
    int zero = -1;
    for (int i = 0; i < volts.length; i++) {
      if (volts[i] == 0) {
        if (zero >= 0) {
          return false;
        }
        zero = i;
      }
    }
    if (zero < 0) {
      return false;
    }
    for (int i = 0; i + 1 < volts.length; i++) {
      boolean right = i < zero ? volts[i] > volts[i + 1] : volts[i] < volts[i + 1];
      if (!right) {
        return false;
      }
    }
    return true;
  }

  private void build(double[] volts, SourceSpan figures) {
    List<Word> resistances = part.optionList("rdc");
    Word load = part.option("load");
    Word at = part.option("at");
    Word on = part.option("on");
    Word rating = part.option("amps");
    Transformer transformer = transformer(on);
    boolean plain = resistances.isEmpty() && load == null && at == null && on == null;
    boolean wall = isWall(volts, plain, on != null, figures);
    double[] ohms = ohms(resistances, volts.length - 1, wall);
    if (Arrays.stream(volts).allMatch(v -> v == 0)) {
      part.report().add(Problem.ZERO_VALUE, figures, part.name(), Measure.VOLTAGE.words());
    }
    if (load != null) {
      double amps = part.readPositive(load, Measure.CURRENT);
      volts = openVolts(volts, ohms, amps, transformer, load);
    }
    List<Winding.Section> sections = new ArrayList<>();
    for (int i = 0; i + 1 < volts.length; i++) {
      double sectionVolts = Math.abs(volts[i] - volts[i + 1]);
      sections.add(new Winding.Section(nodes.get(i), nodes.get(i + 1), sectionVolts, ohms[i]));
    }
    double atVolts = at == null ? Double.NaN : part.readPositive(at, Measure.VOLTAGE);
    double ratedAmps = rating == null ? Double.NaN : part.readPositive(rating, Measure.CURRENT);
    part.done();
    String transformerName = transformer == null ? "" : transformer.name();
    part.draft()
        .add(
            new Winding(part.name(), sections, atVolts, transformerName, wall, ratedAmps),
            part.span());
  }

  private @Nullable Transformer transformer(@Nullable Word on) {
    if (on == null) {
      return null;
    }
    Transformer transformer = part.draft().transformers().get(Settings.key(on));
    if (transformer == null) {
      part.report()
          .add(
              Problem.NO_SUCH_TRANSFORMER,
              on.span(),
              on.text(),
              NearNames.hint(on.text(), part.draft().transformers().keySet()));
    }
    return transformer;
  }

  private boolean isWall(double[] volts, boolean plain, boolean onTransformer, SourceSpan figures) {
    if (nodes.size() != 2 || onTransformer) {
      return false;
    }
    if (WALL_NAME.matcher(part.name()).matches()) {
      return true;
    }
    Line line = part.draft().line();
    double written = volts[0];
    boolean likeLine =
        line.stated()
            ? Math.abs(written / line.designVolts() - 1) <= NEAR_THE_LINE
            : (written >= 100 && written <= 127) || (written >= 220 && written <= 250);
    if (plain && likeLine) {
      part.report().add(Problem.WALL_ASSUMED, figures, part.name());
      return true;
    }
    return false;
  }

  private double[] ohms(List<Word> resistances, int sections, boolean wall) {
    double[] ohms = new double[sections];
    Arrays.fill(ohms, Double.NaN);
    if (resistances.isEmpty()) {
      if (!wall) {
        part.report().gather(Problem.WINDING_WITHOUT_RESISTANCE, part.span(), part.name());
      }
      return ohms;
    }
    if (resistances.size() != sections) {
      part.report()
          .add(
              Problem.TAP_RESISTANCES,
              resistances.get(0).span(),
              part.name(),
              sections,
              resistances.size());
      return ohms;
    }
    for (int i = 0; i < sections; i++) {
      ohms[i] = part.ohms(resistances.get(i), "winding resistance");
      if (ohms[i] == 0 && !wall) {
        part.report().add(Problem.ZERO_OHM_WINDING, resistances.get(i).span(), part.name());
      }
    }
    return ohms;
  }

  private double[] openVolts(
      double[] volts, double[] ohms, double amps, @Nullable Transformer primary, Word load) {
    if (Arrays.stream(ohms).anyMatch(Double::isNaN)) {
      part.report().add(Problem.LOAD_WITHOUT_RESISTANCE, load.span(), part.name());
      return volts;
    }
    int zero = 0;
    while (volts[zero] != 0 && zero < volts.length - 1) {
      zero++;
    }
    double[] open = volts.clone();
    for (int i = 0; i < volts.length; i++) {
      double toTap = 0;
      for (int section = Math.min(i, zero); section < Math.max(i, zero); section++) {
        toTap += ohms[section];
      }
      double ratio = primary == null ? 0 : volts[i] / primary.primaryVolts();
      double reflected = primary == null ? 0 : primary.primaryOhms() * ratio * ratio;
      open[i] = volts[i] + (i == zero ? 0 : amps * (toTap + reflected));
    }
    return open;
  }
}
