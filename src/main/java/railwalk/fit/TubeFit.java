package railwalk.fit;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import railwalk.device.Catalogue;
import railwalk.device.DataFile;
import railwalk.device.LikeSections;
import railwalk.device.PublishedPoint;

/**
 * Makes the constants of a type's laws from the published points in its data file. The way to every
 * constant of the catalogue; nothing is typed in.
 */
public final class TubeFit {
  private final Catalogue catalogue;

  /** Fits types of {@code catalogue}. */
  public TubeFit(Catalogue catalogue) {
    this.catalogue = catalogue;
  }

  /**
   * Returns the type's data file with constants fitted anew, and how well they meet the points. A
   * type that borrows its law from a like one keeps its file as it is.
   *
   * @throws IllegalArgumentException when the catalogue has no such type
   */
  public Refit refit(String type) {
    DataFile file =
        catalogue
            .file(type)
            .orElseThrow(() -> new IllegalArgumentException("unknown tube type " + type));
    return refit(file);
  }

  private static Refit refit(DataFile file) {
    if (file.borrowsLaw()) {
      return new Refit(String.join("\n", file.text().lines()), TypeSheet.of(file), true);
    }
    List<String> lines = new ArrayList<>();
    List<LikeSections> groups = file.likeSections();
    for (LikeSections group : groups) {
      boolean alone = groups.stream().filter(g -> g.kind().equals(group.kind())).count() == 1;
      String section = alone ? "" : " section=" + group.first();
      lines.add("fit      " + group.kind() + section + constants(group.kind(), file.points(group)));
    }
    DataFile fitted = file.with(lines);
    TypeSheet sheet = TypeSheet.of(fitted);
    lines.addAll(residuals(fitted, sheet));
    return new Refit(String.join("\n", file.with(lines).text().lines()), sheet, false);
  }

  /** Returns the {@code name=value} words of a fit line for sections of kind {@code word}. */
  static String constants(String word, List<PublishedPoint> points) {
    if (word.equals("vapour")) {
      StringBuilder words = new StringBuilder();
      Curve.append(words, "drop", PerveanceFit.arcDrop(points));
      return words.toString();
    }
    if (word.equals("rectifier") || word.equals("diode")) {
      StringBuilder words = new StringBuilder();
      Curve.append(words, "perveance", PerveanceFit.perveance(word, points));
      return words.toString();
    }
    Curve curve = Curve.named(word);
    return curve.words(LeastSquaresFit.constants(curve, points));
  }

  /** Returns a line for each point with the errors in per cent of its figures. */
  private static List<String> residuals(DataFile file, TypeSheet sheet) {
    List<String> lines = new ArrayList<>();
    int number = 0;
    for (PublishedPoint point : file.points()) {
      number++;
      String section = point.section().isEmpty() ? "" : " section=" + point.section();
      StringBuilder line = new StringBuilder("residual point=" + number + section);
      for (Comparison row : sheet.rows()) {
        if (row.point().equals(point)) {
          line.append(
              String.format(
                  Locale.ROOT, " %s=%+.1f%%", row.measure().key(), 100 * row.errorShare()));
        }
      }
      lines.add(line.toString());
    }
    return lines;
  }
}
