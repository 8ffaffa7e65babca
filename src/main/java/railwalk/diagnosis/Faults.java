package railwalk.diagnosis;

import java.util.ArrayList;
import java.util.List;
import railwalk.circuit.Circuit;
import railwalk.device.TubeType;
import railwalk.walk.SupplyMap;

/** Every single fault that an amplifier may have. A new kind of fault is one line here. */
public final class Faults {
  private Faults() {}

  /**
   * Returns the faults of all parts of {@code circuit}.
   *
   * @param types those that might have been fitted by mistake
   */
  public static List<Fault> of(Circuit circuit, SupplyMap map, List<TubeType> types) {
    List<Fault> faults = new ArrayList<>();
    faults.addAll(PassiveFaults.of(circuit));
    faults.addAll(TubeFaults.of(circuit, types));
    faults.addAll(SupplyFaults.of(circuit));
    faults.addAll(WiringFaults.of(circuit, map));
    return faults;
  }
}
