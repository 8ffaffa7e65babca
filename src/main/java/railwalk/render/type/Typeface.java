package railwalk.render.type;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.util.BitSet;
import java.util.HashMap;
import java.util.Map;

/**
 * One weight of the typeface that charts are set in: which signs it has and how wide they run. Read
 * from the TrueType file itself (tables head, hhea, hmtx and the format 4 part of cmap, as in
 * ISO/IEC 14496-22).
 */
public final class Typeface {
  private static final String FOLDER = "/railwalk/render/";

  /** Width of the box drawn for a sign the typeface lacks, in ems. */
  public static final double MISSING_EMS = 0.6;

  private static final int BASIC_PLANE = 0x10000;

  private final byte[] file;

  /** Width in ems by sign; 0 for one that the typeface lacks or that has no width. */
  private final double[] ems = new double[BASIC_PLANE];

  private final BitSet signs = new BitSet(BASIC_PLANE);

  private Typeface(byte[] file) {
    this.file = file;
    ByteBuffer font = ByteBuffer.wrap(file);
    Map<String, Integer> tables = tables(font);
    double unitsPerEm = unsigned(font, at(tables, "head") + 18);
    int count = unsigned(font, at(tables, "hhea") + 34);
    double[] advances = new double[count];
    for (int glyph = 0; glyph < count; glyph++) {
      advances[glyph] = unsigned(font, at(tables, "hmtx") + 4 * glyph) / unitsPerEm;
    }
    readGlyphs(font, at(tables, "cmap"), advances);
  }

  /** Returns the weight for running text. */
  public static Typeface regular() {
    return load("IBMPlexSans-Regular.ttf");
  }

  /** Returns the weight for titles and key figures. */
  public static Typeface semiBold() {
    return load("IBMPlexSans-SemiBold.ttf");
  }

  private static Typeface load(String name) {
    try (InputStream in = Typeface.class.getResourceAsStream(FOLDER + name)) {
      if (in == null) {
        throw new IllegalStateException("the font " + name + " is not in the program");
      }
      return new Typeface(in.readAllBytes());
    } catch (IOException e) {
      throw new UncheckedIOException("cannot read the font " + name, e);
    }
  }

  /** Returns the TrueType file. */
  public byte[] file() {
    return file.clone();
  }

  /** Returns whether there is a sign for {@code codePoint}. */
  public boolean has(int codePoint) {
    return signs.get(codePoint);
  }

  /** Returns the width of {@code text} at {@code size}, a box counted for each missing sign. */
  public double width(String text, double size) {
    double sum = 0;
    for (int i = 0; i < text.length(); ) {
      int codePoint = text.codePointAt(i);
      sum += has(codePoint) ? ems[codePoint] : MISSING_EMS;
      i += Character.charCount(codePoint);
    }
    return size * sum;
  }

  private static Map<String, Integer> tables(ByteBuffer font) {
    Map<String, Integer> offsets = new HashMap<>();
    int count = unsigned(font, 4);
    for (int i = 0; i < count; i++) {
      int entry = 12 + 16 * i;
      byte[] tag = new byte[4];
      font.get(entry, tag);
      offsets.put(new String(tag, StandardCharsets.ISO_8859_1), font.getInt(entry + 8));
    }
    return offsets;
  }

  private static int at(Map<String, Integer> tables, String tag) {
    Integer offset = tables.get(tag);
    if (offset == null) {
      throw new IllegalStateException("the font has no table " + tag);
    }
    return offset;
  }

  /** Reads the segments of the first format 4 subtable: the signs of the basic plane. */
  private void readGlyphs(ByteBuffer font, int cmap, double[] advances) {
    int count = unsigned(font, cmap + 2);
    for (int i = 0; i < count; i++) {
      int table = cmap + font.getInt(cmap + 4 + 8 * i + 4);
      if (unsigned(font, table) == 4) {
        readSegments(font, table, advances);
        return;
      }
    }
    throw new IllegalStateException("the font has no format 4 character map");
  }

  private void readSegments(ByteBuffer font, int table, double[] advances) {
    int twice = unsigned(font, table + 6);
    int ends = table + 14;
    int starts = ends + twice + 2;
    int deltas = starts + twice;
    int ranges = deltas + twice;
    for (int i = 0; i < twice; i += 2) {
      int delta = unsigned(font, deltas + i);
      int range = unsigned(font, ranges + i);
      int last = Math.min(unsigned(font, ends + i), 0xFFFE);
      for (int code = unsigned(font, starts + i); code <= last; code++) {
        int glyph =
            range == 0
                ? code
                : unsigned(font, ranges + i + range + 2 * (code - unsigned(font, starts + i)));
        if (range == 0 || glyph != 0) {
          int index = glyph + delta & 0xFFFF;
          if (index != 0) {
            signs.set(code);
            ems[code] = advances[Math.min(index, advances.length - 1)];
          }
        }
      }
    }
  }

  private static int unsigned(ByteBuffer font, int at) {
    return font.getShort(at) & 0xFFFF;
  }
}
