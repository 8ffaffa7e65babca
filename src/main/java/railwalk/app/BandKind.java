package railwalk.app;

import java.util.Optional;

/** How the bands of a chart are found. */
public enum BandKind {
  /** From the solved amplifier's sensitivities. */
  FIRST_ORDER("first-order"),
  /** From builds drawn at random and solved. */
  SAMPLED("sampled");

  private final String word;

  BandKind(String word) {
    this.word = word;
  }

  /** Returns the word that names it on the command line. */
  public String word() {
    return word;
  }

  /** Returns the kind that {@code word} names. */
  public static Optional<BandKind> of(String word) {
    for (BandKind kind : values()) {
      if (kind.word.equals(word)) {
        return Optional.of(kind);
      }
    }
    return Optional.empty();
  }
}
