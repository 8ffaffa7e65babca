package railwalk.solve;

import java.util.ArrayList;
import java.util.List;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Node;

/** An amplifier's mean volts from switch-on, instant by instant. Immutable to its readers. */
public final class WarmUpCourse {
  /**
   * The first charge of empty reservoirs, switched on as the line passes zero.
   *
   * @param plate which of the rectifier's plates, from 0
   * @param peakAmps in the first period; 0 for one that is still cold
   */
  public record FirstCharge(Element rectifier, int plate, double peakAmps) {}

  private final Circuit circuit;
  private final List<FirstCharge> firstCharges;
  private final List<Double> instants = new ArrayList<>();
  private final List<double[]> volts = new ArrayList<>();

  WarmUpCourse(Circuit circuit, List<FirstCharge> firstCharges) {
    this.circuit = circuit;
    this.firstCharges = List.copyOf(firstCharges);
  }

  /** Adds an instant with the volts of each node by its index. */
  void add(double seconds, double[] voltsByNode) {
    instants.add(seconds);
    volts.add(voltsByNode);
  }

  /** Returns the circuit as it stands at the end. */
  public Circuit circuit() {
    return circuit;
  }

  /** Returns what rectifiers carry when the reservoirs are first charged. */
  public List<FirstCharge> firstCharges() {
    return firstCharges;
  }

  /** Returns the instants, seconds since switch-on, rising from 0. */
  public double[] seconds() {
    return instants.stream().mapToDouble(Double::doubleValue).toArray();
  }

  /** Returns the volts of {@code node} at each instant; NaN where they are not predictable. */
  public double[] volts(Node node) {
    return volts.stream().mapToDouble(v -> v[node.index()]).toArray();
  }

  /** Returns the volts across {@code capacitor}, its first node against its second. */
  public double[] across(Capacitor capacitor) {
    double[] across = volts(capacitor.a());
    double[] foot = volts(capacitor.b());
    for (int i = 0; i < across.length; i++) {
      across[i] -= foot[i];
    }
    return across;
  }
}
