package railwalk.readings;

import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Bottle;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.circuit.StandIn;
import railwalk.device.Electrode;
import railwalk.device.ElectrodeNames;
import railwalk.device.PinUse;
import railwalk.device.SectionType;
import railwalk.source.NearNames;

/** Finds pins and electrodes of tubes by what stands before and behind the period. */
final class TubePoints {
  private static final List<Electrode> BY_NUMBER =
      List.of(Electrode.PLATE1, Electrode.PLATE2, Electrode.DIODE1, Electrode.DIODE2);

  private final Circuit circuit;

  TubePoints(Circuit circuit) {
    this.circuit = circuit;
  }

  /** A tube, or one section of it. */
  private record Tube(Bottle bottle, @Nullable String section, String name) {}

  /** Returns the point {@code tube.word}. */
  Point find(String tube, String word, Cell cell) throws RowRefused {
    Optional<Element> part = PointFinder.part(circuit, tube);
    if (part.isPresent() && part.get() instanceof StandIn standIn) {
      return ofStandIn(standIn, word, cell);
    }
    Tube found = tube(tube);
    if (found == null) {
      throw new RowRefused(SheetProblem.TUBE_UNKNOWN, cell.span(), tube, nearTube(tube, word));
    }
    OptionalInt pin = ElectrodeNames.pin(word);
    if (pin.isPresent()) {
      return ofPin(found, pin.getAsInt(), cell);
    }
    return ofElectrode(found, electrode(word, cell), cell);
  }

  /** Returns an example of a point of {@code bottle} for a message. */
  String example(Bottle bottle) {
    String pin = "";
    for (int wired : bottle.pins().keySet()) {
      PinUse use = bottle.type().pins().get(wired);
      Electrode electrode = use == null ? null : use.electrode();
      if (pin.isEmpty() && electrode != null && !electrode.isHeater()) {
        pin = bottle.name() + "." + pinWord(wired);
      }
    }
    List<String> electrodes = wired(new Tube(bottle, null, bottle.name()));
    String electrode = electrodes.isEmpty() ? "" : electrodes.get(0);
    return pin + (pin.isEmpty() || electrode.isEmpty() ? "" : " or ") + electrode;
  }

  private @Nullable Tube tube(String name) {
    for (String wanted : PointFinder.spellings(name)) {
      for (Bottle bottle : circuit.bottles()) {
        if (bottle.name().equalsIgnoreCase(wanted)) {
          return new Tube(bottle, null, bottle.name());
        }
        for (SectionType section : bottle.type().sections()) {
          String full = bottle.name() + section.id();
          if (full.equalsIgnoreCase(wanted)) {
            return new Tube(bottle, section.id(), full);
          }
        }
      }
    }
    return null;
  }

  private String nearTube(String tube, String word) {
    if (PointFinder.part(circuit, tube).isPresent()) {
      return "a part is named alone, for the drop across it: " + tube;
    }
    Set<String> names = new LinkedHashSet<>();
    for (Bottle bottle : circuit.bottles()) {
      names.add(bottle.name());
      bottle.type().sections().forEach(section -> names.add(bottle.name() + section.id()));
    }
    List<String> near = NearNames.near(tube, names);
    if (!near.isEmpty()) {
      return NearNames.question(near.stream().map(name -> name + "." + word).toList());
    }
    List<String> tubes = circuit.bottles().stream().map(Bottle::name).toList();
    return tubes.isEmpty() ? "the netlist has no tube" : "there are " + String.join(", ", tubes);
  }

  private static Electrode electrode(String word, Cell cell) throws RowRefused {
    Optional<Electrode> electrode = ElectrodeNames.electrode(word);
    if (electrode.isEmpty()) {
      String near = NearNames.hint(word, ElectrodeNames.all());
      throw new RowRefused(
          SheetProblem.ELECTRODE_UNKNOWN,
          cell.span(),
          word,
          near.isEmpty() ? "a pin's number, cap, plate, screen, grid, cathode" : near);
    }
    return electrode.get();
  }

  private static Point ofStandIn(StandIn standIn, String word, Cell cell) throws RowRefused {
    List<String> words = standIn.electrodes().keySet().stream().map(Electrode::word).toList();
    if (ElectrodeNames.pin(word).isPresent()) {
      throw new RowRefused(SheetProblem.PINS_NOT_KNOWN, cell.span(), standIn.name(), words.get(0));
    }
    Electrode electrode = electrode(word, cell);
    Node node = standIn.electrodes().get(electrode);
    if (node == null) {
      throw new RowRefused(
          SheetProblem.ELECTRODE_NOT_IN_TUBE,
          cell.span(),
          standIn.name(),
          electrode.word(),
          "it has " + String.join(", ", words));
    }
    return new Point.OfTube(node, null, List.of(standIn), electrode);
  }

  private Point ofPin(Tube tube, int pin, Cell cell) throws RowRefused {
    Bottle bottle = tube.bottle();
    if (bottle.pins().isEmpty()) {
      String electrode = bottle.type().sections().size() > 1 ? "cathode" : "plate";
      throw new RowRefused(SheetProblem.PINS_NOT_KNOWN, cell.span(), tube.name(), electrode);
    }
    Node node = bottle.pins().get(pin);
    if (node == null) {
      List<String> wired = bottle.pins().keySet().stream().map(TubePoints::pinWord).toList();
      throw new RowRefused(
          SheetProblem.PIN_NOT_WIRED,
          cell.span(),
          ElectrodeNames.pinName(pin),
          bottle.name(),
          String.join(", ", wired));
    }
    PinUse use = bottle.type().pins().get(pin);
    String owner = use == null ? "" : use.section();
    if (tube.section() != null && !owner.isEmpty() && !owner.equals(tube.section())) {
      throw new RowRefused(
          SheetProblem.PIN_OF_OTHER_SECTION,
          cell.span(),
          ElectrodeNames.pinName(pin),
          bottle.name(),
          owner,
          pinWord(pin));
    }
    Electrode electrode = use == null ? null : use.electrode();
    if (electrode == null || electrode.isHeater()) {
      return new Point.OfTube(node, bottle, List.of(), electrode);
    }
    List<Element> sections = new ArrayList<>();
    for (Element section : sections(tube)) {
      boolean own = owner.isEmpty() || section.name().equals(bottle.name() + owner);
      if (own && TubeNodes.node(bottle, section, electrode) != null) {
        sections.add(section);
      }
    }
    return new Point.OfTube(node, bottle, sections, electrode);
  }

  private Point ofElectrode(Tube tube, Electrode electrode, Cell cell) throws RowRefused {
    Bottle bottle = tube.bottle();
    if (electrode.isHeater()) {
      Node node = TubeNodes.pinNode(bottle, "", electrode);
      if (node == null) {
        throw notInTube(tube, electrode, cell);
      }
      return new Point.OfTube(node, bottle, List.of(), electrode);
    }
    List<Element> sections = new ArrayList<>();
    Set<Node> nodes = new LinkedHashSet<>();
    for (Element section : sections(tube)) {
      Node node = TubeNodes.node(bottle, section, electrode);
      if (node != null) {
        sections.add(section);
        nodes.add(node);
      }
    }
    if (nodes.size() == 1) {
      return new Point.OfTube(nodes.iterator().next(), bottle, sections, electrode);
    }
    List<String> choice = choice(tube, electrode, sections);
    if (choice.size() < 2) {
      throw notInTube(tube, electrode, cell);
    }
    throw new RowRefused(
        SheetProblem.SECTION_NEEDED,
        cell.span(),
        tube.name(),
        electrode.word(),
        String.join(", ", choice));
  }

  /** Returns the points that a name could mean which fits more than one electrode. */
  private List<String> choice(Tube tube, Electrode electrode, List<Element> sections) {
    List<String> choice = new ArrayList<>();
    if (!sections.isEmpty()) {
      sections.forEach(section -> choice.add(section.name() + "." + electrode.word()));
    } else if (electrode == Electrode.PLATE) {
      for (Electrode numbered : BY_NUMBER) {
        for (Element section : sections(tube)) {
          if (TubeNodes.node(tube.bottle(), section, numbered) != null) {
            choice.add(section.name() + "." + numbered.word());
          }
        }
      }
    }
    return choice;
  }

  private RowRefused notInTube(Tube tube, Electrode electrode, Cell cell) {
    List<String> wired = wired(tube);
    return new RowRefused(
        SheetProblem.ELECTRODE_NOT_IN_TUBE,
        cell.span(),
        tube.name(),
        electrode.word(),
        wired.isEmpty() ? "nothing of it is wired" : "there are " + String.join(", ", wired));
  }

  /** Returns the electrodes of {@code tube} that can be read, as points. */
  private List<String> wired(Tube tube) {
    Set<String> wired = new LinkedHashSet<>();
    for (Element section : sections(tube)) {
      for (Electrode electrode : Electrode.values()) {
        boolean single = !BY_NUMBER.contains(electrode) || electrode.word().endsWith("1");
        if (TubeNodes.node(tube.bottle(), section, electrode) != null && single) {
          wired.add(section.name() + "." + electrode.word());
        }
      }
    }
    return List.copyOf(wired);
  }

  private List<Element> sections(Tube tube) {
    String bottle = tube.bottle().name();
    List<Element> sections = new ArrayList<>();
    for (Element element : circuit.elements()) {
      boolean section = PointFinder.isTubeSection(element) && element.bottle().equals(bottle);
      if (section && (tube.section() == null || element.name().equals(bottle + tube.section()))) {
        sections.add(element);
      }
    }
    return sections;
  }

  private static String pinWord(int pin) {
    return pin == 0 ? "cap" : String.format(Locale.ROOT, "%d", pin);
  }
}
