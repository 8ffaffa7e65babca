package railwalk.solve;

import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Element;

/** One figure of the amplifier that differs from build to build, as a share of itself. */
public sealed interface SpreadPart {
  /** The ohms of a resistor or potentiometer. */
  record Ohms(Element element) implements SpreadPart {}

  /** The space current of an amplifier section at fixed volts. */
  record SpaceCurrent(AmplifierSection section) implements SpreadPart {}

  /** The current of a rectifier at a given drop. */
  record Emission(Element rectifier) implements SpreadPart {}

  /** The open-circuit volts of a winding, the line held. */
  record WindingVolts(Element winding) implements SpreadPart {}

  /** The volts of a fixed source. */
  record SourceVolts(Element source) implements SpreadPart {}

  /** The operating volts of a gas tube that glows. */
  record GlowVolts(Element tube) implements SpreadPart {}
}
