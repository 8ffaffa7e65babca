package railwalk.app;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.Charset;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.TreeMap;
import railwalk.diagnosis.FoundValue;
import railwalk.netlist.Origins;
import railwalk.source.SourceSpan;
import railwalk.units.PreferredOhms;

/**
 * A netlist's text with each question mark replaced by the value that was found and a comment at
 * the end of its line; all else stays byte for byte.
 */
final class LearnedNetlist {
  private record Edit(SourceSpan span, FoundValue value) {}

  private LearnedNetlist() {}

  /**
   * Returns the new file's bytes.
   *
   * @param netlist the file that was read
   * @param open where its question marks stand
   * @param values one for each, in the same order
   */
  static byte[] bytes(Path netlist, List<Origins.Unknown> open, List<FoundValue> values)
      throws CannotDo {
    List<Edit> edits = new ArrayList<>();
    for (int u = 0; u < open.size(); u++) {
      SourceSpan span = open.get(u).span();
      if (!span.text().fileName().equals(String.valueOf(netlist.getFileName()))) {
        throw refused(open.get(u).element() + " is written in " + span.text().fileName());
      }
      edits.add(new Edit(span, values.get(u)));
    }
    byte[] before;
    try {
      before = Files.readAllBytes(netlist);
    } catch (IOException failure) {
      throw new CannotDo("cannot read " + netlist + ": " + WholeFile.reason(failure));
    }
    Charset charset = charset(before);
    byte[] after = edited(new String(before, charset), edits).getBytes(charset);
    return after;
  }

  private static CannotDo refused(String why) {
    return new CannotDo("--learn: " + why + "; put the value in by hand");
  }

  /** Returns the encoding in which {@code bytes} come back as they were. */
  private static Charset charset(byte[] bytes) {
    if (bytes.length > 1 && (bytes[0] & 0xFF) == 0xFE && (bytes[1] & 0xFF) == 0xFF) {
      return StandardCharsets.UTF_16BE;
    }
    if (bytes.length > 1 && (bytes[0] & 0xFF) == 0xFF && (bytes[1] & 0xFF) == 0xFE) {
      return StandardCharsets.UTF_16LE;
    }
    try {
      StandardCharsets.UTF_8.newDecoder().decode(ByteBuffer.wrap(bytes));
      return StandardCharsets.UTF_8;
    } catch (CharacterCodingException foreign) {
      return StandardCharsets.ISO_8859_1;
    }
  }

  private static String edited(String text, List<Edit> edits) throws CannotDo {
    int[] starts = lineStarts(text);
    TreeMap<Integer, String> comments = new TreeMap<>();
    TreeMap<Integer, String> marks = new TreeMap<>();
    edits.sort(Comparator.comparingInt(e -> e.span().column()));
    for (Edit edit : edits) {
      int line = edit.span().line();
      int mark = starts[line - 1] + edit.span().column() - 1;
      String name = edit.value().element();
      if (mark >= text.length() || text.charAt(mark) != '?') {
        throw refused("the question mark of " + name + " was not found again");
      }
      double ohms = edit.value().ohms();
      if (marks.put(mark, PreferredOhms.written(ohms)) != null) {
        throw refused("one question mark stands for several parts, " + name + " among them");
      }
      String said =
          edit.value().resistor()
              ? "found, nearest " + PreferredOhms.written(PreferredOhms.nearest(ohms))
              : "found";
      comments.merge(lineEnd(text, mark), " ; " + said, String::concat);
    }
    StringBuilder edited = new StringBuilder(text);
    TreeMap<Integer, String> places = new TreeMap<>(comments);
    places.putAll(marks);
    for (var place : places.descendingMap().entrySet()) {
      int at = place.getKey();
      edited.replace(at, at + (marks.containsKey(at) ? 1 : 0), place.getValue());
    }
    return edited.toString();
  }

  private static int[] lineStarts(String text) {
    List<Integer> starts = new ArrayList<>();
    int at = 0;
    while (at >= 0) {
      starts.add(at);
      int end = lineEnd(text, at);
      boolean pair = text.startsWith("\r\n", end);
      at = end == text.length() ? -1 : end + (pair ? 2 : 1);
    }
    return starts.stream().mapToInt(Integer::intValue).toArray();
  }

  private static int lineEnd(String text, int from) {
    int end = from;
    while (end < text.length() && text.charAt(end) != '\n' && text.charAt(end) != '\r') {
      end++;
    }
    return end;
  }
}
