package railwalk.chart;

import java.util.stream.Collectors;
import railwalk.circuit.Circuit;
import railwalk.circuit.State;
import railwalk.circuit.StateChange;
import railwalk.circuit.StateChange.ControlSet;
import railwalk.circuit.StateChange.LineVolts;
import railwalk.circuit.StateChange.SwitchPosition;
import railwalk.circuit.StateChange.TubeFitted;
import railwalk.circuit.StateChange.TubeOut;
import railwalk.circuit.Switch;
import railwalk.units.Quantity;

/** Says what a state changes. */
final class StateWords {
  private final Circuit circuit;
  private final Wording wording;

  StateWords(Circuit circuit, Wording wording) {
    this.circuit = circuit;
    this.wording = wording;
  }

  /** Returns all changes in one line: "V3 out, S1 open". */
  String changes(State state) {
    String changes = state.changes().stream().map(this::change).collect(Collectors.joining(", "));
    return changes.isEmpty() ? "as the first column" : changes;
  }

  private String change(StateChange change) {
    if (change instanceof SwitchPosition set) {
      return set.name() + " " + position(set);
    }
    if (change instanceof TubeOut out) {
      return out.bottle() + " out of its socket";
    }
    if (change instanceof TubeFitted fitted) {
      return fitted.type().name() + " in " + fitted.bottle() + "’s socket";
    }
    if (change instanceof ControlSet set) {
      return set.name() + " at " + Quantity.percent(set.share());
    }
    LineVolts line = (LineVolts) change;
    return wording.say("{line} ") + Quantity.volts(line.volts());
  }

  private String position(SwitchPosition set) {
    return circuit
        .element(set.name())
        .filter(Switch.class::isInstance)
        .map(element -> SwitchWords.position((Switch) element, set.position()))
        .orElse(Integer.toString(set.position()));
  }
}
