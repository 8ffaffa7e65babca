package railwalk.fit;

import railwalk.device.AmplifierLaw;
import railwalk.device.PublishedPoint;
import railwalk.device.SectionCurrents;

/**
 * Finds the grid volts at which a law passes a given small current. One piece of the comparison.
 */
final class CutOff {
  private static final int STEPS = 200;
  private static final double LONGEST_STEP_VOLTS = 5;

  private CutOff() {}

  /**
   * Returns the grid volts at which the plate current is the published one: Newton's method on the
   * current's logarithm, which rises with the grid and bends down. NaN when not found.
   */
  static double gridVolts(AmplifierLaw law, PublishedPoint point) {
    PublishedPoint.Setup setup = point.setup();
    boolean joined = setup.triodeConnected();
    double screen =
        joined ? setup.plateVolts() : Double.isNaN(setup.screenVolts()) ? 0 : setup.screenVolts();
    SectionCurrents is = new SectionCurrents();
    double grid = setup.gridVolts();
    for (int step = 0; step < STEPS; step++) {
      law.evaluate(setup.plateVolts(), screen, grid, is);
      double amps = is.plateAmps + (joined ? is.screenAmps : 0);
      double slope = is.plateByGridSiemens + (joined ? is.screenByGridSiemens : 0);
      double push =
          amps > 0 && slope > 0
              ? Math.log(point.published().plateAmps() / amps) * amps / slope
              : LONGEST_STEP_VOLTS;
      grid += Math.max(-LONGEST_STEP_VOLTS, Math.min(LONGEST_STEP_VOLTS, push));
      if (Math.abs(push) < 1e-10) {
        return grid;
      }
    }
    return Double.NaN;
  }
}
