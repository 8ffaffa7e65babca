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
 * @param slow whether it is one of the rectifiers that take twice as long as others to warm up
 * @param warmUpSeconds until nine tenths of the current are there; NaN: as usual for its kind
 */
public record Heater(
    List<Connection> connections,
    double tapVolts,
    boolean directlyHeated,
    boolean cathodeJoined,
    boolean slow,
    double warmUpSeconds) {
  /** One rated connection. */
  public record Connection(double volts, double amps) {}

  /** Keeps a copy of the connections. */
  public Heater {
    connections = List.copyOf(connections);
  }

  /** A heater without a tap that warms up as usual. */
  public Heater(List<Connection> connections, boolean directlyHeated, boolean cathodeJoined) {
    this(connections, Double.NaN, directlyHeated, cathodeJoined, false, Double.NaN);
  }
}
