package railwalk.netlist;

import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Bottle;
import railwalk.circuit.ControlledSource;
import railwalk.circuit.Coupling;
import railwalk.circuit.Diode;
import railwalk.circuit.Element;
import railwalk.circuit.Fuse;
import railwalk.circuit.Inductor;
import railwalk.circuit.Node;
import railwalk.circuit.Resistor;
import railwalk.circuit.Switch;
import railwalk.circuit.VoltageSource;
import railwalk.circuit.Winding;
import railwalk.circuit.Wire;
import railwalk.source.SourceSpan;

/** What can be told from how the parts hang together, without working out any volts. */
final class StructureCheck {
  private final Draft draft;
  private final Report report;
  private final List<Element> elements;

  StructureCheck(Draft draft) {
    this.draft = draft;
    this.report = draft.report();
    this.elements = draft.elements();
  }

  /** Reports all that is found. */
  void run(Node reference) {
    elements.forEach(this::acrossNothing);
    loops();
    if (!report.hasErrors()) {
      lonelyNodes(reference); // a line that could not be read leaves nodes alone that are not
    }
  }

  private SourceSpan span(Element element) {
    SourceSpan span = draft.spans().get(element.name().toUpperCase(Locale.ROOT));
    if (span == null) {
      throw new IllegalStateException(element.name() + " has no place");
    }
    return span;
  }

  private void acrossNothing(Element element) {
    if (element instanceof Winding winding) {
      List<Node> taps = winding.nodes();
      if (new HashSet<>(taps).size() < taps.size()) {
        report.add(Problem.WINDING_SHORTED, span(element), element.name());
      }
      return;
    }
    List<Node> nodes = element.nodes();
    boolean twoPoles = element.bottle().isEmpty() && nodes.size() == 2;
    boolean checked =
        element instanceof Resistor || element instanceof Diode || element instanceof Inductor;
    if (twoPoles && checked && nodes.get(0).equals(nodes.get(1))) {
      report.add(Problem.ACROSS_NOTHING, span(element), element.name(), nodes.get(0).name());
    }
  }

  // loops of sources: pieces of wire first, then one source after another

  private void loops() {
    Map<Node, Node> groups = new HashMap<>();
    for (Element element : elements) {
      if (element instanceof Wire wire) {
        join(groups, wire.a(), wire.b());
      } else if (element instanceof Fuse fuse) {
        join(groups, fuse.a(), fuse.b());
      } else if (element instanceof Switch contact && contact.position() > 0) {
        join(groups, contact.common(), contact.poles().get(contact.position() - 1));
      }
    }
    for (Element element : elements) {
      boolean ideal =
          (element instanceof VoltageSource source && source.seriesOhms() == 0)
              || (element instanceof ControlledSource controlled && givesVolts(controlled));
      if (!ideal) {
        continue;
      }
      Node a = element.nodes().get(0);
      Node b = element.nodes().get(1);
      if (root(groups, a).equals(root(groups, b))) {
        report.add(Problem.SOURCE_LOOP, span(element), element.name());
      } else {
        join(groups, a, b);
      }
    }
  }

  private static boolean givesVolts(ControlledSource source) {
    return source.kind() == ControlledSource.Kind.VOLTS_BY_VOLTS
        || source.kind() == ControlledSource.Kind.VOLTS_BY_AMPS;
  }

  private static Node root(Map<Node, Node> groups, Node node) {
    Node root = node;
    Node above = groups.get(root);
    while (above != null) {
      root = above;
      above = groups.get(root);
    }
    return root;
  }

  private static void join(Map<Node, Node> groups, Node a, Node b) {
    Node rootA = root(groups, a);
    Node rootB = root(groups, b);
    if (!rootA.equals(rootB)) {
      groups.put(rootA, rootB);
    }
  }

  // nodes that only one part touches

  /** Returns how many of a tube's amplifying sections touch a node: two in a cascode. */
  private int sectionsAt(Bottle bottle, Node node) {
    int count = 0;
    for (Element element : elements) {
      if (element instanceof AmplifierSection section
          && section.bottle().equals(bottle.name())
          && section.nodes().contains(node)) {
        count++;
      }
    }
    return count;
  }

  private void lonelyNodes(Node reference) {
    Map<Node, Integer> touches = new HashMap<>();
    Map<Node, Element> only = new HashMap<>();
    for (Element element : elements) {
      if (element instanceof Coupling || !element.bottle().isEmpty()) {
        continue;
      }
      for (Node node : new HashSet<>(element.nodes())) {
        touches.merge(node, 1, Integer::sum);
        only.put(node, element);
      }
    }
    Map<Node, String> tubeAt = new HashMap<>();
    for (Bottle bottle : draft.tubes().bottles()) {
      Set<Node> nodes = new HashSet<>(bottle.pins().values());
      elements.stream()
          .filter(e -> e.bottle().equals(bottle.name()))
          .forEach(e -> nodes.addAll(e.nodes()));
      for (Node node : nodes) {
        touches.merge(node, Math.max(1, sectionsAt(bottle, node)), Integer::sum);
        tubeAt.put(node, bottle.name());
      }
    }
    for (Node node : draft.nodes().nodes()) {
      SourceSpan span = draft.nodes().spans().get(node.name().toUpperCase(Locale.ROOT));
      boolean lonely = touches.getOrDefault(node, 0) == 1 && !node.equals(reference);
      if (!lonely || span == null || isInside(node)) {
        continue;
      }
      Element part = only.get(node);
      if (part instanceof Winding) {
        continue; // heaters need not be listed, so a winding's end may well be bare
      }
      String name = part == null ? tubeAt.getOrDefault(node, "") : part.name();
      report.add(Problem.NODE_OF_ONE_PART, span, node.name(), name, lookalike(node));
    }
  }

  /** A node inside a tube, such as a filament's middle, is not the user's to connect. */
  private boolean isInside(Node node) {
    return draft.tubes().bottles().stream()
        .anyMatch(b -> node.name().startsWith(b.name()) && node.name().contains(":"));
  }

  /** Returns a question when another node's name looks the same but for signs easily confused. */
  private String lookalike(Node node) {
    String folded = folded(node.name());
    return draft.nodes().nodes().stream()
        .filter(other -> !other.equals(node) && folded(other.name()).equals(folded))
        .findFirst()
        .map(other -> "did you mean " + other.name() + "?")
        .orElse("");
  }

  private static String folded(String name) {
    return name.toLowerCase(Locale.ROOT)
        .replace('o', '0')
        .replace('l', '1')
        .replace('i', '1')
        .replace("_", "")
        .replace("-", "");
  }
}
