package railwalk.diagnosis;

/** What a reading is against the band of a healthy amplifier. */
public enum Verdict {
  WITHIN("within"),
  LOW("low"),
  HIGH("high"),
  FAR_LOW("far off, low"),
  FAR_HIGH("far off, high"),
  /** Not judged: the place has no figure, or the line is too low for verdicts. */
  NOT_JUDGED("not judged"),
  /** More likely a slip of the hand or the range switch than a fault. */
  QUESTIONED("a slip?");

  private final String word;

  Verdict(String word) {
    this.word = word;
  }

  public String word() {
    return word;
  }

  /** Returns whether it lies outside the band. */
  public boolean outside() {
    return this == LOW || this == HIGH || this == FAR_LOW || this == FAR_HIGH;
  }
}
