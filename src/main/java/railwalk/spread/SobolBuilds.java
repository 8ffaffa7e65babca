package railwalk.spread;

import java.util.Random;
import java.util.function.DoubleSupplier;
import org.hipparchus.random.SobolSequenceGenerator;
import railwalk.circuit.Circuit;

/**
 * Builds of an amplifier that fill the spread of its parts evenly: the draws of build n are point n
 * of a Sobol sequence (direction numbers of S. Joe and F. Y. Kuo, "Constructing Sobol sequences
 * with better two-dimensional projections", SIAM J. Sci. Comput. 30 (2008)), every coordinate
 * turned over bit by bit with a mask of its own that the seed gives (digital shift: A. B. Owen,
 * "Variance with alternative scramblings of digital nets", ACM Trans. Model. Comput. Simul. 13
 * (2003)). The shift keeps the sequence even, and takes its first point out of the corner.
 */
final class SobolBuilds {
  private static final int BITS = 52;
  private static final double POINTS = 0x1p52;

  private final Circuit nominal;
  private final SobolSequenceGenerator sequence;
  private final long[] masks;

  SobolBuilds(Circuit nominal, long seed) {
    this.nominal = nominal;
    int draws = Math.max(1, RandomBuild.draws(nominal));
    sequence = new SobolSequenceGenerator(draws);
    masks = new long[draws];
    Random random = new Random(seed);
    for (int i = 0; i < draws; i++) {
      masks[i] = random.nextLong() >>> (Long.SIZE - BITS);
    }
  }

  /** Returns the next build. */
  Circuit next() {
    return RandomBuild.of(nominal, new Draws(nextPoint()));
  }

  /** Returns the next point, its coordinates between 0 and 1, both left out. */
  double[] nextPoint() {
    double[] point = sequence.nextVector();
    for (int i = 0; i < point.length; i++) {
      long turned = (long) (point[i] * POINTS) ^ masks[i];
      point[i] = Math.max((double) turned, 0.5) / POINTS;
    }
    return point;
  }

  /** Hands out the coordinates of a point in turn. */
  private static final class Draws implements DoubleSupplier {
    private final double[] point;
    private int next;

    Draws(double[] point) {
      this.point = point;
    }

    @Override
    public double getAsDouble() {
      return point[next++];
    }
  }
}
