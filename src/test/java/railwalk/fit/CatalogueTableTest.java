package railwalk.fit;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.junit.jupiter.api.Test;
import railwalk.device.AmplifierLaw;
import railwalk.device.Catalogue;
import railwalk.device.DataFile;
import railwalk.device.SectionType;
import railwalk.device.TubeType;

/**
 * The table of the catalogue in {@code charts/tubes/CATALOGUE.md} is what the data files say.
 * Written again with {@code -Dcatalogue.write=true}.
 */
class CatalogueTableTest {
  private static final Path TABLE = Path.of("charts/tubes/CATALOGUE.md");
  private static final Catalogue CATALOGUE = Catalogue.standard();

  @Test
  void theTableIsWhatTheDataFilesSay() throws IOException {
    String table = table();
    if (Boolean.getBoolean("catalogue.write")) {
      Files.writeString(TABLE, table);
    }
    assertThat(Files.readString(TABLE).replace("\r\n", "\n")).isEqualTo(table);
  }

  private static String table() {
    StringBuilder table =
        new StringBuilder(
            """
            # The amplifying types and how well their laws meet the sheets

            Written by `CatalogueTableTest` from the data files in
            `src/main/resources/railwalk/device`. Errors are the law's against the published figure,
            the greatest over the rows of high confidence that were printed for the type itself;
            near cut-off the bias is compared. "Rows" counts those rows, and all that the fit uses,
            medium confidence and like types among them. Constants of a type without a row of its
            own rest on the other rows alone. "By electrode" is said of types for whose pins no
            source is at hand.

            | type | other names | wired | rows | current | bias | gm | screen current |
            |---|---|---|---|---|---|---|---|
            """);
    List<TypeSheet> sheets = new ArrayList<>();
    for (String name : CATALOGUE.names()) {
      DataFile file = CATALOGUE.file(name).orElseThrow();
      TubeType type = file.type();
      if (!amplifies(type)) {
        continue;
      }
      if (file.borrowsLaw()) {
        line(
            table,
            type,
            "the law of " + file.like().map(DataFile::name).orElseThrow(),
            "",
            "",
            "",
            "");
        continue;
      }
      TypeSheet sheet = TypeSheet.of(file);
      sheets.add(sheet);
      long own = file.points().stream().filter(p -> p.credit().isHigh()).count();
      line(
          table,
          type,
          own + " of " + file.points().size(),
          worst(sheet, FigureKind.PLATE_CURRENT, FigureKind.CATHODE_CURRENT),
          worst(sheet, FigureKind.BIAS, FigureKind.BIAS),
          worst(sheet, FigureKind.MUTUAL_CONDUCTANCE, FigureKind.MUTUAL_CONDUCTANCE),
          worst(sheet, FigureKind.SCREEN_CURRENT, FigureKind.SCREEN_CURRENT));
    }
    return table.append('\n').append(summary(sheets)).toString();
  }

  private static boolean amplifies(TubeType type) {
    return type.sections().stream().map(SectionType::law).anyMatch(AmplifierLaw.class::isInstance);
  }

  private static void line(StringBuilder table, TubeType type, String... cells) {
    table
        .append("| ")
        .append(type.name())
        .append(" | ")
        .append(String.join(", ", type.aliases()))
        .append(" | ")
        .append(type.pins().isEmpty() ? "by electrode" : type.base())
        .append(" | ")
        .append(String.join(" | ", cells))
        .append(" |\n");
  }

  private static List<Comparison> rows(List<TypeSheet> sheets, FigureKind kind, FigureKind or) {
    return sheets.stream()
        .flatMap(sheet -> sheet.rows().stream())
        .filter(r -> r.measure() == kind || r.measure() == or)
        .filter(r -> r.point().credit().isHigh())
        .toList();
  }

  private static String worst(TypeSheet sheet, FigureKind kind, FigureKind or) {
    return rows(List.of(sheet), kind, or).stream()
        .map(Comparison::errorShare)
        .max((a, b) -> Double.compare(Math.abs(a), Math.abs(b)))
        .map(e -> PointWords.percent(e) + " %")
        .orElse("");
  }

  private static String summary(List<TypeSheet> sheets) {
    StringBuilder summary =
        new StringBuilder("| all types | rows | median | 90 % within | worst |\n");
    summary.append("|---|---|---|---|---|\n");
    for (FigureKind kind :
        List.of(
            FigureKind.PLATE_CURRENT,
            FigureKind.BIAS,
            FigureKind.MUTUAL_CONDUCTANCE,
            FigureKind.SCREEN_CURRENT)) {
      double[] errors =
          rows(sheets, kind, kind).stream()
              .mapToDouble(r -> 100 * Math.abs(r.errorShare()))
              .sorted()
              .toArray();
      summary.append(
          String.format(
              Locale.ROOT,
              "| %s | %d | %.1f %% | %.1f %% | %.1f %% |%n",
              kind.words(),
              errors.length,
              errors[errors.length / 2],
              errors[(int) Math.ceil(0.9 * errors.length) - 1],
              errors[errors.length - 1]));
    }
    return summary.toString();
  }
}
