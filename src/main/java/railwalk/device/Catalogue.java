package railwalk.device;

import java.util.List;
import java.util.Optional;

/** The tube types Railwalk knows, looked up by any of their names. */
public interface Catalogue {
  /** Returns the catalogue that comes with Railwalk; only what is asked for is read. */
  static Catalogue standard() {
    return ResourceCatalogue.Holder.STANDARD;
  }

  /** Returns the names of all types, sorted; aliases are not among them. */
  default List<String> names() {
    return types().stream().map(TubeType::name).toList();
  }

  /** Returns all types, sorted by name. */
  List<TubeType> types();

  /**
   * Returns the type that {@code name} stands for: a name or alias in any case; failing that, the
   * name with suffixes such as A, GT, WA or a tag after an underscore stripped.
   */
  Optional<TubeType> find(String name);

  /** Returns up to three names close to {@code name}, nearest first, for a "did you mean". */
  List<String> near(String name);

  /** Returns the data file of the type that {@code name} stands for, with its published points. */
  Optional<DataFile> file(String name);
}
