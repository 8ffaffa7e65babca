package railwalk.solve;

/**
 * Says how much of a Newton step to take, so that no tube is thrown far beyond where its law was
 * linearised.
 */
interface StepLimit {
  /** Returns the share of {@code step} to take from {@code x}, above 0 up to 1. */
  double share(Devices devices, double[] x, double[] step);

  /** Takes every step whole. */
  StepLimit NONE = (devices, x, step) -> 1;

  /**
   * Lets grid-to-cathode volts of a tube move by {@code gridVolts} and half their size at most,
   * plate and screen volts by {@code plateVolts} and half their size.
   */
  static StepLimit tubes(double gridVolts, double plateVolts) {
    return (devices, x, step) -> {
      double share = 1;
      for (Devices.Amplifier tube : devices.amplifiers) {
        int k = tube.cathode();
        share = Math.min(share, allowed(x, step, tube.grid(), k, gridVolts));
        share = Math.min(share, allowed(x, step, tube.plate(), k, plateVolts));
        if (tube.screen() >= 0) {
          share = Math.min(share, allowed(x, step, tube.screen(), k, plateVolts));
        }
      }
      return Math.max(share, 1e-3);
    };
  }

  private static double allowed(double[] x, double[] step, int a, int b, double volts) {
    double move = Math.abs(DcNetwork.at(step, a) - DcNetwork.at(step, b));
    double most = volts + 0.5 * Math.abs(DcNetwork.at(x, a) - DcNetwork.at(x, b));
    return move <= most ? 1 : most / move;
  }
}
