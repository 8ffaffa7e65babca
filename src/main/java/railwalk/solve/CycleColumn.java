package railwalk.solve;

import railwalk.circuit.Element;
import railwalk.circuit.Winding;

/** What a {@link CycleSweep} can be asked the derivative by. */
sealed interface CycleColumn {
  /** The state of that number at the start of the period. */
  record StartState(int state) implements CycleColumn {}

  /** A current drawn from the node of that unknown, ampere. */
  record Drawn(int node) implements CycleColumn {}

  /** A winding's open-circuit volts, as a share of them. */
  record WindingVolts(Winding winding) implements CycleColumn {}

  /** A resistor's ohms, as a share of them; {@code branch} is its current's unknown or −1. */
  record PartOhms(Element element, int a, int b, int branch, double ohms) implements CycleColumn {}

  /** A rectifier's emission, as a share of it. */
  record Emission(Element element) implements CycleColumn {}
}
