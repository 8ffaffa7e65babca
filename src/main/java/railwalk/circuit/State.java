package railwalk.circuit;

import java.util.List;

/** A further column of the chart: the amplifier with some switches, tubes or controls changed. */
public record State(String name, List<StateChange> changes) {
  public State {
    changes = List.copyOf(changes);
  }
}
