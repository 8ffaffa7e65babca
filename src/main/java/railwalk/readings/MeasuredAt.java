package railwalk.readings;

import org.jspecify.annotations.Nullable;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.circuit.Winding;
import railwalk.device.Electrode;

/** Where the meter's leads stood. */
public sealed interface MeasuredAt {
  /** Red lead on a node, black lead on the reference. */
  record AtNode(Node node) implements MeasuredAt {}

  /** Both leads on a two-terminal part (a potentiometer's track): the drop, by magnitude. */
  record Across(Element element, Node a, Node b) implements MeasuredAt {}

  /** In series with a part, or with an electrode of a tube section. */
  record Through(Element element, @Nullable Electrode electrode) implements MeasuredAt {}

  /** On a winding's two ends. */
  record OnWinding(Winding winding) implements MeasuredAt {}
}
