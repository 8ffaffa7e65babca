package railwalk.solve;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;

/**
 * Instants of a period, as shares of it: even steps, and finer and finer ones towards each instant
 * at which a rectifier begins or ends to conduct.
 */
final class TimeGrid {
  private static final int EVEN_STEPS = 144;
  private static final int HALVINGS = 6;

  /** Instants closer than this are one. */
  private static final double CLOSEST = 2e-6;

  private TimeGrid() {}

  static double[] of(List<Double> switchings) {
    List<Double> instants = new ArrayList<>();
    for (int k = 0; k <= EVEN_STEPS; k++) {
      instants.add((double) k / EVEN_STEPS);
    }
    for (double switching : switchings) {
      add(instants, switching);
      double away = 1.0 / EVEN_STEPS;
      for (int h = 0; h < HALVINGS; h++) {
        away /= 2;
        add(instants, switching - away);
        add(instants, switching + away);
      }
    }
    Collections.sort(instants);
    List<Double> grid = new ArrayList<>();
    for (double instant : instants) {
      if (grid.isEmpty() || instant - grid.get(grid.size() - 1) > CLOSEST) {
        grid.add(instant);
      }
    }
    grid.set(grid.size() - 1, 1.0);
    double[] shares = new double[grid.size()];
    for (int k = 0; k < shares.length; k++) {
      shares[k] = grid.get(k);
    }
    return shares;
  }

  private static void add(List<Double> instants, double share) {
    if (share > 0 && share < 1) {
      instants.add(share);
    }
  }
}
