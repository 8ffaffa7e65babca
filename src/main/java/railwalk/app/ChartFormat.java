package railwalk.app;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/** What a chart can be written as. */
public enum ChartFormat {
  PDF,
  TEXT,
  CSV,
  JSON;

  /** Returns the word that names it on the command line. */
  public String word() {
    return switch (this) {
      case PDF -> "pdf";
      case TEXT -> "text";
      case CSV -> "csv";
      case JSON -> "json";
    };
  }

  /** Returns all words, in order. */
  public static List<String> words() {
    return Arrays.stream(values()).map(ChartFormat::word).toList();
  }

  /** Returns the format that {@code word} names, in any case. */
  public static Optional<ChartFormat> of(String word) {
    return Arrays.stream(values()).filter(f -> f.word().equalsIgnoreCase(word)).findFirst();
  }
}
