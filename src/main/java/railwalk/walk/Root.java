package railwalk.walk;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import railwalk.circuit.Circuit;
import railwalk.circuit.Diode;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.VoltageSource;

/**
 * Where a supply begins: a rectifier's output, the hot end of a fixed source, or a return lead that
 * stands off the reference.
 *
 * @param group index of the ripple group; −1 for a fixed source
 * @param negative whether it is below the reference
 * @param always whether it is a supply even when nothing hangs on it
 */
record Root(Node node, int group, boolean negative, boolean always) {
  /** Volts from which a fixed source is taken for a rail whatever hangs on it. */
  private static final double RAIL_VOLTS = 20;

  /** Returns the roots of a circuit: positive supplies first, then the negative ones. */
  static List<Root> of(Circuit circuit, List<RippleGroup> groups, Grounds grounds) {
    List<Root> roots = new ArrayList<>();
    for (int g = 0; g < groups.size(); g++) {
      RippleGroup group = groups.get(g);
      for (Node output : group.outputs()) {
        if (!grounds.nodes().contains(output)) {
          roots.add(new Root(output, g, negative(group, output), true));
        }
      }
    }
    for (VoltageSource source : circuit.elements(VoltageSource.class)) {
      addEnds(source, grounds, roots);
    }
    for (int g = 0; g < groups.size(); g++) {
      for (Node node : grounds.returns().get(g)) {
        roots.add(new Root(node, g, true, false));
      }
    }
    Set<Node> seen = new HashSet<>();
    return roots.stream()
        .sorted(Comparator.comparing(Root::negative))
        .filter(root -> seen.add(root.node()))
        .toList();
  }

  /** Returns whether {@code source} begins a supply, and so is no link between two nodes of one. */
  static boolean begins(VoltageSource source, Grounds grounds) {
    double volts = Math.abs(source.volts());
    boolean grounded = grounds.nodes().contains(source.a()) != grounds.nodes().contains(source.b());
    return volts >= RAIL_VOLTS || (grounded && volts > 0);
  }

  private static void addEnds(VoltageSource source, Grounds grounds, List<Root> roots) {
    if (!begins(source, grounds)) {
      return;
    }
    boolean rail = Math.abs(source.volts()) >= RAIL_VOLTS;
    Node high = source.volts() > 0 ? source.a() : source.b();
    Node low = source.volts() > 0 ? source.b() : source.a();
    if (!grounds.nodes().contains(high)) {
      roots.add(new Root(high, -1, false, rail));
    }
    if (!grounds.nodes().contains(low)) {
      roots.add(new Root(low, -1, true, rail && grounds.nodes().contains(high)));
    }
  }

  /** Returns whether rectifiers draw current out of {@code output} rather than feed it. */
  static boolean negative(RippleGroup group, Node output) {
    boolean drawn = false;
    for (Element element : group.elements()) {
      if (element instanceof Diode diode) {
        drawn |= diode.anode().equals(output);
        if (diode.cathode().equals(output)) {
          return false;
        }
      } else if (element instanceof RectifierSection section) {
        drawn |= section.plates().contains(output);
        if (section.cathode().equals(output)) {
          return false;
        }
      }
    }
    return drawn;
  }
}
