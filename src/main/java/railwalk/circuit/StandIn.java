package railwalk.circuit;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import railwalk.device.Electrode;

/**
 * A tube whose type is unknown, standing in as constant currents from the named electrodes to its
 * cathode.
 *
 * @param draws ampere into each electrode, other than the cathode
 */
public record StandIn(String name, Map<Electrode, Node> electrodes, Map<Electrode, Double> draws)
    implements Element {
  @Override
  public List<Node> nodes() {
    return List.copyOf(electrodes.values());
  }

  @Override
  public <R> R accept(ElementVisitor<R> visitor) {
    return visitor.visit(this);
  }

  @Override
  public int hashCode() {
    return name.hashCode();
  }

  /** Keeps copies in the given order. */
  public StandIn {
    electrodes = Collections.unmodifiableMap(new LinkedHashMap<>(electrodes));
    draws = Collections.unmodifiableMap(new LinkedHashMap<>(draws));
  }
}
