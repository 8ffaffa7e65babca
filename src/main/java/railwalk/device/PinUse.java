package railwalk.device;

import org.jspecify.annotations.Nullable;

/**
 * What one socket pin leads to.
 *
 * @param role whether it is an electrode, unused, or a connection that must be left alone
 * @param section id of the section it belongs to; empty for heaters, sleeves and unused pins, and
 *     for an electrode that several sections share
 * @param electrode null unless the role is ELECTRODE
 */
public record PinUse(Role role, String section, @Nullable Electrode electrode) {
  /** Kinds of pins. */
  public enum Role {
    /** A plate, grid, cathode, heater and so on. */
    ELECTRODE,
    /** Nothing inside: free for use as a tie point. */
    EMPTY,
    /** Connected inside though it is no electrode; to be left free. */
    INTERNAL,
    /** A screening plate between sections or around the tube. */
    SHIELD,
    /** The metal shell or base sleeve. */
    SLEEVE
  }
}
