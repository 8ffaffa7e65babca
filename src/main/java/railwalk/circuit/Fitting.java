package railwalk.circuit;

import java.util.List;
import org.jspecify.annotations.Nullable;
import railwalk.device.Electrode;

/**
 * A tube in its socket: what {@link Socket} makes of a type and the wires to it.
 *
 * @param elements its sections, the wired parts of its heater, and the connections it makes inside
 * @param remarks what was assumed or looks odd
 */
public record Fitting(Bottle bottle, List<Element> elements, List<Remark> remarks) {
  public Fitting {
    elements = List.copyOf(elements);
    remarks = List.copyOf(remarks);
  }

  /**
   * One thing to tell the reader.
   *
   * @param part the section's or tube's name
   * @param electrode which electrode; null where none is meant
   * @param pins the socket pins concerned, rising; empty when the wiring is not by pin
   */
  public record Remark(Kind kind, String part, @Nullable Electrode electrode, List<Integer> pins) {
    public Remark {
      pins = List.copyOf(pins);
    }
  }

  /** Kinds of remarks. */
  public enum Kind {
    /** An electrode of a wired section that nothing is connected to. */
    ELECTRODE_OPEN,
    /** Pins on two nodes that the tube joins inside. */
    PINS_JOINED,
    /** A suppressor that is not listed: taken as tied to the cathode. */
    SUPPRESSOR_TIED,
    /** A tie point on a pin that leads somewhere inside the tube. */
    TIE_POINT_IN_USE,
    /** No section has a plate or grid wired: the tube does nothing. */
    NO_SECTION
  }
}
