package railwalk.netlist;

import java.util.List;
import java.util.Locale;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.ControlledSource;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.circuit.VoltageSource;
import railwalk.source.NearNames;
import railwalk.units.Measure;

/** Reads V lines (fixed sources; windings go on to {@link WindingReader}) and E, F, G, H lines. */
final class SourceParts {
  private static final Set<String> NONLINEAR =
      Set.of("poly", "table", "value", "laplace", "freq", "vol", "cur");

  private SourceParts() {}

  static void voltageSource(PartCard part) {
    List<Word> words = part.words();
    int rms = indexOf(words, "RMS");
    if (rms >= 2) {
      WindingReader.read(part, rms);
      return;
    }
    List<Node> nodes = part.nodes(2);
    if (nodes == null) {
      return;
    }
    Word rmsOption = part.option("rms");
    if (rmsOption != null) {
      WindingReader.read(part, nodes, rmsOption);
      return;
    }
    Signals signals = Signals.take(part, Measure.VOLTAGE);
    List<Word> sine = signals.sine();
    if (sine != null && sine.size() >= 3 && WindingReader.isLineSine(part, sine)) {
      WindingReader.readSine(part, nodes, sine);
      return;
    }
    signals.noteSignal(part);
    if (!signals.given()) {
      part.report()
          .add(
              Problem.VALUE_MISSING,
              part.end(),
              part.name(),
              Measure.VOLTAGE.words(),
              "9, or RMS 325 for a winding");
      return;
    }
    double ohms = part.ohmsOption("resistance", "rdc", "r");
    part.done();
    part.draft()
        .add(
            new VoltageSource(
                part.name(),
                nodes.get(0),
                nodes.get(1),
                signals.dc(),
                Double.isNaN(ohms) ? 0 : ohms),
            part.span());
  }

  private static int indexOf(List<Word> words, String keyword) {
    for (int i = 0; i < words.size(); i++) {
      if (i >= 2 && words.get(i).is(keyword)) {
        return i;
      }
    }
    return -1;
  }

  static void controlledSource(PartCard part, ControlledSource.Kind kind) {
    part.unwrapLists();
    boolean byVolts =
        kind == ControlledSource.Kind.VOLTS_BY_VOLTS || kind == ControlledSource.Kind.AMPS_BY_VOLTS;
    Word foreign = nonlinear(part);
    if (foreign != null) {
      part.report().add(Problem.SOURCE_NOT_LINEAR, foreign.span(), part.name());
      return;
    }
    List<Node> nodes = part.nodes(byVolts ? 4 : 2);
    if (nodes == null) {
      return;
    }
    Word control = byVolts ? null : part.next();
    if (!byVolts && control == null) {
      part.report().add(Problem.CONTROL_MISSING, part.end(), part.name());
      return;
    }
    Word gainWord = part.valueWord(Measure.NUMBER, "gain");
    if (gainWord == null) {
      return;
    }
    double gain = part.read(gainWord, Measure.NUMBER);
    part.done();
    part.draft()
        .add(
            new ControlledSource(
                part.name(),
                kind,
                nodes.get(0),
                nodes.get(1),
                gain,
                byVolts ? nodes.get(2) : null,
                byVolts ? nodes.get(3) : null,
                control == null ? "" : controlName(part, control)),
            part.span());
  }

  private static @Nullable Word nonlinear(PartCard part) {
    for (Word word : part.words()) {
      if (NONLINEAR.contains(word.text().toLowerCase(Locale.ROOT))) {
        return word;
      }
    }
    Word value = part.option("value");
    return value == null ? part.option("i", "v") : value;
  }

  private static String controlName(PartCard part, Word control) {
    String name = part.frame().part(control.text());
    part.draft()
        .later(
            () -> {
              Element source = part.draft().element(name).orElse(null);
              if (source == null) {
                part.report()
                    .add(
                        Problem.NO_SUCH_PART,
                        control.span(),
                        name,
                        NearNames.hint(name, part.draft().names()));
              } else if (!(source instanceof VoltageSource)) {
                part.report().add(Problem.CONTROL_NOT_SOURCE, control.span(), name);
              }
            });
    return name;
  }
}
