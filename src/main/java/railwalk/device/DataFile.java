package railwalk.device;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.function.Function;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import railwalk.source.SourceText;

/**
 * One type's data file: lines of a key word and what it says.
 *
 * <pre>
 * type     12AX7                       name that charts print
 * like     12AT7                       every key not given here is taken from that type's file
 * alias    ECC83 7025                  names of the very same tube
 * summary  high-mu twin triode
 * base     9A noval                    base code and kind of socket
 * heater   12.6V 0.15A tap=6.3V        further lines: other rated connections; direct, joined
 * section  A triode                    id (none when it is the only one) and
 *                                      triode, pentode, beam, rectifier, regulator or diode
 * pin      1 A plate                   number, section id (none when all share it), electrode, or
 *                                      empty, internal, shield, sleeve
 * rating   system=design-centre plate=300V platewatts=1W
 * spread   0.70 1.30                   current of new tubes at fixed volts as shares, two sigma
 * source   rca54 RCA sheet 11-5-1954   id and text
 * point    plate=250V grid=-2V current=1.2mA gm=1.6mS source=rca54 …     see {@link PublishedPoint}
 * gas      strike=185V operating=151V minimum=5mA maximum=30mA regulation=2V
 *                                      volts it surely lights at, volts at mid current, rated
 *                                      current, change of volts over it
 * fit      triode mu=105.9412 …        constants, as railwalk.fit writes them
 * residual …                           how well the law meets each point, as railwalk.fit writes it
 * </pre>
 *
 * Read by {@link Catalogue} for types and by railwalk.fit for points; the same words serve a type
 * given in a netlist.
 */
public final class DataFile {
  private static final Set<String> ONCE =
      Set.of("type", "like", "alias", "summary", "base", "spread", "gas");
  private static final Set<String> MANY =
      Set.of("heater", "section", "pin", "rating", "source", "point", "fit", "residual");

  private final SourceText text;
  private final Function<String, DataFile> others;
  private final List<DataLine> own;
  private final Map<String, List<DataLine>> lines;

  private DataFile(
      SourceText text,
      Function<String, DataFile> others,
      List<DataLine> own,
      Map<String, List<DataLine>> lines) {
    this.text = text;
    this.others = others;
    this.own = own;
    this.lines = lines;
  }

  /**
   * Returns the file read from {@code text}.
   *
   * @param others finds the file of the type that a {@code like} line names, or throws
   * @throws DataFileException when the text contradicts itself, with the place
   */
  static DataFile read(SourceText text, Function<String, DataFile> others) {
    List<DataLine> own = DataLine.of(text);
    Map<String, List<DataLine>> lines = new LinkedHashMap<>();
    for (DataLine line : own) {
      List<DataLine> same = lines.computeIfAbsent(line.key(), key -> new ArrayList<>());
      if (ONCE.contains(line.key()) && !same.isEmpty()) {
        throw line.error(line.key() + " stands twice", "");
      }
      if (!ONCE.contains(line.key()) && !MANY.contains(line.key())) {
        throw line.error(
            "unknown key word " + line.key(),
            "one of "
                + Stream.concat(ONCE.stream(), MANY.stream())
                    .sorted()
                    .collect(Collectors.joining(", ")));
      }
      same.add(line);
    }
    List<DataLine> like = lines.get("like");
    if (like != null) {
      DataFile other = others.apply(like.get(0).word(0));
      other.lines.forEach(
          (key, inherited) -> {
            if (!key.equals("alias")) {
              lines.putIfAbsent(key, inherited);
            }
          });
    }
    return new DataFile(text, others, own, lines);
  }

  /** Returns the text it was read from. */
  public SourceText text() {
    return text;
  }

  /** Returns the type: pins, heater, sections with their laws. */
  public TubeType type() {
    return new TypeReader(this).read();
  }

  /** Returns the name that charts print. */
  public String name() {
    return one("type").word(0);
  }

  /** Returns whether the law and its points are another type's, named on the {@code like} line. */
  public boolean borrowsLaw() {
    return lines.containsKey("like") && own.stream().noneMatch(l -> l.key().equals("fit"));
  }

  /** Returns where figures come from: the sources' texts by their ids. */
  public Map<String, String> sources() {
    Map<String, String> sources = new LinkedHashMap<>();
    for (DataLine line : all("source")) {
      if (sources.put(line.word(0), line.rest(1)) != null) {
        throw line.error(0, "source " + line.word(0) + " stands twice", "");
      }
    }
    return sources;
  }

  /** Returns the published points, in file order. */
  public List<PublishedPoint> points() {
    PointReader reader = new PointReader(sources());
    return all("point").stream().map(reader::read).toList();
  }

  /**
   * Returns the kinds of section whose laws are fitted, in file order: "triode", "pentode", "beam",
   * "rectifier", "diode".
   */
  public List<String> curves() {
    return all("section").stream()
        .map(line -> line.word(line.size() - 1))
        .filter(word -> !word.equals("regulator"))
        .distinct()
        .toList();
  }

  /** Returns the id of the first section of kind {@code curve}. */
  public String sectionOf(String curve) {
    return all("section").stream()
        .filter(line -> line.word(line.size() - 1).equals(curve))
        .map(line -> line.size() > 1 ? line.word(0) : "")
        .findFirst()
        .orElseThrow(() -> new IllegalArgumentException(name() + " has no " + curve));
  }

  /**
   * Returns the points of sections of kind {@code curve}; one that names no section is the first's.
   */
  public List<PublishedPoint> points(String curve) {
    String own = sectionOf(curve);
    boolean first = curves().get(0).equals(curve);
    return points().stream()
        .filter(p -> p.section().isEmpty() ? first : p.section().equals(own))
        .toList();
  }

  /** Returns this file with its fit and residual lines replaced by {@code fitted}. */
  public DataFile with(List<String> fitted) {
    List<String> kept = new ArrayList<>(text.lines());
    kept.removeIf(
        line -> line.startsWith("fit ") || line.startsWith("residual ") || line.isBlank());
    kept.addAll(fitted);
    kept.add("");
    return read(new SourceText(text.fileName(), kept), others);
  }

  /** Returns the lines with {@code key}; none when there are none. */
  List<DataLine> all(String key) {
    return lines.getOrDefault(key, List.of());
  }

  /** Returns the only line with {@code key}; an error when it is missing. */
  DataLine one(String key) {
    List<DataLine> found = all(key);
    if (found.isEmpty()) {
      throw own.isEmpty()
          ? DataLine.empty(text)
          : own.get(0).error("the file has no " + key + " line", "");
    }
    return found.get(0);
  }
}
