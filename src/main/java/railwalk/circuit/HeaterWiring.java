package railwalk.circuit;

import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;
import railwalk.device.Electrode;
import railwalk.device.Heater;

/**
 * One piece of {@link Socket}: the heater's parts that are wired at both ends, and the node that a
 * filament or a cathode joined to the heater gives the sections.
 */
final class HeaterWiring {
  private final String bottle;
  private final List<Filament> filaments = new ArrayList<>();
  private final @Nullable Node cathode;

  HeaterWiring(String bottle, Heater heater, Socket.Lookup lookup, Socket.NodeMaker nodes) {
    this.bottle = bottle;
    Node first = lookup.node("", Electrode.HEATER1);
    Node second = lookup.node("", Electrode.HEATER2);
    Node tap = lookup.node("", Electrode.HEATER_TAP);
    Node named = lookup.node("", Electrode.CATHODE);
    if (heater.directlyHeated()) {
      boolean twoEnds = first != null && second != null && !first.equals(second);
      if (tap == null && twoEnds) {
        tap = named == null ? nodes.inside(bottle + ":filament") : named;
      }
      cathode = tap != null ? tap : first != null ? first : second;
    } else if (heater.cathodeJoined()) {
      second = second == null ? named : second;
      cathode = second;
    } else {
      cathode = null;
    }
    wire(heater, first, second, tap);
  }

  /** Returns the node of a cathode that is the filament or joined to it; null for one apart. */
  @Nullable Node cathode() {
    return cathode;
  }

  /** Returns the heater's parts in the circuit. */
  List<Filament> filaments() {
    return filaments;
  }

  private void wire(
      Heater heater, @Nullable Node first, @Nullable Node second, @Nullable Node tap) {
    if (heater.connections().isEmpty()) {
      return;
    }
    Heater.Connection whole = heater.connections().get(0);
    if (tap == null) {
      part(":HEATER", first, second, whole.volts(), whole.amps());
      return;
    }
    double tapVolts = Double.isNaN(heater.tapVolts()) ? whole.volts() / 2 : heater.tapVolts();
    part(":HEATER1", first, tap, whole.volts() - tapVolts, whole.amps());
    part(":HEATER2", tap, second, tapVolts, whole.amps());
  }

  private void part(String suffix, @Nullable Node a, @Nullable Node b, double volts, double amps) {
    if (a != null && b != null && !a.equals(b)) {
      filaments.add(new Filament(bottle + suffix, bottle, a, b, volts, amps));
    }
  }
}
