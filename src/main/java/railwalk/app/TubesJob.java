package railwalk.app;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;
import railwalk.chart.Alternative;
import railwalk.chart.Alternatives;
import railwalk.chart.CataloguePage;
import railwalk.chart.Page;
import railwalk.chart.StagesIdle;
import railwalk.chart.TubePageBuilder;
import railwalk.chart.TypePage;
import railwalk.device.Catalogue;
import railwalk.device.DataFile;
import railwalk.device.TubeType;
import railwalk.render.pdf.Paper;
import railwalk.render.pdf.TubePageRenderer;
import railwalk.render.text.TextRenderer;

/** Looks things up in the catalogue of tube types. */
public final class TubesJob {
  private TubesJob() {}

  /** Returns the list of the types asked for as text. */
  public static String list(TubeFilter filter) throws CannotDo {
    return print(CataloguePage.of(filter.of(Catalogue.standard())));
  }

  /**
   * Returns one type's page as text.
   *
   * @param netlist an amplifier in which its alternatives are tried
   */
  public static String show(String name, Optional<Path> netlist) throws CannotDo {
    DataFile file = file(name);
    List<Alternative> alternatives = Alternatives.of(file, Catalogue.standard().types());
    Optional<StagesIdle> idle = Optional.empty();
    if (netlist.isPresent()) {
      idle = Optional.of(Substitutes.of(file.type(), alternatives, netlist.get()));
    }
    return print(TypePage.of(file, alternatives, idle));
  }

  /** Writes one type's page to {@code target} as a PDF, whole or not at all. */
  public static void write(String name, Path target, Paper paper) throws CannotDo {
    write(file(name), target, paper);
  }

  /**
   * Writes the page of every type asked for into {@code folder}, which is made when it is missing.
   *
   * @param progress is told of each type before its page is written: "12AX7, 3 of 118"
   * @return how many pages there are
   */
  public static int writeAll(TubeFilter filter, Path folder, Paper paper, Consumer<String> progress)
      throws CannotDo {
    List<TubeType> types = filter.of(Catalogue.standard());
    try {
      Files.createDirectories(folder);
    } catch (IOException failure) {
      throw new CannotDo("cannot make " + folder + ": " + WholeFile.reason(failure));
    }
    int count = 0;
    for (TubeType type : types) {
      count++;
      progress.accept(type.name() + ", " + count + " of " + types.size());
      write(file(type.name()), folder.resolve(fileName(type.name())), paper);
    }
    return count;
  }

  /** Returns the name of the file that holds the page of {@code type}. */
  private static String fileName(String type) {
    return type.replaceAll("[^A-Za-z0-9+-]", "_") + ".pdf";
  }

  private static void write(DataFile file, Path target, Paper paper) throws CannotDo {
    WholeFile.write(target, new TubePageRenderer().render(TubePageBuilder.of(file), paper));
  }

  /** Returns the data file of the type called {@code name}. */
  static DataFile file(String name) throws CannotDo {
    return Catalogue.standard().file(name).orElseThrow(() -> unknown(name));
  }

  private static CannotDo unknown(String name) {
    String near = String.join(", ", Catalogue.standard().near(name));
    return new CannotDo(
        "unknown tube type " + name + (near.isEmpty() ? "" : ": did you mean " + near + "?"));
  }

  private static String print(Page page) {
    return new TextRenderer().render(page);
  }
}
