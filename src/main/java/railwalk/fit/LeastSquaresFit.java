package railwalk.fit;

import java.util.List;
import java.util.Objects;
import org.hipparchus.linear.Array2DRowRealMatrix;
import org.hipparchus.linear.ArrayRealVector;
import org.hipparchus.linear.RealMatrix;
import org.hipparchus.linear.RealVector;
import org.hipparchus.optim.nonlinear.vector.leastsquares.LeastSquaresBuilder;
import org.hipparchus.optim.nonlinear.vector.leastsquares.LeastSquaresOptimizer;
import org.hipparchus.optim.nonlinear.vector.leastsquares.LevenbergMarquardtOptimizer;
import org.hipparchus.optim.nonlinear.vector.leastsquares.MultivariateJacobianFunction;
import org.hipparchus.util.Pair;
import railwalk.device.AmplifierLaw;
import railwalk.device.PublishedPoint;

/**
 * Constants of an amplifier law from published points by the Levenberg-Marquardt method (Hipparchus
 * after MINPACK's lmder: Moré, Garbow, Hillstrom 1980). What is made small is the sum of squares of
 * ln(law / published) over each figure's tolerance, and of each constant's distance from its {@link
 * Curve} prior over the prior's width. Same points, same constants.
 */
final class LeastSquaresFit {
  private static final int EVALUATIONS = 5000;
  private static final double DIFFERENCE_STEP = 1e-5;
  private static final double CONVERGED = 1e-12;

  /** Stands for a figure the law never reaches: ten times too small. */
  private static final double NEVER = Math.log(0.1);

  private final Curve curve;
  private final Comparer comparer;
  private final double[] centres;

  private LeastSquaresFit(Curve curve, List<PublishedPoint> points) {
    this.curve = curve;
    this.comparer = new Comparer(points);
    this.centres = new double[curve.constants().size()];
    for (int i = 0; i < centres.length; i++) {
      Curve.Constant constant = curve.constants().get(i);
      centres[i] = constant.logarithmic() ? Math.log(constant.centre()) : constant.centre();
    }
  }

  /** Returns the constants in the order of {@code curve}. */
  static double[] constants(Curve curve, List<PublishedPoint> points) {
    LeastSquaresFit fit = new LeastSquaresFit(curve, points);
    return fit.natural(fit.solve(fit.start(points)));
  }

  private RealVector start(List<PublishedPoint> points) {
    RealVector start = new ArrayRealVector(centres);
    points.stream()
        .mapToDouble(
            p -> Double.isNaN(p.published().mu()) ? p.published().screenMu() : p.published().mu())
        .filter(mu -> !Double.isNaN(mu))
        .average()
        .ifPresent(mu -> start.setEntry(0, Math.log(mu)));
    // kg divides all currents: one step brings the first current to its place.
    List<Comparison> first = comparer.compare(curve.law(natural(start)));
    first.stream()
        .filter(
            c -> c.measure() == FigureKind.PLATE_CURRENT && c.point().setup().cathodeOhms() == 0)
        .findFirst()
        .ifPresent(c -> start.addToEntry(2, Math.log(c.law() / c.published())));
    return start;
  }

  private RealVector solve(RealVector start) {
    MultivariateJacobianFunction model = q -> new Pair<>(residuals(q), jacobian(q));
    LeastSquaresOptimizer.Optimum optimum =
        new LevenbergMarquardtOptimizer()
            .withCostRelativeTolerance(CONVERGED)
            .withParameterRelativeTolerance(CONVERGED)
            .optimize(
                new LeastSquaresBuilder()
                    .start(start)
                    .model(model)
                    .target(new double[residuals(start).getDimension()])
                    .maxEvaluations(EVALUATIONS)
                    .maxIterations(EVALUATIONS)
                    .build());
    return optimum.getPoint();
  }

  private RealVector residuals(RealVector q) {
    AmplifierLaw law = curve.law(natural(q));
    List<Comparison> fitted =
        comparer.compare(law).stream().filter(c -> Double.isFinite(c.toleranceShare())).toList();
    double[] residuals = new double[fitted.size() + centres.length];
    for (int i = 0; i < fitted.size(); i++) {
      Comparison c = fitted.get(i);
      double ratio = c.law() / c.published();
      residuals[i] = (ratio > 0.1 ? Math.log(ratio) : NEVER) / c.toleranceShare();
    }
    for (int i = 0; i < centres.length; i++) {
      residuals[fitted.size() + i] =
          (q.getEntry(i) - centres[i]) / curve.constants().get(i).width();
    }
    return new ArrayRealVector(residuals, false);
  }

  private RealMatrix jacobian(RealVector q) {
    RealMatrix jacobian = null;
    for (int i = 0; i < centres.length; i++) {
      RealVector up = q.copy();
      up.addToEntry(i, DIFFERENCE_STEP);
      RealVector down = q.copy();
      down.addToEntry(i, -DIFFERENCE_STEP);
      RealVector column = residuals(up).subtract(residuals(down)).mapDivide(2 * DIFFERENCE_STEP);
      if (jacobian == null) {
        jacobian = new Array2DRowRealMatrix(column.getDimension(), centres.length);
      }
      jacobian.setColumnVector(i, column);
    }
    return Objects.requireNonNull(jacobian);
  }

  private double[] natural(RealVector q) {
    double[] natural = q.toArray();
    for (int i = 0; i < natural.length; i++) {
      if (curve.constants().get(i).logarithmic()) {
        natural[i] = Math.exp(natural[i]);
      }
    }
    return natural;
  }
}
