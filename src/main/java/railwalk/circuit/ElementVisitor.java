package railwalk.circuit;

/** One method per kind of part: the compiler lists every place that a new kind must be handled. */
public interface ElementVisitor<R> {
  R visit(Resistor resistor);

  R visit(Capacitor capacitor);

  R visit(Inductor inductor);

  R visit(VoltageSource voltageSource);

  R visit(CurrentSource currentSource);

  R visit(Winding winding);

  R visit(Diode diode);

  R visit(ControlledSource controlledSource);

  R visit(Coupling coupling);

  R visit(Potentiometer potentiometer);

  R visit(Switch contact);

  R visit(Fuse fuse);

  R visit(Lamp lamp);

  R visit(GlowLamp glowLamp);

  R visit(Wire wire);

  R visit(Filament filament);

  R visit(AmplifierSection amplifierSection);

  R visit(RectifierSection rectifierSection);

  R visit(RegulatorSection regulatorSection);

  R visit(StandIn standIn);
}
