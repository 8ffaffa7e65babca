package railwalk.netlist;

import java.util.ArrayList;
import java.util.Collection;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Line;
import railwalk.circuit.Meter;
import railwalk.circuit.Spread;
import railwalk.circuit.Transformer;
import railwalk.circuit.Words;
import railwalk.device.ElectrodeNames;
import railwalk.source.NearNames;
import railwalk.units.Measure;

/** Reads the dot lines that set something for the whole netlist. */
final class Settings {
  private static final double HIGHEST_LINE_VOLTS = 500;
  private static final double LOWEST_LINE_HERTZ = 16;
  private static final double HIGHEST_LINE_HERTZ = 800;

  private final Draft draft;
  private final Frame frame;
  private final Map<String, Card> seen = new HashMap<>();

  /** No voltmeter is lower, on any range. */
  private static final double LEAST_METER_OHMS = 1_000;

  private Meter meter = Meter.TEN_MEGOHM;
  private Spread spread = Spread.USUAL;
  private Words words = Words.AMERICAN;

  Settings(Draft draft, Frame frame) {
    this.draft = draft;
    this.frame = frame;
  }

  /** Returns the key that a transformer is kept under. */
  static String key(Word name) {
    return name.text().toUpperCase(Locale.ROOT);
  }

  Meter meter() {
    return meter;
  }

  Spread spread() {
    return spread;
  }

  Words words() {
    return words;
  }

  /** Reads all settings but the states, which need the parts. */
  void read(List<Card> cards) {
    for (Card card : cards) {
      if (card.flaw() != null) {
        continue;
      }
      String word = card.head().text().toLowerCase(Locale.ROOT);
      PartCard part = new PartCard(card, frame, draft);
      switch (word) {
        case ".line", ".mains" -> {
          once(".line", card);
          line(part);
        }
        case ".transformer" -> transformer(part);
        case ".meter" -> {
          once(word, card);
          meter(part);
        }
        case ".spread" -> {
          once(word, card);
          spread(part);
        }
        case ".ref" -> {
          once(word, card);
          draft.setReferenceWord(needed(part, "a node: .ref bm"));
          part.done();
        }
        case ".words" -> {
          once(word, card);
          words(part);
        }
        default -> {}
      }
    }
  }

  /** Reports what is wrong with the {@code .order} lines. */
  void check(Collection<Card> orders) {
    for (Card order : orders) {
      List<Word> words = order.words().subList(1, order.words().size());
      if (words.isEmpty()) {
        draft
            .report()
            .add(
                Problem.SETTING_EMPTY,
                order.head().span(),
                ".order",
                ".order 6V6GT plate screen grid cathode");
      }
      for (Word word : words) {
        if (ElectrodeNames.electrode(word.text()).isEmpty()) {
          draft
              .report()
              .add(
                  Problem.ELECTRODE_UNKNOWN,
                  word.span(),
                  word.text(),
                  NearNames.hint(word.text(), ElectrodeNames.all()));
        }
      }
    }
  }

  private void once(String word, Card card) {
    Card first = seen.putIfAbsent(word, card);
    if (first != null) {
      draft
          .report()
          .add(Problem.SETTING_TWICE, card.head().span(), word, first.head().span().line());
    }
  }

  private @Nullable Word needed(PartCard part, String example) {
    Word word = part.next();
    if (word == null) {
      draft.report().add(Problem.SETTING_EMPTY, part.end(), part.name(), example);
    }
    return word;
  }

  private void line(PartCard part) {
    Word voltsWord = needed(part, "the line's volts: .line 120 60");
    if (voltsWord == null) {
      return;
    }
    double volts = within(part, voltsWord, Measure.VOLTAGE, 1, HIGHEST_LINE_VOLTS);
    Word hertzWord = part.next();
    double hertz =
        hertzWord == null
            ? Line.NOT_STATED.hertz()
            : within(part, hertzWord, Measure.FREQUENCY, LOWEST_LINE_HERTZ, HIGHEST_LINE_HERTZ);
    Word designWord = part.option("design");
    double design =
        designWord == null
            ? volts
            : within(part, designWord, Measure.VOLTAGE, 1, HIGHEST_LINE_VOLTS);
    part.done();
    draft.setLine(new Line(volts, hertz, design));
  }

  private double within(PartCard part, Word word, Measure measure, double least, double most) {
    double value = part.read(word, measure);
    if (value < least || value > most) {
      draft
          .report()
          .add(
              Problem.LINE_RANGE,
              word.span(),
              word.text(),
              measure == Measure.VOLTAGE ? "volts" : "hertz");
    }
    return value;
  }

  private void transformer(PartCard part) {
    Word name = needed(part, "its name: .transformer T1 primary=120 rdc=17.5");
    Word primary = part.option("primary");
    Word ohmsWord = part.option("rdc");
    if (name == null) {
      return;
    }
    if (primary == null || ohmsWord == null) {
      draft.report().add(Problem.TRANSFORMER_SHORT, part.end(), name.text());
      return;
    }
    double volts = part.readPositive(primary, Measure.VOLTAGE);
    double ohms = part.readPositive(ohmsWord, Measure.RESISTANCE);
    if (volts == 0) {
      draft.report().add(Problem.ZERO_VALUE, primary.span(), name.text(), Measure.VOLTAGE.words());
    }
    part.done();
    Transformer made = new Transformer(key(name), volts, ohms);
    if (draft.transformers().putIfAbsent(made.name(), made) != null) {
      draft.report().add(Problem.TRANSFORMER_TWICE, name.span(), made.name());
    }
  }

  private void meter(PartCard part) {
    Word word = needed(part, "10M or 20k/V");
    if (word == null) {
      return;
    }
    int slash = word.text().indexOf('/');
    if (slash < 0) {
      double ohms = positive(part, word, Measure.RESISTANCE);
      if (ohms > 0 && ohms < LEAST_METER_OHMS) {
        draft.report().add(Problem.METER_SPEC, word.span(), word.text());
      }
      part.done();
      meter = new Meter(ohms, Double.NaN, List.of());
      return;
    }
    String unit = word.text().substring(slash + 1).toLowerCase(Locale.ROOT);
    if (!unit.equals("v") && !unit.startsWith("volt")) {
      draft.report().add(Problem.METER_SPEC, word.span(), word.text());
      return;
    }
    Word ohmsWord = new Word(word.text().substring(0, slash), word.span(), word.form());
    double ohmsPerVolt = positive(part, ohmsWord, Measure.RESISTANCE);
    List<Double> ranges = new ArrayList<>();
    Word range = part.next();
    while (range != null) {
      ranges.add(positive(part, range, Measure.VOLTAGE));
      range = part.next();
    }
    part.done();
    ranges.sort(null);
    meter =
        new Meter(Double.NaN, ohmsPerVolt, ranges.isEmpty() ? Meter.USUAL_RANGES_VOLTS : ranges);
  }

  private double positive(PartCard part, Word word, Measure measure) {
    double value = part.readPositive(word, measure);
    if (value == 0) {
      draft.report().add(Problem.ZERO_VALUE, word.span(), part.name(), measure.words());
    }
    return value;
  }

  private void spread(PartCard part) {
    double resistor = limit(part, "resistor", spread.resistor());
    double tube = limit(part, "tube", spread.tube());
    double winding = limit(part, "winding", spread.winding());
    double line = limit(part, "line", spread.line());
    Word tubes = part.option("tubes");
    Word resistors = part.option("resistors");
    part.done();
    boolean used = isChosen(tubes, "used", "new");
    boolean carbon = isChosen(resistors, "carbon", "film");
    if (tubes != null && used && !Double.isNaN(tube)) {
      draft.report().add(Problem.SPREAD_BOTH, tubes.span());
    }
    spread = new Spread(resistor, tube, winding, line, used, carbon);
  }

  /** Returns whether {@code word} is the first of the two that may stand there; reports others. */
  private boolean isChosen(@Nullable Word word, String first, String other) {
    if (word != null && !word.is(first) && !word.is(other)) {
      draft.report().add(Problem.SPREAD_WORD, word.span(), word.text(), first, other);
    }
    return word != null && word.is(first);
  }

  private double limit(PartCard part, String key, double usual) {
    Word word = part.option(key);
    if (word == null) {
      return usual;
    }
    double share = part.read(word, Measure.SHARE);
    boolean percent = word.text().endsWith("%") || word.isExpression() || share == 0;
    if (!percent || share < 0 || share >= 1) {
      draft.report().add(Problem.SPREAD_LIMIT, word.span(), word.text());
    }
    return share;
  }

  private void words(PartCard part) {
    Word word = needed(part, "british or american");
    if (word == null) {
      return;
    }
    if (word.is("british")) {
      words = Words.BRITISH;
    } else if (word.is("american")) {
      words = Words.AMERICAN;
    } else {
      draft.report().add(Problem.WORDS_UNKNOWN, word.span(), word.text());
    }
    part.done();
  }
}
