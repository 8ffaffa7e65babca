package railwalk.chart;

import java.util.List;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Circuit;
import railwalk.circuit.Node;
import railwalk.device.Electrode;
import railwalk.device.ElectrodeNames;

/**
 * The point that a walk leads to.
 *
 * @param name as the walk's heading shows it
 * @param section the amplifying section whose electrode it is; null for a plain node
 * @param electrode null with {@code section}
 */
public record WalkTarget(
    String name, Node node, @Nullable AmplifierSection section, @Nullable Electrode electrode) {
  /** In which order a node that several electrodes share is taken for one of them. */
  private static final List<Electrode> FIRST =
      List.of(Electrode.PLATE, Electrode.SCREEN, Electrode.CATHODE, Electrode.GRID);

  /**
   * Returns the point that {@code text} names: a node ("p1"), a socket pin ("V1.6"), or an
   * electrode ("V1A.plate", "V3 screen"), in any case; empty when there is none of that name. Of a
   * tube with several sections and no letter given, the first one counts.
   */
  public static Optional<WalkTarget> find(Circuit circuit, String text) {
    String wanted = text.strip();
    return circuit
        .node(wanted)
        .map(node -> at(circuit, node, node.name()))
        .or(() -> pin(circuit, wanted))
        .or(() -> electrode(circuit, wanted));
  }

  private static Optional<WalkTarget> pin(Circuit circuit, String wanted) {
    for (Socket socket : Socket.in(circuit)) {
      for (Socket.Pin pin : socket.pins()) {
        if (socket.nameOf(pin).equalsIgnoreCase(wanted)) {
          return Optional.of(onPin(circuit, socket, pin));
        }
      }
    }
    return Optional.empty();
  }

  private static WalkTarget onPin(Circuit circuit, Socket socket, Socket.Pin pin) {
    String name = socket.nameOf(pin);
    Electrode electrode = pin.electrode();
    for (AmplifierSection section : circuit.elements(AmplifierSection.class)) {
      boolean same =
          section.bottle().equals(socket.name())
              && (pin.section().isEmpty() || pin.section().equals(section.section()));
      if (same && electrode != null && pin.node().equals(nodeOf(section, electrode))) {
        return new WalkTarget(name, pin.node(), section, electrode);
      }
    }
    return at(circuit, pin.node(), name);
  }

  private static Optional<WalkTarget> electrode(Circuit circuit, String wanted) {
    String[] words = wanted.split("[.\\s]+", 2);
    Electrode electrode =
        words.length < 2 ? null : ElectrodeNames.electrode(words[1].strip()).orElse(null);
    if (electrode == null) {
      return Optional.empty();
    }
    for (AmplifierSection section : circuit.elements(AmplifierSection.class)) {
      boolean named =
          section.name().equalsIgnoreCase(words[0]) || section.bottle().equalsIgnoreCase(words[0]);
      Node node = nodeOf(section, electrode);
      if (named && node != null) {
        return Optional.of(
            new WalkTarget(
                section.name() + " " + new Wording(circuit.words()).electrode(electrode),
                node,
                section,
                electrode));
      }
    }
    return Optional.empty();
  }

  /** Returns the walk's target at a node: an electrode on it, unless it is a plain node. */
  private static WalkTarget at(Circuit circuit, Node node, String name) {
    for (Electrode electrode : FIRST) {
      for (AmplifierSection section : circuit.elements(AmplifierSection.class)) {
        if (node.equals(nodeOf(section, electrode))) {
          return new WalkTarget(name, node, section, electrode);
        }
      }
    }
    return new WalkTarget(name, node, null, null);
  }

  private static @Nullable Node nodeOf(AmplifierSection section, Electrode electrode) {
    return switch (electrode) {
      case PLATE -> section.plate();
      case SCREEN -> section.screen();
      case GRID -> section.grid();
      case CATHODE -> section.cathode();
      default -> null;
    };
  }
}
