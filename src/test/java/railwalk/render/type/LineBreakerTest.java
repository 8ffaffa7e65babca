package railwalk.render.type;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;

class LineBreakerTest {
  private static final LineBreaker BREAKER = new LineBreaker(String::length);

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
