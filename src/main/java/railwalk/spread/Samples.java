package railwalk.spread;

import java.util.Arrays;
import java.util.Optional;
import railwalk.solve.BuildSolver;
import railwalk.solve.OperatingPoint;

/**
 * Figures read off many builds of one amplifier: how each of them lies from build to build, without
 * any straight line put in place of the tubes' laws.
 */
public final class Samples {
  /** What is read off a build: volts, a drop, a current, all in the same order for every build. */
  public interface Figures {
    /** Returns the figures of {@code build}, which holds for this call only. */
    double[] of(OperatingPoint build);
  }

  private final double[][] sorted;
  private final Sampling sampling;

  private Samples(double[][] sorted, Sampling sampling) {
    this.sorted = sorted;
    this.sampling = sampling;
  }

  /**
   * Draws {@code builds} of a solved amplifier and reads {@code figures} off each. Builds that do
   * not settle are left out and counted.
   *
   * @param nominal as {@link railwalk.solve.OperatingPointSolver} returned it
   * @param seed of the draws: the same seed gives the same figures
   */
  public static Samples of(OperatingPoint nominal, int builds, long seed, Figures figures) {
    SobolBuilds drawn = new SobolBuilds(nominal.circuit(), seed);
    BuildSolver solver = new BuildSolver(nominal);
    int count = figures.of(nominal).length;
    double[][] values = new double[count][builds];
    int settled = 0;
    for (int build = 0; build < builds; build++) {
      Optional<OperatingPoint> point = solver.solve(drawn.next());
      if (point.isPresent()) {
        double[] read = figures.of(point.get());
        for (int f = 0; f < count; f++) {
          values[f][settled] = read[f];
        }
        settled++;
      }
    }
    for (int f = 0; f < count; f++) {
      values[f] = Arrays.copyOf(values[f], settled);
      Arrays.sort(values[f]);
    }
    return new Samples(values, new Sampling(builds, seed, builds - settled));
  }

  /** Returns how the builds were drawn. */
  public Sampling sampling() {
    return sampling;
  }

  /**
   * Returns the figure under which {@code share} of the builds lie, between two builds in
   * proportion; NaN where nothing was read.
   *
   * @param figure its number in {@link Figures#of}
   */
  public double quantile(int figure, double share) {
    double[] values = sorted[figure];
    if (values.length == 0) {
      return Double.NaN;
    }
    double place = Math.min(Math.max(share * values.length - 0.5, 0), values.length - 1);
    int below = (int) place;
    int above = Math.min(below + 1, values.length - 1);
    return values[below] + (place - below) * (values[above] - values[below]);
  }
}
