package railwalk.circuit;

import java.util.Collections;
import java.util.SortedMap;
import java.util.TreeMap;
import railwalk.device.TubeType;

/**
 * One tube as it stands in its socket: which node each wired pin carries, tie points included.
 *
 * @param name such as "V3"
 * @param pins node by socket pin, 0 for the top cap; empty when the type's pins are not known
 * @param wiring how the netlist named its electrodes
 */
public record Bottle(String name, TubeType type, SortedMap<Integer, Node> pins, Wiring wiring) {
  /** How the netlist named the electrodes. */
  public enum Wiring {
    BY_PIN,
    BY_ELECTRODE,
    BY_POSITION
  }

  public Bottle {
    pins = Collections.unmodifiableSortedMap(new TreeMap<>(pins));
  }
}
