package railwalk.netlist;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.SortedMap;
import java.util.TreeMap;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Bottle;
import railwalk.circuit.Element;
import railwalk.circuit.Fitting;
import railwalk.circuit.Lead;
import railwalk.circuit.Node;
import railwalk.circuit.Socket;
import railwalk.device.Electrode;
import railwalk.device.PinUse;
import railwalk.device.TubeType;
import railwalk.source.SourceSpan;

/**
 * The tubes of a netlist while its lines are read. Lines of one bottle's sections come together
 * here; when all are read, each bottle goes into its socket.
 */
final class TubeRack {
  private final Draft draft;
  private final Map<String, Entry> entries = new LinkedHashMap<>();
  private final Map<String, SourceSpan> lines = new HashMap<>();
  private final List<Bottle> bottles = new ArrayList<>();

  TubeRack(Draft draft) {
    this.draft = draft;
  }

  /** One bottle while its lines are read. */
  static final class Entry {
    private final String name;
    private final TubeType type;
    private final SourceSpan span;
    private final int place;
    private Bottle.Wiring wiring;
    private boolean spoilt;
    private final SortedMap<Integer, Node> pins = new TreeMap<>();
    private final Map<Integer, SourceSpan> pinSpans = new HashMap<>();
    private final List<Lead> leads = new ArrayList<>();
    private final Map<String, SourceSpan> sectionSpans = new HashMap<>();
    private final Map<String, Integer> sectionPlaces = new HashMap<>();

    private Entry(String name, TubeType type, Bottle.Wiring wiring, SourceSpan span, int place) {
      this.name = name;
      this.type = type;
      this.wiring = wiring;
      this.span = span;
      this.place = place;
    }

    String name() {
      return name;
    }

    /** Wires a pin; returns whether it was free. */
    boolean wirePin(int pin, Node node, SourceSpan pinSpan) {
      pinSpans.putIfAbsent(pin, pinSpan);
      return pins.putIfAbsent(pin, node) == null;
    }

    /** Remembers that something of it could not be read: what it lacks is then no news. */
    void spoil() {
      spoilt = true;
    }

    /** Wires an electrode; returns whether it was free. */
    boolean wireLead(Lead lead) {
      boolean taken =
          leads.stream()
              .anyMatch(
                  other ->
                      other.electrode() == lead.electrode()
                          && other.section().equals(lead.section()));
      if (!taken) {
        leads.add(lead);
      }
      return !taken;
    }

    /** Remembers the line that names a section. */
    void names(String section, PartCard part) {
      sectionSpans.putIfAbsent(section, part.span());
      sectionPlaces.putIfAbsent(section, part.draft().place());
    }

    private SourceSpan spanOf(String section) {
      return sectionSpans.getOrDefault(section, span);
    }
  }

  /**
   * Returns the bottle that a line belongs to; null when the line does not go with the others of
   * that name, which is reported.
   */
  @Nullable Entry entry(ChartName.Tube tube, TubeType type, Bottle.Wiring wiring, PartCard part) {
    SourceSpan sameLine = lines.putIfAbsent(part.name(), part.span());
    if (sameLine != null) {
      draft.nameTwice(part.name(), part.span(), sameLine);
      return null;
    }
    String key = tube.bottle().toUpperCase(Locale.ROOT);
    Entry entry = entries.get(key);
    if (entry == null) {
      entry = new Entry(tube.bottle(), type, wiring, part.span(), draft.place());
      entries.put(key, entry);
    } else if (!entry.type.equals(type)) {
      draft
          .report()
          .add(
              Problem.BOTTLE_OF_TWO_TYPES,
              part.span(),
              entry.name,
              entry.type.name(),
              entry.span.line(),
              type.name());
      return null;
    } else if ((entry.wiring == Bottle.Wiring.BY_PIN) != (wiring == Bottle.Wiring.BY_PIN)) {
      draft.report().add(Problem.PINS_AND_POSITIONS, part.span(), entry.name, entry.span.line());
      return null;
    } else if (isTaken(entry, tube.section(), wiring)) {
      draft.nameTwice(entry.name, part.span(), entry.span);
      return null;
    }
    if (wiring == Bottle.Wiring.BY_POSITION) {
      entry.wiring = wiring;
    }
    if (!tube.section().isEmpty()) {
      entry.names(tube.section(), part);
    }
    return entry;
  }

  /** Returns whether another line speaks of the section already, or of the whole bottle. */
  private boolean isTaken(Entry entry, String section, Bottle.Wiring wiring) {
    boolean whole = lines.containsKey(entry.name);
    return section.isEmpty()
        || (whole && (wiring == Bottle.Wiring.BY_PIN || entry.sectionPlaces.containsKey(section)));
  }

  /** Puts every bottle into its socket. */
  void fit() {
    for (Entry entry : entries.values()) {
      Socket.NodeMaker inside = name -> draft.nodes().inside(name, entry.span);
      Fitting fitting =
          entry.wiring == Bottle.Wiring.BY_PIN
              ? Socket.byPins(entry.name, entry.type, entry.pins, inside)
              : Socket.byLeads(entry.name, entry.type, entry.wiring, entry.leads, inside);
      bottles.add(fitting.bottle());
      if (entry.wiring == Bottle.Wiring.BY_PIN) {
        mind(entry);
      }
      for (Element element : fitting.elements()) {
        String section = element.name().substring(entry.name.length());
        int place = entry.sectionPlaces.getOrDefault(section, entry.place);
        draft.add(element, entry.spanOf(section), place);
      }
      if (!entry.spoilt) {
        fitting.remarks().forEach(remark -> report(entry, remark));
      }
    }
  }

  /** Says what the type's data would have people mind who wire it by pin. */
  private void mind(Entry entry) {
    for (String caution : entry.type.care().cautions()) {
      draft.report().add(Problem.PIN_CAUTION, entry.span, entry.name, entry.type.name(), caution);
    }
    for (List<Integer> strap : entry.type.care().straps()) {
      int wired = 0;
      StringBuilder pins = new StringBuilder();
      for (int pin : strap) {
        wired += entry.pins.containsKey(pin) ? 1 : 0;
        pins.append(pins.length() == 0 ? "" : ", ").append(pin);
      }
      if (wired > 0 && wired < strap.size()) {
        draft.report().add(Problem.PIN_STRAP, entry.span, entry.name, pins, entry.type.name());
      }
    }
  }

  /** Returns the bottles in netlist order. */
  List<Bottle> bottles() {
    return bottles;
  }

  /** Returns where bottles are first written, by name in upper case. */
  Map<String, SourceSpan> spans() {
    Map<String, SourceSpan> spans = new HashMap<>();
    entries.forEach((key, entry) -> spans.put(key, entry.span));
    return spans;
  }

  private void report(Entry entry, Fitting.Remark remark) {
    Report report = draft.report();
    SourceSpan span = place(entry, remark);
    Electrode electrode = remark.electrode();
    String word = electrode == null ? "" : electrode.word();
    switch (remark.kind()) {
      case ELECTRODE_OPEN ->
          report.add(Problem.ELECTRODE_OPEN, span, remark.part(), word, pins(remark.pins()));
      case PINS_JOINED ->
          report.add(
              Problem.PINS_JOINED,
              span,
              entry.type.name(),
              remark.pins().get(0),
              remark.pins().get(1),
              word.isEmpty() ? "a jumper" : "the " + word);
      case SUPPRESSOR_TIED -> report.gather(Problem.SUPPRESSOR_TIED, span, remark.part());
      case TIE_POINT_IN_USE -> tiePoint(entry, remark.pins().get(0), span);
      case NO_SECTION -> report.add(Problem.NO_SECTION, span, entry.name, entry.type.name());
    }
  }

  private static SourceSpan place(Entry entry, Fitting.Remark remark) {
    for (int i = remark.pins().size() - 1; i >= 0; i--) {
      SourceSpan pin = entry.pinSpans.get(remark.pins().get(i));
      if (pin != null) {
        return pin;
      }
    }
    String section = remark.part().substring(Math.min(entry.name.length(), remark.part().length()));
    return entry.spanOf(section);
  }

  /** A shield or shell may go to the reference, the cathode or a heater: that is what it is for. */
  private void tiePoint(Entry entry, int pin, SourceSpan span) {
    PinUse use = entry.type.pins().get(pin);
    Node node = entry.pins.get(pin);
    if (use == null || node == null) {
      return;
    }
    boolean screening = use.role() != PinUse.Role.INTERNAL;
    boolean atCathodeOrHeater =
        entry.pins.entrySet().stream()
            .filter(other -> other.getValue().equals(node))
            .map(other -> entry.type.pins().get(other.getKey()))
            .anyMatch(TubeRack::isCathodeOrHeater);
    if (!screening || !(atCathodeOrHeater || draft.isGround(node))) {
      String what =
          switch (use.role()) {
            case SHIELD -> "the shield";
            case SLEEVE -> "the shell or base sleeve";
            default -> "an internal connection";
          };
      draft.report().add(Problem.TIE_POINT_IN_USE, span, pin, entry.type.name(), what);
    }
  }

  private static boolean isCathodeOrHeater(@Nullable PinUse use) {
    Electrode electrode = use == null ? null : use.electrode();
    return electrode != null && (electrode == Electrode.CATHODE || electrode.isHeater());
  }

  private static String pins(List<Integer> pins) {
    if (pins.isEmpty()) {
      return "";
    }
    String list = String.join(", ", pins.stream().map(pin -> pin == 0 ? "cap" : "" + pin).toList());
    return pins.size() == 1 ? " (pin " + list + ")" : " (pins " + list + ")";
  }
}
