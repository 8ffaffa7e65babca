package railwalk.solve;

/**
 * Where one tube section stands: volts against its cathode (filament middle), ampere into each
 * electrode positive. What a kind of tube does not have is NaN.
 */
public record SectionPoint(
    double plateVolts,
    double screenVolts,
    double gridVolts,
    double plateAmps,
    double screenAmps,
    double gridAmps) {

  /** Returns the watts turned to heat at the plate. */
  public double plateWatts() {
    return plateVolts * plateAmps;
  }

  /** Returns the watts turned to heat at the screen; NaN without one. */
  public double screenWatts() {
    return screenVolts * screenAmps;
  }

  /** Returns the current out of the cathode. */
  public double cathodeAmps() {
    return plateAmps
        + (Double.isNaN(screenAmps) ? 0 : screenAmps)
        + (Double.isNaN(gridAmps) ? 0 : gridAmps);
  }
}
