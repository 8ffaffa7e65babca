package railwalk.circuit;

/** Which of the trade's two vocabularies the output speaks. */
public enum Words {
  AMERICAN,
  BRITISH
}
