package railwalk.netlist;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import railwalk.device.Electrode;
import railwalk.device.ElectrodeNames;
import railwalk.device.GasLaw;
import railwalk.device.PinUse;
import railwalk.device.SectionKind;
import railwalk.device.SectionType;
import railwalk.device.TubeType;
import railwalk.source.NearNames;
import railwalk.source.SourceSpan;

/**
 * Reads a {@code .tube} line into the lines of a data file: {@code .tube NAME like=12AX7 base=9A
 * kind=triode heater=6.3V,0.3A spread=70%,130% 1=plate … plate=250 grid=-2 current=1.2mA gm=1.6mS
 * maxplate=300 platewatts=1.2W}. A key of a point that comes again begins the next point.
 */
final class TubeLine {
  /** The user's own points are to be met, whatever family the tube is of. */
  private static final String WEIGHT = "weight=20";

  /** Limits of a type of which only a few points are known: common practice, ±35 %. */
  private static final String USUAL_SPREAD = "0.65 1.35";

  private static final String SOURCE = "given";

  private final Card card;
  private final GivenTypes known;
  private final Report report;
  private final Values values;
  private final Scope scope;
  private final TubeKeys keys = new TubeKeys();
  private final GivenType type;
  private @Nullable TubeType like;

  private TubeLine(Card card, Word name, Deck deck, GivenTypes known, Report report) {
    this.card = card;
    this.known = known;
    this.report = report;
    this.values = new Values(report);
    this.scope = new Scope(values);
    this.type = new GivenType(name);
    for (Card parameter : deck.parameters()) {
      for (Field.Option option : parameter.options()) {
        scope.define(option.key().text(), option.value(), scope);
      }
    }
  }

  /** Returns the type that {@code card} gives; null when it has no name, which is reported. */
  static @Nullable GivenType read(Card card, Deck deck, GivenTypes known, Report report) {
    List<Word> words = card.words();
    if (words.isEmpty()) {
      report.add(
          Problem.SETTING_EMPTY,
          card.head().span(),
          ".tube",
          "its name: .tube 6W6GT like=6V6GT plate=200 screen=125 cathode=180 current=46mA");
      return null;
    }
    for (Word word : words.subList(1, words.size())) {
      report.add(Problem.WORD_PASSED_OVER, word.span(), word.text(), words.get(0).text());
    }
    TubeLine line = new TubeLine(card, words.get(0), deck, known, report);
    if (card.flaw() == null) {
      line.read();
    } else {
      line.type.spoil();
    }
    return line.type;
  }

  private void read() {
    for (Field.Option option : card.options()) {
      keys.take(option, this);
    }
    if (type.isSpoilt()) {
      return;
    }
    type.line("type", name().span()).word(name().text(), name().span());
    Field.Option kin = keys.word("like");
    if (kin != null) {
      like = known.kin(name().text(), kin.value().text());
      type.line("like", span(kin)).word(kin.value().text(), kin.value().span());
      if (like == null) {
        return;
      }
    } else if (keys.points().isEmpty() && keys.gas().isEmpty()) {
      refuse(Problem.TUBE_EMPTY, name().span(), name().text());
      return;
    }
    List<String> sections = sections();
    base(sections);
    heater();
    for (Field.Option pin : keys.pins()) {
      pin(pin);
    }
    ratings(sections);
    gas();
    points();
  }

  private Word name() {
    return type.name();
  }

  /** Reports what is wrong with the type. */
  void refuse(Problem problem, SourceSpan span, Object... words) {
    report.add(problem, span, words);
    type.spoil();
  }

  /** Returns the ids of the sections; writes section lines where the kin's do not serve. */
  private List<String> sections() {
    List<String> ids = new ArrayList<>();
    String kind = kind();
    if (like != null && keys.word("kind") == null) {
      for (SectionType section : like.sections()) {
        ids.add(section.id());
      }
      return ids;
    }
    for (Field.Option pin : keys.pins()) {
      String word = pin.value().text();
      int point = word.indexOf('.');
      String id = point > 0 ? word.substring(0, point).toUpperCase(Locale.ROOT) : "";
      if (!id.isEmpty() && !ids.contains(id)) {
        ids.add(id);
      }
    }
    TubeType model = ids.isEmpty() && keys.pins().isEmpty() ? model(kind) : null;
    if (model != null) {
      for (SectionType section : model.sections()) {
        ids.add(section.id());
      }
    }
    if (ids.isEmpty()) {
      ids.add("");
    }
    Field.Option said = keys.word("kind");
    SourceSpan span = said == null ? name().span() : span(said);
    for (String id : ids) {
      type.line("section", span);
      if (!id.isEmpty()) {
        type.word(id, span);
      }
      type.word(kind, span);
    }
    if (like == null) {
      type.line("summary", span).word(kind + " of this netlist", span);
      if (TubeKeys.amplifies(kind) && keys.word("spread") == null) {
        type.line("spread", span).word(USUAL_SPREAD, span);
      }
    }
    return ids;
  }

  /** Returns the kind of its sections: as said, or as the figures have it. */
  private String kind() {
    Field.Option said = keys.word("kind");
    if (said != null) {
      return said.value().text().toLowerCase(Locale.ROOT);
    }
    if (!keys.gas().isEmpty()) {
      return "regulator";
    }
    boolean grid = false;
    for (Map<String, TubeKeys.Given> point : keys.points()) {
      if (point.containsKey("screen") || point.containsKey("connection")) {
        return "pentode";
      }
      grid |= point.containsKey("grid") || point.containsKey("cathode");
    }
    return grid ? "triode" : "rectifier";
  }

  /** Returns a type of the catalogue on the base named, all its sections of {@code kind}. */
  private @Nullable TubeType model(String kind) {
    Field.Option base = keys.word("base");
    SectionKind wanted = TubeKeys.KINDS.get(kind);
    if (base != null) {
      for (TubeType other : known.types()) {
        boolean same = other.base().equalsIgnoreCase(base.value().text());
        if (same && !other.pins().isEmpty() && allOf(other, wanted)) {
          return other;
        }
      }
    }
    return null;
  }

  private static boolean allOf(TubeType type, @Nullable SectionKind kind) {
    for (SectionType section : type.sections()) {
      if (section.kind() != kind) {
        return false;
      }
    }
    return true;
  }

  private void base(List<String> sections) {
    Field.Option base = keys.word("base");
    if (base == null) {
      if (like == null) {
        refuse(Problem.TUBE_BASE_MISSING, name().span(), name().text());
      }
      return;
    }
    String code = base.value().text();
    if (like != null && code.equalsIgnoreCase(like.base())) {
      return;
    }
    List<String> bases = new ArrayList<>();
    String family = "";
    for (TubeType other : known.types()) {
      bases.add(other.base());
      bases.add(other.family());
      if (code.equalsIgnoreCase(other.base()) || code.equalsIgnoreCase(other.family())) {
        family = other.family();
      }
    }
    if (family.isEmpty()) {
      String near = NearNames.hint(code, bases);
      refuse(
          Problem.TUBE_BASE,
          base.value().span(),
          code,
          near.isEmpty() ? "a base code such as 9A, or a kind of socket such as octal" : near);
      return;
    }
    type.line("base", span(base)).word(code, span(base)).word(family, span(base));
    if (keys.pins().isEmpty()) {
      pinsByBase(base, sections);
    }
  }

  /** A base code of the sheets names the connections too: any type on it has the same. */
  private void pinsByBase(Field.Option base, List<String> sections) {
    TubeType model = model(kindOf(like));
    List<String> ids = new ArrayList<>();
    if (model != null) {
      model.sections().forEach(section -> ids.add(section.id()));
    }
    if (model == null || !ids.equals(sections)) {
      type.line("pins", span(base)).word("none", span(base));
      report.add(Problem.TUBE_PINS_OPEN, name().span(), name().text());
      return;
    }
    for (Map.Entry<Integer, PinUse> pin : model.pins().entrySet()) {
      PinUse use = pin.getValue();
      Electrode electrode = use.electrode();
      type.line("pin", span(base)).word(pin.getKey() == 0 ? "cap" : "" + pin.getKey(), span(base));
      if (!use.section().isEmpty()) {
        type.word(use.section(), span(base));
      }
      String role = use.role().name().toLowerCase(Locale.ROOT);
      type.word(electrode == null ? role : electrode.word(), span(base));
    }
    report.add(
        Problem.TUBE_PINS_BY_BASE, base.value().span(), name().text(), model.base(), model.name());
  }

  private String kindOf(@Nullable TubeType kin) {
    if (kin == null || keys.word("kind") != null) {
      return kind();
    }
    for (Map.Entry<String, SectionKind> kind : TubeKeys.KINDS.entrySet()) {
      if (kind.getValue() == kin.sections().get(0).kind()) {
        return kind.getKey();
      }
    }
    return kind();
  }

  private void heater() {
    Field.Option heater = keys.word("heater");
    TubeKeys.Given tap = keys.ratings().get("heatertap");
    if (heater != null) {
      type.line("heater", span(heater));
      for (Word word : heater.values()) {
        type.word(word.text(), word.span());
      }
      if (heater.values().size() < 2) {
        refuse(Problem.TUBE_HEATER, heater.value().span(), heater.value().text());
      }
      boolean told = heater.values().size() > 2;
      if (like != null && !told && like.heater().directlyHeated()) {
        type.word("direct", span(heater));
      } else if (like != null && !told && like.heater().cathodeJoined()) {
        type.word("joined", span(heater));
      }
      if (tap != null) {
        type.word("tap=" + tap.amount(), tap.span());
      }
    } else if (tap != null) {
      refuse(Problem.TUBE_HEATER, tap.span(), "heatertap=");
    }
    Field.Option spread = keys.word("spread");
    if (spread != null) {
      type.line("spread", span(spread));
      for (Word word : spread.values()) {
        double share = values.read(word, railwalk.units.Measure.SHARE, name().text(), scope);
        if (Double.isNaN(share)) {
          type.spoil();
        }
        type.word("" + share, word.span());
      }
    }
  }

  private void pin(Field.Option pin) {
    String written = pin.value().text();
    int point = written.indexOf('.');
    String electrode = point > 0 ? written.substring(point + 1) : written;
    String word =
        ElectrodeNames.electrode(electrode)
            .map(Electrode::word)
            .orElse(electrode.toLowerCase(Locale.ROOT));
    type.line("pin", span(pin)).word(pin.key().text().toLowerCase(Locale.ROOT), pin.key().span());
    if (point > 0) {
      type.word(written.substring(0, point).toUpperCase(Locale.ROOT), pin.value().span());
    }
    type.word(word, pin.value().span());
  }

  private void ratings(List<String> sections) {
    Map<String, TubeKeys.Given> given = keys.ratings();
    given.remove("heatertap");
    Field.Option system = keys.word("system");
    if (given.isEmpty()) {
      return;
    }
    for (String id : sections) {
      SectionType kin = like == null ? null : like.section(id).orElse(null);
      Map<String, Double> limits = TubeKeys.limits(kin);
      SourceSpan span = given.values().iterator().next().span();
      type.line("rating", span);
      if (!id.isEmpty()) {
        type.word("section=" + id, span);
      }
      String usual =
          kin == null || kin.ratings().system().isEmpty() ? "stated" : kin.ratings().system();
      type.word("system=" + (system == null ? usual : system.value().text()), span);
      for (Map.Entry<String, Double> limit : limits.entrySet()) {
        if (!given.containsKey(limit.getKey()) && !Double.isNaN(limit.getValue())) {
          type.word(limit.getKey() + "=" + limit.getValue(), span);
        }
      }
      given.forEach((key, value) -> type.word(key + "=" + value.amount(), value.span()));
    }
  }

  private void gas() {
    Map<String, TubeKeys.Given> given = keys.gas();
    if (given.isEmpty()) {
      return;
    }
    Map<String, Double> all = new LinkedHashMap<>();
    if (like != null && like.sections().get(0).law() instanceof GasLaw law) {
      all.put("strike", law.strikeVolts());
      all.put("operating", law.operatingVolts());
      all.put("minimum", law.minimumAmps());
      all.put("maximum", law.maximumAmps());
      all.put("regulation", law.slopeOhms() * (law.maximumAmps() - law.minimumAmps()));
    }
    type.line("gas", given.values().iterator().next().span());
    all.forEach(
        (key, amount) -> {
          if (!given.containsKey(key)) {
            type.word(key + "=" + amount, name().span());
          }
        });
    given.forEach((key, value) -> type.word(key + "=" + value.amount(), value.span()));
  }

  private void points() {
    if (keys.points().isEmpty()) {
      return;
    }
    type.line("source", name().span())
        .word(SOURCE, name().span())
        .word("the netlist", name().span());
    for (Map<String, TubeKeys.Given> point : keys.points()) {
      type.line("point", point.values().iterator().next().span());
      point.forEach((key, value) -> type.word(key + "=" + value.amount(), value.span()));
      type.word("source=" + SOURCE, name().span())
          .word("provenance=transcription", name().span())
          .word("confidence=high", name().span())
          .word(WEIGHT, name().span());
    }
  }

  /** Returns the amount of an option as the data file wants it; null when it is reported. */
  @Nullable String amount(Field.Option option, TubeKeys.Key key) {
    if (option.values().size() > 1) {
      Word second = option.values().get(1);
      refuse(Problem.DECIMAL_COMMA, second.span(), option.value().text(), second.text());
      return null;
    }
    Word word = option.value();
    if (key.measure() == null) {
      String written = word.text().toLowerCase(Locale.ROOT);
      if (!key.words().isEmpty() && !key.words().contains(written)) {
        refuse(
            Problem.TUBE_WORD,
            word.span(),
            option.key().text(),
            word.text(),
            String.join(", ", key.words()));
        return null;
      }
      return key.words().isEmpty() ? word.text() : written;
    }
    double amount = values.read(word, key.measure(), name().text(), scope);
    if (Double.isNaN(amount)) {
      type.spoil();
      return null;
    }
    if (amount <= 0 && !key.name().equals("grid")) {
      refuse(Problem.TUBE_SIGN, word.span(), word.text(), key.measure().words());
      return null;
    }
    return Double.toString(amount);
  }

  /** Returns where an option stands: its key and value. */
  static SourceSpan span(Field.Option option) {
    SourceSpan from = option.key().span();
    SourceSpan to = option.value().span();
    int length =
        to.line() == from.line() ? to.column() + to.length() - from.column() : from.length();
    return new SourceSpan(from.text(), from.line(), from.column(), length);
  }
}
