package railwalk.solve;

import java.util.Arrays;

/** One way of bringing a network to rest. {@link DcSolver} tries one after the other. */
interface Strategy {
  /** Returns the name that the trace shows. */
  String name();

  /** Returns whether the network settled at the real sources without ties; {@code x} then holds. */
  boolean settle(Newton newton, double[] x);

  /** Newton's method from where it stands. */
  record Plain() implements Strategy {
    @Override
    public String name() {
      return "plain Newton";
    }

    @Override
    public boolean settle(Newton newton, double[] x) {
      return newton.run(x, 1, 0);
    }
  }

  /**
   * Ties every node to the reference by a conductance, and takes that away decade by decade: the
   * last run is without any. Where only dark tubes lead to a node it floats and no answer is the
   * only one; then the last tied one holds if currents balance in it without the ties.
   */
  record FadingTies() implements Strategy {
    private static final double FIRST_SIEMENS = 1e-2;
    private static final double LAST_SIEMENS = 1e-12;
    private static final double AFLOAT_AMPS = 1e-9;

    @Override
    public String name() {
      return "fading ties (gmin stepping)";
    }

    @Override
    public boolean settle(Newton newton, double[] x) {
      Arrays.fill(x, 0);
      double ratio = 10;
      double siemens = FIRST_SIEMENS;
      double[] good = x.clone();
      if (!newton.run(x, 1, siemens)) {
        return false;
      }
      while (siemens > LAST_SIEMENS) {
        System.arraycopy(x, 0, good, 0, x.length);
        double next = siemens / ratio;
        if (newton.run(x, 1, next)) {
          siemens = next;
          ratio = Math.min(10, ratio * ratio);
        } else {
          System.arraycopy(good, 0, x, 0, x.length);
          ratio = Math.sqrt(ratio);
          if (ratio < 1.01) {
            return false;
          }
        }
      }
      System.arraycopy(x, 0, good, 0, x.length);
      if (newton.run(x, 1, 0)) {
        return true;
      }
      System.arraycopy(good, 0, x, 0, x.length);
      return newton.balanced(x, AFLOAT_AMPS);
    }
  }

  /** Raises all sources together from nothing. */
  record RisingSources() implements Strategy {
    @Override
    public String name() {
      return "rising sources";
    }

    @Override
    public boolean settle(Newton newton, double[] x) {
      Arrays.fill(x, 0);
      double drive = 0;
      double pace = 0.1;
      double[] good = x.clone();
      while (drive < 1) {
        double next = Math.min(1, drive + pace);
        if (newton.run(x, next, 0)) {
          drive = next;
          pace = Math.min(0.25, 2 * pace);
          System.arraycopy(x, 0, good, 0, x.length);
        } else {
          System.arraycopy(good, 0, x, 0, x.length);
          pace /= 4;
          if (pace < 1e-4) {
            return false;
          }
        }
      }
      return true;
    }
  }
}
