package railwalk.app;

import railwalk.chart.CataloguePage;
import railwalk.chart.Page;
import railwalk.chart.TypePage;
import railwalk.device.Catalogue;
import railwalk.device.DataFile;
import railwalk.fit.TypeSheet;
import railwalk.render.text.TextRenderer;

/** Looks things up in the catalogue of tube types. */
public final class TubesJob {
  private TubesJob() {}

  /** Returns the list of all types as text. */
  public static String list() {
    return print(CataloguePage.of(Catalogue.standard().types()));
  }

  /** Returns one type's page as text. */
  public static String show(String name) throws CannotDo {
    return print(TypePage.of(TypeSheet.of(file(name))));
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
