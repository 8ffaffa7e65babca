package railwalk.netlist;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Bottle;
import railwalk.circuit.Lead;
import railwalk.circuit.Node;
import railwalk.circuit.Socket;
import railwalk.device.Electrode;
import railwalk.device.SectionKind;
import railwalk.device.SectionType;
import railwalk.device.TubeType;

/** Reads the line of a tube whose type is known: by socket pin, by electrode or by position. */
final class TubeLine {
  private static final int MOST_HEATER_NODES = 3;

  private final PartCard part;
  private final TubeType type;
  private final ChartName.Tube tube;

  private TubeLine(PartCard part, TubeType type) {
    this.part = part;
    this.type = type;
    this.tube = ChartName.tube(part.name(), type);
  }

  /** Reads {@code XV1 12AX7 1=p1 …} or {@code XV3 6V6GT plate=p3 …}. */
  static void byKeys(PartCard part, TubeType type) {
    part.words().clear();
    new TubeLine(part, type).keys();
  }

  /** Reads {@code XV1A plate grid cathode 12AX7}; the nodes are the words left. */
  static void byPosition(PartCard part, TubeType type, Word typeWord) {
    new TubeLine(part, type).positions(typeWord);
  }

  // by key

  private void keys() {
    List<Field.Option> options = part.takeOptions();
    TubeRack.Entry entry = null;
    Bottle.Wiring wiring = null;
    for (Field.Option option : options) {
      String key = option.key().text();
      OptionalInt pin = ElectrodeWords.pin(key);
      Optional<Electrode> electrode = ElectrodeWords.electrode(key);
      if (pin.isEmpty() && electrode.isEmpty()) {
        part.report()
            .add(
                Problem.ELECTRODE_UNKNOWN,
                option.key().span(),
                key,
                NearNames.hint(key, ElectrodeWords.all()));
        continue;
      }
      Bottle.Wiring now = pin.isPresent() ? Bottle.Wiring.BY_PIN : Bottle.Wiring.BY_ELECTRODE;
      if (wiring != null && wiring != now) {
        part.report().add(Problem.PINS_AND_ELECTRODES, option.key().span(), part.name(), key);
        return;
      }
      if (wiring == null) {
        wiring = now;
        if (now == Bottle.Wiring.BY_PIN && type.pins().isEmpty()) {
          part.report().add(Problem.PINS_NOT_KNOWN, option.key().span(), type.name());
          return;
        }
        entry = part.draft().tubes().entry(tube, type, wiring, part);
      }
      if (entry == null) {
        return;
      }
      if (option.values().size() > 1) {
        Word second = option.values().get(1);
        part.report().add(Problem.COMMA_BETWEEN_WORDS, second.span(), second.text());
      }
      Node node = part.draft().nodes().node(option.value(), part.frame());
      if (pin.isPresent()) {
        pin(entry, option, pin.getAsInt(), node);
      } else {
        electrode(entry, option.key(), electrode.orElseThrow(), node);
      }
    }
    if (wiring == null) {
      part.draft().tubes().entry(tube, type, Bottle.Wiring.BY_PIN, part);
    }
    part.done();
  }

  private void pin(TubeRack.Entry entry, Field.Option option, int pin, Node node) {
    if (!Socket.hasPin(type, pin)) {
      part.report()
          .add(
              Problem.NO_SUCH_PIN,
              option.key().span(),
              type.name(),
              ElectrodeWords.pinName(pin),
              Socket.pinsInWords(type));
    } else if (!entry.wirePin(pin, node, option.key().span())) {
      part.report()
          .add(Problem.PIN_TWICE, option.key().span(), ElectrodeWords.pinName(pin), entry.name());
    }
  }

  private void electrode(TubeRack.Entry entry, Word key, Electrode electrode, Node node) {
    if (electrode.isHeater()) {
      boolean absent = !type.pins().isEmpty() && type.pinsOf("", electrode).isEmpty();
      if (absent) {
        notInType(key);
      } else {
        entry.lead(new Lead("", electrode, node));
      }
      return;
    }
    SectionType section = sectionOf(electrode, key);
    if (section != null) {
      leads(section, electrode, node).forEach(entry::lead);
      entry.names(section.id(), part);
    }
  }

  private @Nullable SectionType sectionOf(Electrode electrode, Word key) {
    List<SectionType> having =
        type.sections().stream().filter(section -> has(section, electrode)).toList();
    if (having.isEmpty()) {
      notInType(key);
      return null;
    }
    Optional<SectionType> named = type.section(tube.section());
    if (!tube.section().isEmpty() && named.isPresent() && having.contains(named.get())) {
      return named.get();
    }
    List<SectionType> main =
        having.stream().filter(section -> section.kind() != SectionKind.DIODE).toList();
    List<SectionType> candidates = main.isEmpty() ? having : main;
    return candidates.size() == 1 ? candidates.get(0) : assumedSection(key, candidates);
  }

  private void notInType(Word key) {
    part.report().add(Problem.ELECTRODE_NOT_IN_TYPE, key.span(), type.name(), key.text());
  }

  private boolean has(SectionType section, Electrode electrode) {
    return switch (electrode) {
      case CATHODE -> true;
      case PLATE -> section.kind() != SectionKind.DIODE;
      case GRID -> isAmplifier(section);
      case SCREEN, SUPPRESSOR -> section.kind() == SectionKind.PENTODE;
      case PLATE1, PLATE2 ->
          section.kind() == SectionKind.RECTIFIER && ElectrodeOrder.hasTwoPlates(type);
      case DIODE1, DIODE2 -> section.kind() == SectionKind.DIODE;
      case HEATER1, HEATER2, HEATER_TAP -> false;
    };
  }

  private static boolean isAmplifier(SectionType section) {
    return section.kind() == SectionKind.TRIODE || section.kind() == SectionKind.PENTODE;
  }

  /** Returns section A of like twins; null when the section must be named, which is reported. */
  private @Nullable SectionType assumedSection(Word where, List<SectionType> candidates) {
    SectionType first = candidates.get(0);
    boolean alike =
        candidates.stream().allMatch(s -> s.kind() == first.kind() && s.law().equals(first.law()));
    String letters = String.join(", ", candidates.stream().map(SectionType::id).toList());
    if (!alike) {
      part.report().add(Problem.SECTION_NEEDED, where.span(), type.name(), letters, part.name());
      return null;
    }
    part.report().add(Problem.SECTION_ASSUMED, part.span(), part.name(), first.id(), type.name());
    return first;
  }

  /** A plate of a rectifier with two stands for both. */
  private List<Lead> leads(SectionType section, Electrode electrode, Node node) {
    boolean bothPlates =
        electrode == Electrode.PLATE
            && section.kind() == SectionKind.RECTIFIER
            && ElectrodeOrder.hasTwoPlates(type);
    return bothPlates
        ? List.of(
            new Lead(section.id(), Electrode.PLATE1, node),
            new Lead(section.id(), Electrode.PLATE2, node))
        : List.of(new Lead(section.id(), electrode, node));
  }

  // by position

  private void positions(Word typeWord) {
    List<SectionType> main =
        type.sections().stream().filter(s -> s.kind() != SectionKind.DIODE).toList();
    List<Electrode> given = ElectrodeOrder.given(part.draft(), typeWord, type);
    List<SectionType> sections;
    boolean wholeTwin =
        tube.section().isEmpty() && main.size() == 2 && given == null && part.words().size() == 6;
    if (wholeTwin && main.stream().allMatch(s -> s.kind() == SectionKind.TRIODE)) {
      part.report().add(Problem.TWIN_BY_POSITION, part.span(), part.name(), type.name());
      sections = main;
    } else {
      SectionType section =
          type.section(tube.section())
              .filter(s -> !tube.section().isEmpty() || main.size() == 1)
              .orElse(null);
      if (section == null) {
        section = main.size() == 1 ? main.get(0) : assumedSection(typeWord, main);
      }
      if (section == null) {
        return;
      }
      sections = List.of(section);
    }
    TubeRack.Entry entry = part.draft().tubes().entry(tube, type, Bottle.Wiring.BY_POSITION, part);
    if (entry == null) {
      return;
    }
    for (SectionType section : sections) {
      if (!section(entry, section, given)) {
        return;
      }
    }
    extraNodes();
    if (main.size() > 1 && !type.pins().isEmpty()) {
      part.report().gather(Problem.PINS_BY_CUSTOM, part.span(), part.name());
    }
    part.done();
  }

  private boolean section(
      TubeRack.Entry entry, SectionType section, @Nullable List<Electrode> given) {
    int count = part.words().size();
    List<Electrode> order = given == null ? ElectrodeOrder.usual(section, type, count) : given;
    if (count < order.size()) {
      boolean triodeNodes = section.kind() == SectionKind.PENTODE && count == 3;
      part.report()
          .add(
              triodeNodes ? Problem.PENTODE_WITH_THREE_NODES : Problem.TUBE_NODES_MISSING,
              part.span(),
              part.name(),
              type.name(),
              order.size(),
              ElectrodeOrder.words(order),
              count);
      return false;
    }
    List<Node> nodes = part.nodes(order.size());
    if (nodes == null) {
      return false;
    }
    for (int i = 0; i < nodes.size(); i++) {
      Electrode electrode = order.get(i);
      if (electrode.isHeater()) {
        entry.lead(new Lead("", electrode, nodes.get(i)));
      } else {
        leads(section, electrode, nodes.get(i)).forEach(entry::lead);
      }
    }
    int plate = order.indexOf(Electrode.PLATE);
    boolean strapped =
        section.kind() == SectionKind.PENTODE && !order.contains(Electrode.SCREEN) && plate >= 0;
    if (strapped) {
      entry.lead(new Lead(section.id(), Electrode.SCREEN, nodes.get(plate)));
      part.report().add(Problem.TRIODE_CONNECTED, part.span(), part.name());
    }
    entry.names(section.id(), part);
    return true;
  }

  private void extraNodes() {
    List<Word> extra = new ArrayList<>(part.words());
    part.words().clear();
    if (extra.size() > MOST_HEATER_NODES) {
      part.report().add(Problem.TOO_MANY_NODES, extra.get(0).span(), part.name(), type.name());
    } else if (!extra.isEmpty()) {
      part.report().gather(Problem.HEATER_NODES_IGNORED, extra.get(0).span(), part.name());
    }
  }
}
