package railwalk.circuit;

import java.util.ArrayList;
import java.util.List;
import railwalk.device.Electrode;
import railwalk.device.SectionKind;
import railwalk.device.TubeType;

/**
 * The electrodes of a tube that the netlist names without pins, read back from its parts so that
 * another type can take its place.
 */
final class Leads {
  private final Bottle bottle;
  private final TubeType type;
  private final List<Lead> leads = new ArrayList<>();

  /** Reads the leads of {@code bottle} for a tube of {@code type}. */
  Leads(Bottle bottle, TubeType type) {
    this.bottle = bottle;
    this.type = type;
  }

  /** Returns the leads that the bottle's parts among {@code elements} have. */
  List<Lead> of(List<Element> elements) {
    for (Element element : elements) {
      if (!element.bottle().equals(bottle.name())) {
        continue;
      }
      if (element instanceof AmplifierSection section) {
        amplifier(section);
      } else if (element instanceof RectifierSection section) {
        rectifier(section);
      } else if (element instanceof RegulatorSection section) {
        add(section.section(), Electrode.PLATE, section.anode());
        add(section.section(), Electrode.CATHODE, section.cathode());
      }
    }
    heater();
    return leads;
  }

  private void amplifier(AmplifierSection section) {
    String id = section.section();
    add(id, Electrode.PLATE, section.plate());
    if (section.screen() != null) {
      add(id, Electrode.SCREEN, section.screen());
    }
    if (section.suppressor() != null) {
      add(id, Electrode.SUPPRESSOR, section.suppressor());
    }
    add(id, Electrode.GRID, section.grid());
    add(id, Electrode.CATHODE, section.cathode());
  }

  private void rectifier(RectifierSection section) {
    String id = section.section();
    boolean detector = section.type().kind() == SectionKind.DIODE;
    Electrode first = detector ? Electrode.DIODE1 : Electrode.PLATE1;
    Electrode second = detector ? Electrode.DIODE2 : Electrode.PLATE2;
    boolean onePlate = type.pins().values().stream().noneMatch(use -> use.electrode() == first);
    add(id, onePlate ? Electrode.PLATE : first, section.plates().get(0));
    if (section.plates().size() > 1 && !onePlate) {
      add(id, second, section.plates().get(1));
    }
    add(id, Electrode.CATHODE, section.cathode());
  }

  private void heater() {
    bottle
        .type()
        .pins()
        .forEach(
            (pin, use) -> {
              Electrode electrode = use.electrode();
              Node node = bottle.pins().get(pin);
              boolean apart = !bottle.type().heater().directlyHeated();
              if (electrode != null && electrode.isHeater() && node != null && apart) {
                leads.add(new Lead("", electrode, node));
              }
            });
  }

  private void add(String section, Electrode electrode, Node node) {
    String id = section;
    if (type.section(section).isEmpty() && type.sections().size() == 1) {
      id = type.sections().get(0).id();
    }
    leads.add(new Lead(id, electrode, node));
  }
}
