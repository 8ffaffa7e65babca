package railwalk.chart;

import java.util.List;

/**
 * A tube's base seen from below.
 *
 * @param title above the drawing
 * @param mark what tells the first pin from the last
 * @param contacts in the order of their numbers
 * @param cap what the top cap leads to; empty without one
 */
public record BaseDrawing(String title, Mark mark, List<Contact> contacts, String cap)
    implements Block {
  /** What tells where counting starts. It stands at the bottom of the drawing. */
  public enum Mark {
    /** The key of an octal or loctal spigot. */
    KEY,
    /** A wider gap between the pins. */
    GAP,
    /** A bead on the side of the glass or its collar. */
    BEAD,
    /** Two pins thicker than the others. */
    THICK_PINS
  }

  /**
   * One pin.
   *
   * @param degrees where it stands, clockwise from the bottom as seen from below
   * @param thick whether it is one of the two thick pins
   * @param present whether there is a pin: some bases leave out a place
   * @param leadsTo the electrode, or a word on what else it is
   * @param live whether anything inside is connected to it
   */
  public record Contact(
      int number, double degrees, boolean thick, boolean present, String leadsTo, boolean live) {}

  public BaseDrawing {
    contacts = List.copyOf(contacts);
  }

  @Override
  public void accept(BlockVisitor visitor) {
    visitor.visit(this);
  }
}
