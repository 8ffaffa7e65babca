package railwalk.device;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.ConcurrentHashMap;
import railwalk.source.SourceText;

/**
 * The catalogue that comes with Railwalk: an {@code index} of names beside one data file per type.
 * Only the index is read at first; a type's file when it is asked for.
 */
final class ResourceCatalogue implements Catalogue {
  private static final String INDEX = "index";

  /** Key of the index lines that list names of other tubes. */
  private static final String NOT = "not";

  private final List<String> names;
  private final Map<String, List<String>> aliases = new HashMap<>();
  private final TypeNames typeNames = new TypeNames();
  private final Map<String, TubeType> types = new ConcurrentHashMap<>();

  ResourceCatalogue() {
    List<DataLine> index = DataLine.of(text(INDEX));
    for (DataLine line : index) {
      if (line.key().equals(NOT)) {
        line.words().forEach(typeNames::exclude);
        continue;
      }
      typeNames.put(line.key(), line.key());
      aliases.put(line.key(), line.words());
      line.words().forEach(alias -> typeNames.put(alias, line.key()));
    }
    names = aliases.keySet().stream().sorted().toList();
  }

  @Override
  public List<String> names() {
    return names;
  }

  @Override
  public List<TubeType> types() {
    return names.stream().map(this::type).toList();
  }

  @Override
  public Optional<TubeType> find(String name) {
    return typeNames.find(name).map(this::type);
  }

  @Override
  public List<String> near(String name) {
    return typeNames.near(name);
  }

  @Override
  public Optional<DataFile> file(String name) {
    return typeNames.find(name).map(ResourceCatalogue::read);
  }

  /** Returns the aliases of {@code type} that the index lists. */
  List<String> namesOf(String type) {
    return aliases.getOrDefault(type, List.of());
  }

  private TubeType type(String name) {
    return types.computeIfAbsent(name, n -> read(n).type());
  }

  private static DataFile read(String type) {
    return DataFile.read(text(type + ".tube"), ResourceCatalogue::read);
  }

  private static SourceText text(String resource) {
    try (InputStream in = ResourceCatalogue.class.getResourceAsStream(resource)) {
      if (in == null) {
        throw new IllegalStateException("the catalogue has no " + resource);
      }
      return SourceText.of(resource, new String(in.readAllBytes(), StandardCharsets.UTF_8));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /** Reads the index once, on first use. */
  static final class Holder {
    static final ResourceCatalogue STANDARD = new ResourceCatalogue();

    private Holder() {}
  }
}
