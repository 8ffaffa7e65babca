package railwalk.device;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
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
 * heater   12.6V 0.15A tap=6.3V        further lines: other rated connections; direct, joined, slow
 *                                      (a rectifier such as a damper), warmup= in seconds
 * section  A triode                    id (none when it is the only one) and
 *                                      triode, pentode, beam, rectifier, vapour (a mercury-vapour
 *                                      rectifier), regulator or diode
 * pin      1 A plate                   number or cap, section id (none when all share it),
 *                                      electrode, or empty, internal, shield, sleeve; pins with
 *                                      "jumper internal" are joined inside
 * pins     none                        no source for the pins is known: electrodes only
 * strap    4 8                         pins to be wired together at the socket, since it is not
 *                                      known whether they are joined inside
 * caution  halves by some sheets …     why use by pin deserves a second look
 * unlike   6DJ8 6.3 V on 4-5 …         a look-alike that does not go into this type's socket, and
 *                                      what differs
 * rating   system=design-centre plate=300V platewatts=1W
 * spread   0.70 1.30                   current of new tubes at fixed volts as shares, two sigma
 * source   rca54 RCA sheet 11-5-1954   id and text
 * point    plate=250V grid=-2V current=1.2mA gm=1.6mS source=rca54 …     see {@link PublishedPoint}
 * gas      strike=185V operating=151V minimum=5mA maximum=30mA regulation=2V
 *                                      volts it surely lights at, volts at mid current, rated
 *                                      current, change of volts over it
 * fit      triode mu=105.9412 …        constants, as railwalk.fit writes them
 * residual point=1 …                   how well the law meets each point, as railwalk.fit writes it
 * </pre>
 *
 * <p>Sections of unlike laws: {@code section=} on rating, spread, point, fit and residual lines
 * names the section each belongs to; a line without it speaks of all that it fits. Sections of one
 * kind share points and law unless a point names one of them.
 *
 * <p>Read by {@link Catalogue} for types and by railwalk.fit for points; the same words serve a
 * type given in a netlist.
 */
public final class DataFile {
  private static final Set<String> ONCE =
      Set.of("type", "like", "alias", "summary", "base", "pins", "gas");
  private static final Set<String> MANY =
      Set.of(
          "heater",
          "section",
          "pin",
          "strap",
          "caution",
          "unlike",
          "rating",
          "spread",
          "source",
          "point",
          "fit",
          "residual");

  /** What a file that says one of the keys does not take over from the type it is like. */
  private static final Map<String, Set<String>> SUPERSEDES =
      Map.of(
          "pin", Set.of("pins", "strap", "caution"),
          "pins", Set.of("pin", "strap", "caution"),
          "point", Set.of("fit", "residual"),
          "fit", Set.of("residual"));

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
   * Returns the file read from {@code text}; {@link #type} and {@link #points} read further into
   * it.
   *
   * @param others finds the file of the type that a {@code like} line names, or throws
   * @throws DataFileException when the text contradicts itself, with the place
   */
  public static DataFile read(SourceText text, Function<String, DataFile> others) {
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
      Set<String> dropped = new HashSet<>(Set.of("alias", "unlike"));
      lines.keySet().forEach(key -> dropped.addAll(SUPERSEDES.getOrDefault(key, Set.of())));
      other.lines.forEach(
          (key, inherited) -> {
            if (!dropped.contains(key)) {
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
    return lines.containsKey("like")
        && own.stream().noneMatch(l -> l.key().equals("fit") || l.key().equals("point"));
  }

  /** Returns the file of the type that the {@code like} line names. */
  public Optional<DataFile> like() {
    List<DataLine> like = all("like");
    return like.isEmpty() ? Optional.empty() : Optional.of(others.apply(like.get(0).word(0)));
  }

  /** Returns whether the law of a section is still to be fitted to the points. */
  public boolean wantsFit() {
    return all("fit").isEmpty() && !likeSections().isEmpty();
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
    PointReader reader = new PointReader(sources(), this);
    return all("point").stream().map(reader::read).toList();
  }

  /**
   * Returns the groups of sections that share points and a fitted law, in file order: like sections
   * together, unlike ones each for itself.
   */
  public List<LikeSections> likeSections() {
    Map<String, LikeSections> groups = new LinkedHashMap<>();
    for (DataLine line : all("section")) {
      String kind = line.word(line.size() - 1);
      if (!kind.equals("regulator")) {
        String id = idOf(line);
        String key = isTold(kind) ? kind + " " + id : kind;
        LikeSections group = groups.get(key);
        groups.put(key, group == null ? new LikeSections(kind, List.of(id)) : group.and(id));
      }
    }
    return List.copyOf(groups.values());
  }

  /** Returns whether a point or fit line names one of several sections of {@code kind}. */
  private boolean isTold(String kind) {
    Set<String> ids = new HashSet<>();
    for (DataLine line : all("section")) {
      if (line.word(line.size() - 1).equals(kind)) {
        ids.add(idOf(line));
      }
    }
    if (ids.size() > 1) {
      for (String key : List.of("point", "fit")) {
        for (DataLine line : all(key)) {
          if (line.has("section") && ids.contains(line.option("section", ""))) {
            return true;
          }
        }
      }
    }
    return false;
  }

  /** Returns the points of {@code group}; one that names no section is the first group's. */
  public List<PublishedPoint> points(LikeSections group) {
    boolean first = likeSections().get(0).equals(group);
    return points().stream()
        .filter(p -> p.section().isEmpty() ? first : group.ids().contains(p.section()))
        .toList();
  }

  /** Returns the ids of all sections, the empty one of an only section too. */
  Set<String> sectionIds() {
    Set<String> ids = new LinkedHashSet<>();
    all("section").forEach(line -> ids.add(idOf(line)));
    return ids;
  }

  /** Returns the id that a section line gives; empty for an only section. */
  static String idOf(DataLine section) {
    return section.size() > 1 ? section.word(0) : "";
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
