package railwalk.walk;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.circuit.StandIn;
import railwalk.device.Electrode;

/** Which electrodes of amplifying tubes (stand-ins among them) each node of a circuit carries. */
final class Electrodes {
  private final Map<Node, List<TubeElectrode>> taps = new HashMap<>();

  private Electrodes() {}

  /** Returns the electrodes of {@code circuit} by node. */
  static Electrodes of(Circuit circuit) {
    Electrodes electrodes = new Electrodes();
    for (AmplifierSection section : circuit.elements(AmplifierSection.class)) {
      electrodes.add(section.plate(), section, Electrode.PLATE);
      electrodes.add(section.screen(), section, Electrode.SCREEN);
      electrodes.add(section.grid(), section, Electrode.GRID);
      electrodes.add(section.cathode(), section, Electrode.CATHODE);
    }
    for (StandIn standIn : circuit.elements(StandIn.class)) {
      standIn.electrodes().forEach((electrode, node) -> electrodes.add(node, standIn, electrode));
    }
    return electrodes;
  }

  private void add(@Nullable Node node, Element tube, Electrode electrode) {
    if (node != null) {
      taps.computeIfAbsent(node, key -> new ArrayList<>()).add(new TubeElectrode(tube, electrode));
    }
  }

  /** Returns the electrodes at {@code node}. */
  List<TubeElectrode> at(Node node) {
    return taps.getOrDefault(node, List.of());
  }

  /** Returns whether a plate or a screen is at {@code node}. */
  boolean fedAt(Node node) {
    return at(node).stream().anyMatch(TubeElectrode::fed);
  }

  /** Returns whether a cathode is at {@code node}. */
  boolean cathodeAt(Node node) {
    return at(node).stream().anyMatch(tap -> tap.electrode() == Electrode.CATHODE);
  }

  /**
   * Returns whether {@code node} belongs to a tube's signal, being a plate, grid or cathode: a
   * supply does not go on through it unless other tubes are fed from there.
   */
  boolean signalAt(Node node) {
    return at(node).stream().anyMatch(tap -> tap.electrode() != Electrode.SCREEN);
  }
}
