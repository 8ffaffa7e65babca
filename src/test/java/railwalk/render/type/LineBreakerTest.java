package railwalk.render.type;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;

class LineBreakerTest {
  private static final LineBreaker BREAKER = LineBreaker.ofWords(String::length);

  @Test
  void breaksAtBlanks() {
    assertThat(BREAKER.lines("one two three", 8)).containsExactly("one two", "three");
  }

  @Test
  void cutsAWordThatIsTooLong() {
    assertThat(BREAKER.lines("a abcdefghij k", 4)).containsExactly("a", "abcd", "efgh", "ij k");
  }

  @Test
  void keepsNoBreakSpacesTogether() {
    assertThat(BREAKER.lines("about 12\u00A0V", 8)).containsExactly("about", "12\u00A0V");
  }

  @Test
  void keepsAFigureWithItsUnit() {
    assertThat(BREAKER.lines("at 4.7 kΩ, so 5 Volts", 9))
        .containsExactly("at", "4.7\u00A0kΩ,", "so 5", "Volts");
    assertThat(BREAKER.lines("share 60 %", 9)).containsExactly("share", "60\u00A0%");
  }

  @Test
  void breaksFiguresOnlyWhereAllowed() {
    LineBreaker figures = LineBreaker.ofFigures(String::length);
    assertThat(figures.lines("−52 to \u200B−48", 20)).containsExactly("−52 to −48");
    assertThat(figures.lines("−52 to \u200B−48", 8)).containsExactly("−52 to ", "−48");
    assertThat(figures.widestPiece("−52 to \u200B−48")).isEqualTo(7);
    assertThat(figures.width("−52 to \u200B−48")).isEqualTo(10);
    assertThat(figures.lines("12.3 mA", 7)).containsExactly("12.3\u00A0mA");
  }

  @Test
  void givesOneLineForNoText() {
    assertThat(BREAKER.lines("", 8)).containsExactly("");
  }

  @Test
  void saysWhereLinesAreLeftOut() {
    assertThat(BREAKER.lines("one two three", 5, 2)).containsExactly("one", "two …");
    assertThat(BREAKER.lines("seven seven seven", 5, 1)).containsExactly("seve…");
  }

  @Test
  void clipsWithinAPairOfSurrogates() {
    assertThat(BREAKER.clipped("ab😀cd", 4)).isEqualTo("ab…");
    assertThat(BREAKER.clipped("abcd", 4)).isEqualTo("abcd");
  }
}
