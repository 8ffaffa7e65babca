package railwalk.chart;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;
import railwalk.device.DataFile;
import railwalk.device.LikeSections;
import railwalk.device.SectionType;
import railwalk.device.TubeType;
import railwalk.fit.TypeSheet;

/**
 * Builds a type's printed page: base and ratings, the curves of each law with the published points
 * on them, the points by number, and the sources.
 */
public final class TubePageBuilder {
  private static final double BASE_SHARE = 0.41;
  private static final double HALF = 0.5;
  private static final String FOOT =
      "Curves are those of the law fitted to the numbered points, not measured ones.";

  private final DataFile file;
  private final TypeSheet sheet;
  private final TubeType type;
  private final List<NumberedPoint> points;

  private TubePageBuilder(DataFile file) {
    this.file = file;
    this.sheet = TypeSheet.of(file);
    this.type = sheet.type();
    this.points = NumberedPoint.of(sheet.rows());
  }

  /** Returns the page of the type in {@code file}. */
  public static TubePage of(DataFile file) {
    return new TubePageBuilder(file).page();
  }

  private TubePage page() {
    List<Block> blocks = new ArrayList<>();
    KeyFigures facts = new KeyFigures(new TypeFacts(type).entries());
    blocks.add(new Abreast(BASE_SHARE, List.of(base()), List.of(facts)));
    List<Plot> plots = new ArrayList<>();
    List<Plot> drops = new ArrayList<>();
    for (LikeSections group : file.likeSections()) {
      SectionType section = type.section(group.first()).orElseThrow();
      if (group.amplify()) {
        CurveField field = new CurveField(section, places(group));
        Plot plate = PlateCurves.of(field, which(group));
        Plot transfer = TransferCurves.of(field, which(group));
        blocks.add(new Abreast(HALF, List.of(plate), List.of(transfer)));
        plots.add(plate);
        plots.add(transfer);
      } else if (group.kind().equals("rectifier")) {
        drops.add(DropCurve.of(section, pointsOf(group)));
      }
    }
    plots.addAll(drops);
    SmallPrint figures = new SmallPrint(figures(plots));
    blocks.add(drops.isEmpty() ? figures : new Abreast(HALF, List.copyOf(drops), List.of(figures)));
    return new TubePage(
        type.name(), String.join(", ", type.aliases()), type.summary(), FOOT, blocks);
  }

  private Block base() {
    Optional<BaseDrawing> drawing = BaseDrawings.of(type);
    return drawing.isPresent()
        ? drawing.get()
        : new Paragraph("Base " + TypeFacts.base(type) + ": pins not confirmed: use electrodes.");
  }

  private List<Block> figures(List<Plot> plots) {
    PointTable table = new PointTable(points, sheet.sources());
    return points.isEmpty()
        ? List.of(table.sources())
        : List.of(
            table.table("Published points, and how far the law is off", outside(plots)),
            table.sources());
  }

  /** Returns the section as a title's last words; nothing where there is one law. */
  private String which(LikeSections group) {
    boolean several = file.likeSections().stream().filter(LikeSections::amplify).count() > 1;
    return several ? ", section " + group.first() : "";
  }

  private List<PointPlace> places(LikeSections group) {
    return pointsOf(group).stream().map(PointPlace::of).flatMap(Optional::stream).toList();
  }

  private List<NumberedPoint> pointsOf(LikeSections group) {
    boolean first = file.likeSections().get(0).equals(group);
    return points.stream()
        .filter(
            p -> p.point().section().isEmpty() ? first : group.ids().contains(p.point().section()))
        .toList();
  }

  /** Returns which points stand on no plot, as a sentence; empty when all stand on one. */
  private String outside(List<Plot> plots) {
    Set<String> shown =
        plots.stream()
            .flatMap(plot -> plot.marks().stream())
            .map(Plot.Mark::number)
            .collect(Collectors.toSet());
    List<String> missing =
        points.stream()
            .map(p -> Integer.toString(p.number()))
            .filter(number -> !shown.contains(number))
            .toList();
    return missing.isEmpty()
        ? ""
        : "On no plot, since a current that it hangs on is not published or it lies outside: "
            + String.join(", ", missing)
            + ".";
  }
}
