package railwalk.device;

import java.util.List;

/**
 * A tube's heater or filament.
 *
 * @param connections volts and amperes of every rated connection, the first the usual one
 * @param directlyHeated whether the filament itself is the cathode
 * @param cathodeJoined whether an indirectly heated cathode is joined to a heater pin inside
 */
public record Heater(List<Connection> connections, boolean directlyHeated, boolean cathodeJoined) {
  /** One rated connection. */
  public record Connection(double volts, double amps) {}

  public Heater {
    connections = List.copyOf(connections);
  }
}
