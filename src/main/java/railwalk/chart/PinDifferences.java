package railwalk.chart;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeSet;
import railwalk.device.Electrode;
import railwalk.device.PinUse;
import railwalk.device.TubeType;

/**
 * How the pins of one type differ from another's.
 *
 * @param differing pins on which one of them has an electrode and the other another
 * @param taken pins that are free in the first and connected inside the second
 */
record PinDifferences(List<Integer> differing, List<Integer> taken) {
  /** A shield, a shell or a connection that is to be left alone. */
  private static final String INSIDE = "inside";

  PinDifferences {
    differing = List.copyOf(differing);
    taken = List.copyOf(taken);
  }

  /** Compares the pins of {@code other} with those of {@code wanted}. */
  static PinDifferences of(TubeType wanted, TubeType other) {
    List<Integer> differing = new ArrayList<>();
    List<Integer> taken = new ArrayList<>();
    TreeSet<Integer> pins = new TreeSet<>(wanted.pins().keySet());
    pins.addAll(other.pins().keySet());
    for (int pin : pins) {
      String before = electrode(wanted, pin);
      String after = electrode(other, pin);
      if (before.equals(after)) {
        continue;
      }
      if (before.isEmpty()) {
        taken.add(pin);
      } else if (!(before.equals(INSIDE) && after.isEmpty())) {
        differing.add(pin);
      }
    }
    return new PinDifferences(differing, taken);
  }

  /** Returns a pin's electrode and the place of its section; empty for one that is free. */
  private static String electrode(TubeType type, int pin) {
    PinUse use = type.pins().get(pin);
    if (use == null || use.role() == PinUse.Role.EMPTY) {
      return "";
    }
    Electrode electrode = use.electrode();
    if (electrode == null) {
      return INSIDE;
    }
    boolean filament = type.heater().directlyHeated() || type.heater().cathodeJoined();
    if (electrode == Electrode.HEATER1
        || electrode == Electrode.HEATER2
        || (filament && electrode == Electrode.CATHODE)) {
      return "heater";
    }
    int place = 0;
    for (Map.Entry<Integer, PinUse> other : type.pins().entrySet()) {
      boolean sameKind = other.getValue().electrode() == electrode;
      place += sameKind && other.getKey() <= pin ? 1 : 0;
    }
    return electrode.word().replaceAll("[12]$", "") + (use.section().isEmpty() ? "" : place);
  }
}
