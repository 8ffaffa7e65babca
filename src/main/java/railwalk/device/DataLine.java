package railwalk.device;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import railwalk.source.Diagnostic;
import railwalk.source.Severity;
import railwalk.source.SourceSpan;
import railwalk.source.SourceText;
import railwalk.units.Measure;
import railwalk.units.ValueReader;
import railwalk.units.ValueReading;

/**
 * One line of a data file, {@code key word… name=value…}, with the place of each word for error
 * messages. One piece of {@link DataFile}.
 */
final class DataLine {
  private record Word(String text, int column) {}

  /** What the options measure that are no plain numbers. */
  private static final Map<String, Measure> MEASURES =
      Map.ofEntries(
          Map.entry("plate", Measure.VOLTAGE),
          Map.entry("screen", Measure.VOLTAGE),
          Map.entry("grid", Measure.VOLTAGE),
          Map.entry("heatercathode", Measure.VOLTAGE),
          Map.entry("tap", Measure.VOLTAGE),
          Map.entry("rms", Measure.VOLTAGE),
          Map.entry("inverse", Measure.VOLTAGE),
          Map.entry("strike", Measure.VOLTAGE),
          Map.entry("drop", Measure.VOLTAGE),
          Map.entry("operating", Measure.VOLTAGE),
          Map.entry("regulation", Measure.VOLTAGE),
          Map.entry("current", Measure.CURRENT),
          Map.entry("screencurrent", Measure.CURRENT),
          Map.entry("cathodecurrent", Measure.CURRENT),
          Map.entry("peak", Measure.CURRENT),
          Map.entry("dc", Measure.CURRENT),
          Map.entry("minimum", Measure.CURRENT),
          Map.entry("maximum", Measure.CURRENT),
          Map.entry("gm", Measure.CONDUCTANCE),
          Map.entry("platewatts", Measure.POWER),
          Map.entry("screenwatts", Measure.POWER),
          Map.entry("cathode", Measure.RESISTANCE),
          Map.entry("load", Measure.RESISTANCE),
          Map.entry("screenload", Measure.RESISTANCE),
          Map.entry("rp", Measure.RESISTANCE),
          Map.entry("gridleak", Measure.RESISTANCE),
          Map.entry("gridleakfixed", Measure.RESISTANCE),
          Map.entry("capacitor", Measure.CAPACITANCE));

  private final SourceText text;
  private final int number;
  private final Word key;
  private final List<Word> words = new ArrayList<>();
  private final Map<String, Word> options = new LinkedHashMap<>();

  private DataLine(SourceText text, int number, List<Word> all) {
    this.text = text;
    this.number = number;
    this.key = all.get(0);
    for (Word word : all.subList(1, all.size())) {
      int equals = word.text.indexOf('=');
      if (equals <= 0) {
        words.add(word);
      } else {
        String name = word.text.substring(0, equals);
        if (options.put(name, new Word(word.text.substring(equals + 1), word.column)) != null) {
          throw error(word, name + " is given twice", "");
        }
      }
    }
  }

  /** Returns the lines of {@code text} that hold something; "#" starts a comment. */
  static List<DataLine> of(SourceText text) {
    List<DataLine> lines = new ArrayList<>();
    for (int number = 1; number <= text.lines().size(); number++) {
      List<Word> all = split(text.line(number));
      if (!all.isEmpty()) {
        lines.add(new DataLine(text, number, all));
      }
    }
    return lines;
  }

  /** Returns the error of a file that says nothing. */
  static DataFileException empty(SourceText text) {
    SourceSpan span = new SourceSpan(text, 1, 1, 1);
    return new DataFileException(
        new Diagnostic(Severity.ERROR, "tube-data", "the file is empty", "", span));
  }

  private static List<Word> split(String line) {
    List<Word> all = new ArrayList<>();
    int at = 0;
    while (at < line.length() && line.charAt(at) != '#') {
      if (Character.isWhitespace(line.charAt(at))) {
        at++;
        continue;
      }
      int end = at;
      while (end < line.length() && !Character.isWhitespace(line.charAt(end))) {
        end++;
      }
      all.add(new Word(line.substring(at, end), at + 1));
      at = end;
    }
    return all;
  }

  String key() {
    return key.text;
  }

  /** Returns the bare words that follow the key. */
  List<String> words() {
    return words.stream().map(Word::text).toList();
  }

  /** Returns how many bare words follow the key. */
  int size() {
    return words.size();
  }

  /** Returns bare word {@code index} (from 0). */
  String word(int index) {
    if (index >= words.size()) {
      throw error("something is missing after " + key.text, "");
    }
    return words.get(index).text;
  }

  /** Returns bare word {@code index} as a number in SI units. */
  double figure(int index) {
    word(index);
    return figure(words.get(index), Measure.NUMBER);
  }

  /** Returns the rest of the line from bare word {@code index} on, as it was written. */
  String rest(int index) {
    word(index);
    return text.line(number).substring(words.get(index).column - 1).strip();
  }

  /** Returns all that follows the key, as it was written. */
  String rest() {
    return text.line(number).strip().substring(key.text.length()).strip();
  }

  /** Returns the names of the options, in the line's order. */
  Set<String> optionNames() {
    return options.keySet();
  }

  boolean has(String option) {
    return options.containsKey(option);
  }

  /** Returns the option's text, or {@code otherwise} when it is not given. */
  String option(String name, String otherwise) {
    Word word = options.get(name);
    return word == null ? otherwise : word.text;
  }

  /** Returns the option as a number in SI units, or {@code otherwise} when it is not given. */
  double figure(String name, double otherwise) {
    Word word = options.get(name);
    return word == null ? otherwise : figure(word, MEASURES.getOrDefault(name, Measure.NUMBER));
  }

  /** Returns the option as a number in SI units, or NaN when it is not given. */
  double figure(String name) {
    return figure(name, Double.NaN);
  }

  /** Returns the option as a number; an error when it is not given. */
  double required(String name) {
    if (!has(name)) {
      throw error(name + "= is missing", "");
    }
    return figure(name);
  }

  /** Complains about the first option that is not among {@code names}. */
  void allow(Set<String> names) {
    for (Map.Entry<String, Word> option : options.entrySet()) {
      if (!names.contains(option.getKey())) {
        throw error(
            option.getValue(),
            "unknown word " + option.getKey() + "= on a " + key.text + " line",
            "one of " + String.join(", ", names.stream().sorted().toList()));
      }
    }
  }

  private double figure(Word word, Measure measure) {
    if (ValueReader.read(word.text, measure) instanceof ValueReading.Value value) {
      return value.amount();
    }
    throw error(word, word.text + " is not " + measure.words(), "such as " + measure.example());
  }

  /** Returns an error that points at bare word {@code index}. */
  DataFileException error(int index, String message, String hint) {
    return error(words.get(index), message, hint);
  }

  /** Returns an error that points at the option called {@code name}. */
  DataFileException error(String name, String message, String hint) {
    Word word = options.get(name);
    return error(word == null ? key : word, message, hint);
  }

  /** Returns an error that points at the key. */
  DataFileException error(String message, String hint) {
    return error(key, message, hint);
  }

  private DataFileException error(Word word, String message, String hint) {
    SourceSpan span = new SourceSpan(text, number, word.column, word.text.length());
    return new DataFileException(new Diagnostic(Severity.ERROR, "tube-data", message, hint, span));
  }
}
