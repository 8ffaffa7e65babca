package railwalk.netlist;

import railwalk.device.DataFile;

/**
 * Makes the laws of a type that a netlist gives by its published points. The reader stands below
 * the floor that fits, so it is handed in.
 */
@FunctionalInterface
public interface LawFitter {
  /** Fits nothing: types in the netlist then need their constants written out. */
  LawFitter NONE = file -> new Fitted(file, 0);

  /**
   * Returns {@code file} with the constants of its laws.
   *
   * @throws IllegalArgumentException when no law comes near the points
   */
  Fitted fitted(DataFile file);

  /**
   * What comes of it.
   *
   * @param worstErrorShare greatest error of a current (or a rectifier's drop) that was given, as a
   *     share of it
   */
  record Fitted(DataFile file, double worstErrorShare) {}
}
