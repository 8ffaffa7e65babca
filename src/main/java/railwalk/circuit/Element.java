package railwalk.circuit;

import java.util.List;

/**
 * A part of the amplifier. Volts of a two-terminal part are those of {@code a} against {@code b},
 * its current flows from a through the part to b.
 *
 * <p>Parts are keys wherever figures are kept, and no two parts of a circuit share a name: the hash
 * of a part is the hash of its name.
 */
public sealed interface Element
    permits Resistor,
        Capacitor,
        Inductor,
        VoltageSource,
        CurrentSource,
        Winding,
        Diode,
        ControlledSource,
        Coupling,
        Potentiometer,
        Switch,
        Fuse,
        Lamp,
        GlowLamp,
        Wire,
        Filament,
        AmplifierSection,
        RectifierSection,
        RegulatorSection,
        StandIn {

  /** Returns the name as charts print it: upper case, without the X of an X line. */
  String name();

  /** Returns the nodes it touches, in netlist order, repeated where it touches one twice. */
  List<Node> nodes();

  /** Returns the tube that it is a piece of; empty for every other part. */
  default String bottle() {
    return "";
  }

  /** Calls the visitor's method for this kind of part. */
  <R> R accept(ElementVisitor<R> visitor);
}
