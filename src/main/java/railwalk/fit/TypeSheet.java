package railwalk.fit;

import java.util.List;
import java.util.Locale;
import railwalk.device.AmplifierLaw;
import railwalk.device.DataFile;
import railwalk.device.PublishedPoint;
import railwalk.device.RectifierLaw;
import railwalk.device.SectionLaw;
import railwalk.device.SectionType;
import railwalk.device.TubeType;
import railwalk.device.VapourLaw;

/**
 * One type as a sheet: pins, ratings and heater through {@code type}, and every published figure
 * beside what the law gives.
 *
 * @param rows in file order, a row for each figure of each point
 * @param sources where pins, ratings, spread and points come from
 */
public record TypeSheet(TubeType type, List<Comparison> rows, List<String> sources) {
  /** Keeps copies of the lists. */
  public TypeSheet {
    rows = List.copyOf(rows);
    sources = List.copyOf(sources);
  }

  /** Returns the sheet of the type in {@code file}, with the law that the file holds. */
  public static TypeSheet of(DataFile file) {
    TubeType type = file.type();
    List<Comparison> rows =
        file.likeSections().stream()
            .flatMap(group -> compare(law(type, group.first()), file.points(group)).stream())
            .toList();
    return new TypeSheet(type, rows, List.copyOf(file.sources().values()));
  }

  private static SectionLaw law(TubeType type, String section) {
    return type.section(section).map(SectionType::law).orElseThrow();
  }

  /** Returns each figure of {@code points} beside {@code law}. */
  static List<Comparison> compare(SectionLaw law, List<PublishedPoint> points) {
    if (law instanceof AmplifierLaw amplifier) {
      return new Comparer(points).compare(amplifier);
    }
    if (law instanceof RectifierLaw rectifier) {
      return points.stream().map(p -> PerveanceFit.compare(rectifier, p)).toList();
    }
    if (law instanceof VapourLaw vapour) {
      return points.stream().map(p -> PerveanceFit.compare(vapour, p)).toList();
    }
    return List.of();
  }

  /** Returns the greatest error of the plate current (or bias, or drop) over all rows, a share. */
  public double worstErrorShare() {
    return rows.stream()
        .filter(r -> r.measure().decides())
        .mapToDouble(r -> Math.abs(r.errorShare()))
        .max()
        .orElse(0);
  }

  /** Returns the rows as text, a line each: point, figure, published, law, error. */
  public List<String> lines() {
    int width = rows.stream().mapToInt(r -> r.pointWords().length()).max().orElse(1);
    String format = "%-" + width + "s  %-15s %9s %9s %6s %%";
    return rows.stream()
        .map(
            r ->
                String.format(
                    Locale.ROOT,
                    format,
                    r.pointWords(),
                    r.measure().words(),
                    r.publishedWords(),
                    r.lawWords(),
                    r.errorWords()))
        .toList();
  }
}
