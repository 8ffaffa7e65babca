package railwalk.device;

import java.util.List;

/**
 * A tube's heater or filament.
 *
 * @param connections volts and amperes of every rated connection, the first the usual one
 * @param tapVolts volts between the second heater pin and the tap in the first connection; NaN
 *     without a tap
 * @param directlyHeated whether the filament itself is the cathode
 * @param cathodeJoined whether an indirectly heated cathode is joined to the second end of the
 *     heater inside; its pin is then listed as the cathode alone
 */
public record Heater(
    List<Connection> connections, double tapVolts, boolean directlyHeated, boolean cathodeJoined) {
  /** One rated connection. */
  public record Connection(double volts, double amps) {}

  /** Keeps a copy of the connections. */
  public Heater {
    connections = List.copyOf(connections);
  }

  /** A heater without a tap. */
  public Heater(List<Connection> connections, boolean directlyHeated, boolean cathodeJoined) {
    this(connections, Double.NaN, directlyHeated, cathodeJoined);
  }
}
