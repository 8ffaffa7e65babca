package railwalk.netlist;

import java.util.List;
import java.util.Locale;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import railwalk.units.Measure;
import railwalk.units.ValueReader;
import railwalk.units.ValueReading;

/**
 * What a source line says besides its nodes: its DC part, and signals that have no say at DC.
 *
 * @param dc volts or ampere; 0 where only signals are given; NaN where it cannot be read
 * @param given whether the line says anything at all
 * @param signal where a signal stands; null without one
 * @param sine the arguments of a sine, offset first; null without one
 */
record Signals(double dc, boolean given, @Nullable Word signal, @Nullable List<Word> sine) {
  private static final Set<String> WAVES = Set.of("pulse", "pwl", "exp", "sffm", "am", "table");
  private static final Set<String> SINES = Set.of("sin", "sine");

  /** Returns whether {@code name} is a signal's shape. */
  static boolean isWave(Word name) {
    String lower = name.text().toLowerCase(Locale.ROOT);
    return WAVES.contains(lower) || SINES.contains(lower);
  }

  /** Takes DC part and signals off the line. */
  static Signals take(PartCard part, Measure measure) {
    Word dcWord = part.option("dc");
    Word signal = null;
    List<Word> sine = null;
    List<Word> wave = null;
    for (String name : List.of("sin", "sine", "pulse", "pwl", "exp", "sffm", "am", "table")) {
      Field.Call call = part.call(name);
      if (call != null) {
        signal = call.name();
        List<Word> arguments = call.arguments().stream().map(Field::first).toList();
        if (SINES.contains(name)) {
          sine = arguments;
        } else {
          wave = arguments;
        }
      }
    }
    while (part.peek() != null) {
      Word word = part.words().remove(0);
      String lower = word.text().toLowerCase(Locale.ROOT);
      if (lower.equals("dc")) {
        dcWord = part.next();
      } else if (lower.equals("ac")) {
        signal = word;
        skipNumbers(part, 2);
      } else if (SINES.contains(lower) || WAVES.contains(lower)) {
        signal = word;
        List<Word> arguments = List.copyOf(part.words());
        part.words().clear();
        sine = SINES.contains(lower) ? arguments : sine;
        wave = WAVES.contains(lower) ? arguments : wave;
      } else if (dcWord == null) {
        dcWord = word;
      } else {
        part.words().add(0, word);
        break;
      }
    }
    List<Word> carrier = sine == null ? wave : sine;
    if (dcWord == null && carrier != null && !carrier.isEmpty()) {
      dcWord = carrier.get(0);
    }
    double dc = dcWord == null ? 0 : part.read(dcWord, measure);
    return new Signals(dc, dcWord != null || signal != null, signal, sine);
  }

  /** Notes that a signal has no say at DC. */
  void noteSignal(PartCard part) {
    if (signal != null) {
      part.report().add(Problem.SIGNAL_ONLY_DC, signal.span(), part.name());
    }
  }

  private static void skipNumbers(PartCard part, int most) {
    for (int i = 0; i < most; i++) {
      Word word = part.peek();
      boolean number =
          word != null
              && (word.isExpression()
                  || ValueReader.read(word.text(), Measure.NUMBER) instanceof ValueReading.Value);
      if (!number) {
        return;
      }
      part.words().remove(0);
    }
  }
}
