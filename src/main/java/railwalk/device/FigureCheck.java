package railwalk.device;

import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;

/**
 * Sees that the lines of a data file speak of the same sections and the same points. One piece of
 * {@link DataFile}.
 */
final class FigureCheck {
  /** The option of a point that a figure on a residual line answers to. */
  private static final Map<String, Set<String>> PUBLISHED =
      Map.of(
          "current", Set.of("current"),
          "screencurrent", Set.of("screencurrent"),
          "cathodecurrent", Set.of("cathodecurrent"),
          "gm", Set.of("gm"),
          "mu", Set.of("mu"),
          "screenmu", Set.of("screenmu"),
          "rp", Set.of("rp"),
          "grid", Set.of("grid", "cathode"),
          "volts", Set.of("load"),
          "drop", Set.of("plate"));

  private final DataFile file;

  FigureCheck(DataFile file) {
    this.file = file;
  }

  /** Complains about the first line that contradicts another. */
  void check() {
    for (String key : List.of("rating", "spread", "point", "fit", "residual")) {
      for (DataLine line : file.all(key)) {
        String id = line.option("section", "");
        if (line.has("section") && !file.sectionIds().contains(id)) {
          throw line.error("section", "no section " + id, "");
        }
      }
    }
    Set<String> kinds = new HashSet<>();
    for (DataLine line : file.all("section")) {
      kinds.add(line.word(line.size() - 1));
    }
    for (DataLine line : file.all("fit")) {
      if (!kinds.contains(line.word(0))) {
        throw line.error(0, "no section is a " + line.word(0), "");
      }
    }
    checkResiduals();
  }

  private void checkResiduals() {
    List<DataLine> points = file.all("point");
    Set<String> told = new HashSet<>();
    for (DataLine line : points) {
      if (!told.add(line.rest())) {
        throw line.error("the very same point stands above", "");
      }
    }
    List<DataLine> residuals = file.all("residual");
    Set<Integer> seen = new HashSet<>();
    for (DataLine line : residuals) {
      int number = (int) line.required("point");
      if (number < 1 || number > points.size() || !seen.add(number)) {
        throw line.error("point", "no point " + number + ", or a second line for it", "");
      }
      DataLine point = points.get(number - 1);
      if (!line.option("section", "").equals(point.option("section", ""))) {
        throw line.error("section", "point " + number + " is another section's", "");
      }
      for (String name : line.optionNames()) {
        if (!isAnswered(name, point)) {
          throw line.error(name, "point " + number + " publishes no " + name, "fit it again");
        }
      }
    }
    if (!residuals.isEmpty() && seen.size() < points.size()) {
      throw residuals.get(0).error("there are points without a residual line", "fit it again");
    }
  }

  private static boolean isAnswered(String figure, DataLine point) {
    boolean answered = figure.equals("point") || figure.equals("section");
    for (String option : PUBLISHED.getOrDefault(figure, Set.of())) {
      answered |= point.has(option);
    }
    return answered;
  }
}
