package railwalk.netlist;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import org.jspecify.annotations.Nullable;
import railwalk.device.DataFile;
import railwalk.source.SourceSpan;
import railwalk.source.SourceText;

/**
 * A tube type that the netlist brings along, as the lines of a data file ({@link DataFile}), with
 * the place in the netlist that each word of them comes from.
 */
final class GivenType {
  private final Word name;
  private boolean spoilt;
  private final List<String> lines = new ArrayList<>();
  private final List<TreeMap<Integer, SourceSpan>> places = new ArrayList<>();

  GivenType(Word name) {
    this.name = name;
  }

  /** Returns the type's name, where messages about all of it point. */
  Word name() {
    return name;
  }

  /** Remembers that a mistake in it was reported: it cannot be used. */
  void spoil() {
    spoilt = true;
  }

  boolean isSpoilt() {
    return spoilt;
  }

  /** Starts a line with {@code key}, which comes from {@code span}. */
  GivenType line(String key, SourceSpan span) {
    lines.add("");
    places.add(new TreeMap<>());
    return word(key, span);
  }

  /** Adds a word to the line begun last. */
  GivenType word(String word, SourceSpan span) {
    int last = lines.size() - 1;
    String before = lines.get(last);
    String gap = before.isEmpty() ? "" : " ";
    places.get(last).put(before.length() + gap.length() + 1, span);
    lines.set(last, before + gap + word);
    return this;
  }

  /** Adds a whole line as it stands in a file of types. */
  void copy(SourceText file, int number) {
    String line = file.line(number);
    TreeMap<Integer, SourceSpan> origins = new TreeMap<>();
    for (int at = 0; at < line.length(); at++) {
      origins.put(at + 1, new SourceSpan(file, number, at + 1, 1));
    }
    lines.add(line);
    places.add(origins);
  }

  /** Returns the lines as one text. */
  SourceText text() {
    return new SourceText(name.span().text().fileName(), lines);
  }

  /** Returns the place in the netlist that {@code span} of {@link #text} comes from. */
  SourceSpan origin(@Nullable SourceSpan span, SourceText written) {
    if (span == null || !span.text().equals(written) || span.line() > places.size()) {
      return name.span();
    }
    Map.Entry<Integer, SourceSpan> place = places.get(span.line() - 1).floorEntry(span.column());
    if (place == null) {
      return name.span();
    }
    SourceSpan origin = place.getValue();
    return origin.length() > 1
        ? origin
        : new SourceSpan(origin.text(), origin.line(), origin.column(), span.length());
  }
}
