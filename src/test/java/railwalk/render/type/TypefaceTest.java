package railwalk.render.type;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.util.List;
import org.apache.fontbox.ttf.CmapLookup;
import org.apache.fontbox.ttf.TTFParser;
import org.apache.fontbox.ttf.TrueTypeFont;
import org.apache.pdfbox.io.RandomAccessReadBuffer;
import org.junit.jupiter.api.Test;

/** Widths and signs against a font library's reading of the same files (FontBox). */
class TypefaceTest {
  @Test
  void agreesWithTheFontLibraryOnEverySignOfTheBasicPlane() throws IOException {
    for (Typeface typeface : List.of(Typeface.regular(), Typeface.semiBold())) {
      try (TrueTypeFont font = new TTFParser().parse(new RandomAccessReadBuffer(typeface.file()))) {
        CmapLookup map = font.getUnicodeCmapLookup();
        int signs = 0;
        for (int code = 0; code < 0xFFFF; code++) {
          int glyph = map.getGlyphId(code);
          assertThat(typeface.has(code)).as("U+%04X", code).isEqualTo(glyph != 0);
          if (glyph != 0) {
            signs++;
            assertThat(typeface.width(Character.toString(code), font.getUnitsPerEm()))
                .as("U+%04X", code)
                .isCloseTo(font.getAdvanceWidth(glyph), within(1e-9));
          }
        }
        System.out.println(font.getName() + ": " + signs + " signs agree");
        assertThat(signs).isGreaterThan(800);
      }
    }
  }

  @Test
  void hasTheSignsOfTheTrade() {
    for (Typeface typeface : List.of(Typeface.regular(), Typeface.semiBold())) {
      assertThat("Ωµ−±–·’…°".codePoints()).allMatch(typeface::has);
    }
  }

  @Test
  void figuresAreEquallyWide() {
    Typeface typeface = Typeface.regular();
    assertThat("0123456789".chars().mapToObj(c -> typeface.width(Character.toString(c), 10)))
        .containsOnly(typeface.width("0", 10));
  }

  @Test
  void countsABoxForAMissingSign() {
    assertThat(Typeface.regular().width("増", 10)).isEqualTo(10 * Typeface.MISSING_EMS);
  }
}
