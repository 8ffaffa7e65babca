package railwalk.readings;

import java.util.List;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Bottle;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.device.Electrode;

/** What the name of a point stands for, before the kind of reading says where the leads go. */
sealed interface Point {
  /** A node by its own name. */
  record OfNode(Node node) implements Point {}

  /**
   * A pin or electrode of a tube.
   *
   * @param bottle null for a stand-in
   * @param sections those whose electrode it is; empty for a heater's or a tie point
   * @param electrode null for a pin that leads to none
   */
  record OfTube(
      Node node, @Nullable Bottle bottle, List<Element> sections, @Nullable Electrode electrode)
      implements Point {
    public OfTube {
      sections = List.copyOf(sections);
    }
  }

  /** A part that is no tube. */
  record OfPart(Element element) implements Point {}
}
