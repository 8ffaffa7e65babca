package railwalk.netlist;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import railwalk.device.Catalogue;
import railwalk.device.DataFile;
import railwalk.device.DataFileException;
import railwalk.device.TubeType;
import railwalk.source.Diagnostic;
import railwalk.source.NearNames;
import railwalk.source.SourceSpan;

/**
 * The types that a netlist brings along, before those of the catalogue. Each may be like a type of
 * the catalogue or like one given above it.
 */
final class GivenTypes implements Catalogue {
  /** A law that misses what was given by more than this is worth a word. */
  private static final double POOR_SHARE = 0.05;

  private final Catalogue catalogue;
  private final LawFitter fitter;
  private final Report report;
  private final Map<String, TubeType> types = new LinkedHashMap<>();
  private final Map<String, DataFile> files = new HashMap<>();
  private final Map<String, GivenType> given = new HashMap<>();

  private GivenTypes(Catalogue catalogue, LawFitter fitter, Report report) {
    this.catalogue = catalogue;
    this.fitter = fitter;
    this.report = report;
  }

  /** Returns {@code catalogue} with the types of {@code deck} before its own. */
  static Catalogue before(Catalogue catalogue, Deck deck, LawFitter fitter, Report report) {
    if (deck.types().isEmpty()) {
      return catalogue;
    }
    GivenTypes all = new GivenTypes(catalogue, fitter, report);
    for (Deck.TypeSource source : deck.types()) {
      if (source instanceof Deck.TypeSource.Line line) {
        GivenType type = TubeLine.read(line.card(), deck, all, report);
        if (type != null) {
          all.add(type);
        }
      } else if (source instanceof Deck.TypeSource.File file) {
        TubesFile.read(file.file(), file.word(), report).forEach(all::add);
      }
    }
    return all;
  }

  private void add(GivenType type) {
    Word name = type.name();
    GivenType other = given.putIfAbsent(key(name.text()), type);
    if (other != null) {
      report.add(Problem.TUBE_TWICE, name.span(), name.text(), other.name().span().line());
      return;
    }
    if (isExactlyOf(catalogue, name.text())) {
      report.add(Problem.TUBE_REPLACES, name.span(), name.text());
    }
    Optional<Word> unknown = unknownKin(type);
    if (unknown.isPresent() && !isGiven(unknown.get().text())) {
      String like = unknown.get().text();
      report.add(Problem.TUBE_LIKE, unknown.get().span(), like, NearNames.question(near(like)));
    }
    if (unknown.isPresent() || type.isSpoilt()) {
      return;
    }
    try {
      DataFile file = DataFile.read(type.text(), like -> like(type, like));
      file.points();
      LawFitter.Fitted fitted =
          file.wantsFit() ? fitter.fitted(file) : new LawFitter.Fitted(file, 0);
      TubeType read = fitted.file().type();
      if (fitted.worstErrorShare() > POOR_SHARE) {
        report.add(
            Problem.TUBE_FIT_POOR,
            name.span(),
            name.text(),
            Math.round(100 * fitted.worstErrorShare()));
      }
      types.put(key(name.text()), read);
      files.put(key(name.text()), fitted.file());
      for (String alias : read.aliases()) {
        types.putIfAbsent(key(alias), read);
        files.putIfAbsent(key(alias), fitted.file());
      }
    } catch (DataFileException wrong) {
      Diagnostic said = wrong.diagnostic();
      report.add(
          Problem.TUBE_DATA,
          type.origin(said.span(), type.text()),
          name.text(),
          said.message(),
          said.hint());
    } catch (IllegalArgumentException impossible) {
      report.add(
          Problem.TUBE_DATA, name.span(), name.text(), String.valueOf(impossible.getMessage()), "");
    }
  }

  /** Returns the data file of the type that {@code type} is like. */
  private DataFile like(GivenType type, String like) {
    boolean itself = key(like).equals(key(type.name().text()));
    Optional<DataFile> found = itself ? catalogue.file(like) : file(like);
    return found.orElseThrow();
  }

  /** Returns the type that {@code name} is like; null when there is none. */
  @Nullable TubeType kin(String name, String like) {
    return (key(like).equals(key(name)) ? catalogue.find(like) : find(like)).orElse(null);
  }

  /** Returns the word that names a kin nobody knows. */
  private Optional<Word> unknownKin(GivenType type) {
    for (int number = 1; number <= type.text().lines().size(); number++) {
      String line = type.text().line(number);
      String[] words = line.strip().split("\\s+", 3);
      if (words.length > 1 && words[0].equals("like")) {
        boolean known = kin(type.name().text(), words[1]) != null;
        int column = line.indexOf(words[1], line.indexOf("like") + 4) + 1;
        SourceSpan span = new SourceSpan(type.text(), number, column, words[1].length());
        return known
            ? Optional.empty()
            : Optional.of(new Word(words[1], type.origin(span, type.text()), Word.Form.PLAIN));
      }
    }
    return Optional.empty();
  }

  /** Returns whether {@code name} is a name of a type in {@code catalogue} as it stands. */
  private static boolean isExactlyOf(Catalogue catalogue, String name) {
    return catalogue.find(name).filter(type -> isExactly(type, name)).isPresent();
  }

  /** Returns whether {@code name} is the type's name or one of its aliases, nothing stripped. */
  static boolean isExactly(TubeType type, String name) {
    if (type.name().equalsIgnoreCase(name)) {
      return true;
    }
    for (String alias : type.aliases()) {
      if (alias.equalsIgnoreCase(name)) {
        return true;
      }
    }
    return false;
  }

  /** Returns whether a type of that name was given, even one with mistakes in it. */
  boolean isGiven(String name) {
    return given.containsKey(key(name));
  }

  @Override
  public List<TubeType> types() {
    List<TubeType> all = new ArrayList<>(catalogue.types());
    all.addAll(types.values());
    return all;
  }

  @Override
  public Optional<TubeType> find(String name) {
    TubeType own = types.get(key(name));
    return own == null ? catalogue.find(name) : Optional.of(own);
  }

  @Override
  public List<String> near(String name) {
    List<String> near = new ArrayList<>(NearNames.near(name, types.keySet()));
    near.addAll(catalogue.near(name));
    return near.stream().distinct().limit(3).toList();
  }

  @Override
  public Optional<DataFile> file(String name) {
    DataFile own = files.get(key(name));
    return own == null ? catalogue.file(name) : Optional.of(own);
  }

  private static String key(String name) {
    return name.strip().toUpperCase(Locale.ROOT);
  }
}
