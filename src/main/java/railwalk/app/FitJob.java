package railwalk.app;

import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.jspecify.annotations.Nullable;
import railwalk.device.Catalogue;
import railwalk.fit.Refit;
import railwalk.fit.TubeFit;

/** Works out the constants of types' laws anew from their published points. */
public final class FitJob {
  private FitJob() {}

  /** Returns the names of all types that have points of their own to fit. */
  public static List<String> all() {
    return Catalogue.standard().names();
  }

  /**
   * Returns the residual tables of the types called {@code names}.
   *
   * @param folder where their data files with the new constants go; null to write none
   */
  public static String run(List<String> names, @Nullable Path folder) throws CannotDo {
    TubeFit fit = new TubeFit(Catalogue.standard());
    List<Refit> refits = new ArrayList<>();
    for (String name : names) {
      refits.add(fit.refit(TubesJob.file(name).name()));
    }
    StringBuilder tables = new StringBuilder();
    for (Refit refit : refits) {
      tables.append(table(refit));
      if (folder != null) {
        byte[] bytes = refit.dataFile().getBytes(StandardCharsets.UTF_8);
        WholeFile.write(folder.resolve(refit.sheet().type().name() + ".tube"), bytes);
      }
    }
    return tables.toString();
  }

  private static String table(Refit refit) {
    StringBuilder table = new StringBuilder(refit.sheet().type().name());
    if (refit.borrowed()) {
      return table.append(": the law and its points are another type's\n").toString();
    }
    if (refit.sheet().rows().isEmpty()) {
      return table.append(": no published point\n").toString();
    }
    table.append(
        String.format(
            Locale.ROOT,
            ": worst current, bias or drop %.1f %%%n",
            100 * refit.sheet().worstErrorShare()));
    refit.sheet().lines().forEach(line -> table.append("  ").append(line).append('\n'));
    return table.toString();
  }
}
