package railwalk.chart;

import railwalk.device.TwoPoleCurrent;
import railwalk.device.TwoPoleLaw;

/** The volts across a rectifier plate at a given current, whatever its law. */
final class PlateDrop {
  private static final double MOST_VOLTS = 1000;
  private static final int HALVINGS = 60;

  private PlateDrop() {}

  /** Returns the drop in volts: the law's current rises with them, so halving finds it. */
  static double volts(TwoPoleLaw law, double amps) {
    TwoPoleCurrent current = new TwoPoleCurrent();
    double low = 0;
    double high = MOST_VOLTS;
    for (int i = 0; i < HALVINGS; i++) {
      double middle = (low + high) / 2;
      law.evaluate(middle, current);
      if (current.amps < amps) {
        low = middle;
      } else {
        high = middle;
      }
    }
    return (low + high) / 2;
  }
}
