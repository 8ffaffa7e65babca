package railwalk.solve;

import java.util.List;
import java.util.Optional;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.RegulatorSection;
import railwalk.walk.SupplyMap;

/**
 * The solved circuit: volts at every node, current through every part. Immutable to its readers.
 */
public interface OperatingPoint {
  /** Returns the circuit that was solved. */
  Circuit circuit();

  /** Returns the walk it was solved by. */
  SupplyMap map();

  /** Returns the mean volts of {@code node} against the reference; NaN without a DC path. */
  double volts(Node node);

  /**
   * Returns the mean current through a two-terminal part from its first node to its second; for a
   * winding, the first section's; for a switch, from the common to the contact it is on; for a
   * potentiometer, from a towards b in the part of the track next to a. 0 for an open part.
   */
  double amps(Element element);

  /**
   * Returns the heat (watt) in a part, ripple included where it carries any; NaN for a winding that
   * feeds a rectifier.
   */
  double watts(Element element);

  /** Returns where an amplifier section stands. */
  SectionPoint at(AmplifierSection section);

  /** Returns a rectifier's point: plate volts and currents are means over the period and plates. */
  SectionPoint at(RectifierSection section);

  /** Returns where a regulator tube stands; a dark one carries no current. */
  SectionPoint at(RegulatorSection section);

  /** Returns whether a regulator tube or neon lamp of that name is lit. */
  boolean lit(String elementName);

  /** Returns the rectifier groups' outputs. */
  List<SupplyPoint> supplies();

  /**
   * Returns the rms ripple at a node inside a ripple group or at a supply node behind one; empty
   * elsewhere. Behind the group it is an estimate.
   */
  Optional<Double> rippleVoltsRms(Node node);

  /** Returns what windings and heaters give under load and what the rectifiers stand. */
  AcLoads acLoads();

  /**
   * Returns the lowest and the highest volts of {@code node} over the period; the mean twice where
   * it carries no ripple worth counting.
   */
  AcLoads.Range range(Node node);

  /**
   * Returns the resistance that a meter at {@code node} sees towards the reference (ohm): the slope
   * of volts over a small current drawn, supplies included; NaN without a DC path.
   */
  double sourceOhms(Node node);

  /**
   * Returns the resistance that a meter from {@code a} to {@code b} sees (ohm), as {@link
   * #sourceOhms(Node)}; NaN where a node has no DC path or lies within a supply.
   */
  double sourceOhms(Node a, Node b);

  /**
   * Returns the volts that a meter of {@code meterOhms} reads at {@code node}: by the source
   * resistance, and by solving again with the meter in where the loading is large.
   */
  double meterVolts(Node node, double meterOhms);

  /** Returns the convergence trace, a line for each step. */
  List<String> trace();
}
