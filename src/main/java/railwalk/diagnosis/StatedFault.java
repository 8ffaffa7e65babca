package railwalk.diagnosis;

import java.util.ArrayList;
import java.util.List;
import railwalk.circuit.Circuit;
import railwalk.device.TubeType;
import railwalk.walk.SupplyMap;

/**
 * A fault as somebody supposes it.
 *
 * @param severity how bad, in the unit of the fault's range; its only figure where there is none to
 *     state
 */
public record StatedFault(Fault fault, double severity) {
  /** What {@link Fault#detail} is for a tube out of its socket. */
  public static final String PULLED = "out of its socket";

  /**
   * Returns the faults that {@code phrase} names: "R5 open", "C8 leak=10M", "V3 weak=0.5". What is
   * said of a tube of several sections holds for each of them.
   *
   * @param types those that a hand might fit
   * @throws NotAFault when the part or the words are not known, or don't go together
   */
  public static List<StatedFault> read(
      String phrase, Circuit circuit, SupplyMap map, List<TubeType> types) throws NotAFault {
    return new FaultPhrase(phrase, circuit, Faults.of(circuit, map, types), types).read();
  }

  /** Returns {@code circuit} with all of {@code faults} in it, put in one after the other. */
  public static Circuit all(List<StatedFault> faults, Circuit circuit) {
    Circuit faulted = circuit;
    for (StatedFault stated : faults) {
      faulted = stated.fault.applyTo(faulted, stated.severity);
    }
    return faulted;
  }

  /** Returns the severity where there is one to state, else NaN. */
  public double stated() {
    return fault.range().open() ? severity : Double.NaN;
  }

  static List<StatedFault> each(List<Fault> faults, double severity) {
    List<StatedFault> stated = new ArrayList<>();
    for (Fault fault : faults) {
      stated.add(new StatedFault(fault, fault.range().open() ? severity : fault.range().low()));
    }
    return stated;
  }
}
