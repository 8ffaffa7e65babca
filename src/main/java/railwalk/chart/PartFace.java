package railwalk.chart;

import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Capacitor;
import railwalk.circuit.ControlledSource;
import railwalk.circuit.Coupling;
import railwalk.circuit.CurrentSource;
import railwalk.circuit.Diode;
import railwalk.circuit.Element;
import railwalk.circuit.ElementVisitor;
import railwalk.circuit.Filament;
import railwalk.circuit.Fuse;
import railwalk.circuit.GlowLamp;
import railwalk.circuit.Inductor;
import railwalk.circuit.Lamp;
import railwalk.circuit.Potentiometer;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.RegulatorSection;
import railwalk.circuit.Resistor;
import railwalk.circuit.StandIn;
import railwalk.circuit.Switch;
import railwalk.circuit.VoltageSource;
import railwalk.circuit.Winding;
import railwalk.circuit.Wire;
import railwalk.units.Quantity;

/**
 * How a part looks in a table or drawing.
 *
 * @param value such as "4.7 kΩ"; empty when there is none worth printing
 */
record PartFace(Ladder.Symbol symbol, String value) {

  /** Returns the face of {@code element}. */
  static PartFace of(Element element) {
    return element.accept(Faces.INSTANCE);
  }

  private static final class Faces implements ElementVisitor<PartFace> {
    private static final Faces INSTANCE = new Faces();

    @Override
    public PartFace visit(Resistor resistor) {
      return new PartFace(Ladder.Symbol.RESISTOR, Quantity.ohms(resistor.ohms()));
    }

    @Override
    public PartFace visit(Inductor inductor) {
      String ohms =
          Double.isNaN(inductor.dcOhms())
              ? "resistance not given"
              : Quantity.ohms(inductor.dcOhms());
      String henries =
          Double.isNaN(inductor.henries()) ? "" : Quantity.of(inductor.henries(), "H") + ", ";
      return new PartFace(Ladder.Symbol.CHOKE, henries + ohms);
    }

    @Override
    public PartFace visit(Fuse fuse) {
      return new PartFace(
          Ladder.Symbol.FUSE,
          Double.isNaN(fuse.ratedAmps()) ? "" : Quantity.amps(fuse.ratedAmps()));
    }

    @Override
    public PartFace visit(Switch contact) {
      return new PartFace(Ladder.Symbol.SWITCH, SwitchWords.position(contact));
    }

    @Override
    public PartFace visit(Diode diode) {
      return new PartFace(Ladder.Symbol.DIODE, diode.typeName());
    }

    @Override
    public PartFace visit(Lamp lamp) {
      return new PartFace(
          Ladder.Symbol.LAMP,
          Quantity.volts(lamp.ratedVolts()) + " " + Quantity.amps(lamp.ratedAmps()));
    }

    @Override
    public PartFace visit(GlowLamp glowLamp) {
      return new PartFace(Ladder.Symbol.LAMP, glowLamp.typeName());
    }

    @Override
    public PartFace visit(Potentiometer potentiometer) {
      return box(Quantity.ohms(potentiometer.ohms()));
    }

    @Override
    public PartFace visit(Capacitor capacitor) {
      return box(Quantity.of(capacitor.farads(), "F"));
    }

    @Override
    public PartFace visit(VoltageSource source) {
      return box(Quantity.volts(source.volts()));
    }

    @Override
    public PartFace visit(CurrentSource source) {
      return box(Quantity.amps(source.amps()));
    }

    @Override
    public PartFace visit(Winding winding) {
      return box("winding");
    }

    @Override
    public PartFace visit(ControlledSource source) {
      return box("controlled source");
    }

    @Override
    public PartFace visit(Coupling coupling) {
      return box("");
    }

    @Override
    public PartFace visit(Wire wire) {
      return box("");
    }

    @Override
    public PartFace visit(Filament filament) {
      return new PartFace(
          Ladder.Symbol.LAMP,
          Quantity.volts(filament.ratedVolts()) + " " + Quantity.amps(filament.ratedAmps()));
    }

    @Override
    public PartFace visit(AmplifierSection tube) {
      return box("");
    }

    @Override
    public PartFace visit(RectifierSection tube) {
      return new PartFace(Ladder.Symbol.DIODE, "");
    }

    @Override
    public PartFace visit(RegulatorSection tube) {
      return box("");
    }

    @Override
    public PartFace visit(StandIn standIn) {
      return box("");
    }

    private static PartFace box(String value) {
      return new PartFace(Ladder.Symbol.BOX, value);
    }
  }
}
