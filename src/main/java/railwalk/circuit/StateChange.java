package railwalk.circuit;

import railwalk.device.TubeType;

/** One thing that a {@link State} sets otherwise than the netlist's first column. */
public sealed interface StateChange {
  /** A switch put on a position: 0 open, else the contact's number. */
  record SwitchPosition(String name, int position) implements StateChange {}

  /** A tube pulled from its socket. */
  record TubeOut(String bottle) implements StateChange {}

  /** Another type put into a tube's socket. */
  record TubeFitted(String bottle, TubeType type) implements StateChange {}

  /** A control set elsewhere: the share between b and the wiper. */
  record ControlSet(String name, double share) implements StateChange {}

  /** Other line volts. */
  record LineVolts(double volts) implements StateChange {}
}
