package railwalk.render.pdf;

import java.util.ArrayList;
import java.util.List;

/**
 * How large the blocks of a page are set that is to fit on one sheet.
 *
 * @param plotHeight points
 * @param smallScale of small print, as a share of the usual size
 * @param blockGap points between blocks
 */
record Fit(double plotHeight, double smallScale, double blockGap) {
  /** Where there is room enough. */
  static final Fit EASY = new Fit(230, 0.82, Style.BLOCK_GAP);

  private static final double LEAST_PLOT_HEIGHT = 120;
  private static final double PLOT_STEP = 10;

  /** Returns the ways to set a page, the roomiest first. */
  static List<Fit> all() {
    List<Fit> all = new ArrayList<>();
    for (double scale : new double[] {EASY.smallScale, 0.74, 0.66, 0.6}) {
      for (double height = EASY.plotHeight; height >= LEAST_PLOT_HEIGHT; height -= PLOT_STEP) {
        all.add(new Fit(height, scale, height < 190 ? 9 : 12));
      }
    }
    return all;
  }
}
