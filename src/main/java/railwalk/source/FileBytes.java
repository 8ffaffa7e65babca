package railwalk.source;

import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.Charset;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.regex.Pattern;

/**
 * A file's bytes as text, or what kind of file it is when a person's own text was wanted: UTF-8
 * with or without a byte order mark, UTF-16 with one, else Latin-1.
 */
public final class FileBytes {
  /** What people type takes a few kilobytes; a file this large is something else. */
  public static final int LARGEST_BYTES = 4_000_000;

  private static final int LOOKED_AT = 4096;

  private record Mark(String start, String kind) {}

  /** First bytes, read as Latin-1, of files that end up on the command line by mistake. */
  private static final List<Mark> MARKS =
      List.of(
          new Mark("%PDF", "a PDF document"),
          new Mark("\u0089PNG", "a PNG picture"),
          new Mark("GIF8", "a GIF picture"),
          new Mark("\u00ff\u00d8\u00ff", "a JPEG picture"),
          new Mark("PK\u0003\u0004", "a ZIP archive or an office document"),
          new Mark("\u001f\u008b", "a compressed file"),
          new Mark("\u00d0\u00cf\u0011\u00e0", "an office document"),
          new Mark("{\\rtf", "a word processor's document"),
          new Mark("\u007fELF", "a program"),
          new Mark("MZ\u0090", "a program"));

  private static final Pattern MARKUP =
      Pattern.compile(
          "<(\\?xml|!doctype|!--|html|svg|[a-z][\\w.:-]*[^<>]*>.*</?[a-z]).*",
          Pattern.CASE_INSENSITIVE | Pattern.DOTALL);
  private static final Pattern LISTS = Pattern.compile("\\([a-z_]+\\s.*\\(.*", Pattern.DOTALL);
  private static final Pattern LIST_LINE = Pattern.compile("^\\s*[()]", Pattern.MULTILINE);
  private static final Pattern DATA =
      Pattern.compile("[\\[{]\\s*(\"|\\[|\\{|\\}|\\]).*", Pattern.DOTALL);
  private static final Pattern DRAWN_WIRE =
      Pattern.compile("^WIRE(?: -?\\d+){4}\\s*$", Pattern.MULTILINE);

  private FileBytes() {}

  /** Returns the text that {@code bytes} hold, without a byte order mark. */
  public static String decode(byte[] bytes) {
    if (startsWith(bytes, 0xEF, 0xBB, 0xBF)) {
      return new String(bytes, 3, bytes.length - 3, StandardCharsets.UTF_8);
    }
    if (startsWith(bytes, 0xFE, 0xFF) || startsWith(bytes, 0xFF, 0xFE)) {
      return new String(bytes, StandardCharsets.UTF_16);
    }
    return strict(bytes, StandardCharsets.UTF_8)
        .orElseGet(() -> new String(bytes, StandardCharsets.ISO_8859_1));
  }

  /**
   * Returns what kind of file this is text of when it is certainly neither a netlist nor a sheet.
   */
  public static Optional<String> foreignKind(String text) {
    for (Mark mark : MARKS) {
      if (text.startsWith(mark.start())) {
        return Optional.of(mark.kind());
      }
    }
    String start = text.substring(0, Math.min(text.length(), LOOKED_AT)).strip();
    String lower = start.toLowerCase(Locale.ROOT);
    if (MARKUP.matcher(start).lookingAt()) {
      return Optional.of("markup (a web page, a vector drawing or the like)");
    }
    if (LISTS.matcher(lower).matches()
        && LIST_LINE.matcher(lower).results().count() * 2 > lower.lines().count()) {
      return Optional.of("a drawing program's file, nested in parentheses");
    }
    if (DATA.matcher(start).matches()) {
      return Optional.of("structured data (JSON or the like)");
    }
    if (DRAWN_WIRE.matcher(start).results().count() >= 2) {
      return Optional.of("a drawing with wires by coordinates");
    }
    long controls = start.chars().filter(FileBytes::isControl).count();
    return start.indexOf('\0') >= 0 || controls * 20 > start.length()
        ? Optional.of("a binary file")
        : Optional.empty();
  }

  private static boolean isControl(int sign) {
    return sign < ' ' && sign != '\n' && sign != '\r' && sign != '\t' && sign != '\f';
  }

  private static boolean startsWith(byte[] bytes, int... start) {
    if (bytes.length < start.length) {
      return false;
    }
    for (int i = 0; i < start.length; i++) {
      if ((bytes[i] & 0xFF) != start[i]) {
        return false;
      }
    }
    return true;
  }

  private static Optional<String> strict(byte[] bytes, Charset charset) {
    try {
      return Optional.of(charset.newDecoder().decode(ByteBuffer.wrap(bytes)).toString());
    } catch (CharacterCodingException e) {
      return Optional.empty();
    }
  }
}
