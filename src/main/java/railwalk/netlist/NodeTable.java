package railwalk.netlist;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Node;
import railwalk.source.SourceSpan;

/** The nodes in order of first appearance, and where each was first named. */
final class NodeTable {
  private static final String CHASSIS = "chassis";
  private static final String REFERENCE = "0";
  private static final Set<String> REFERENCE_NAMES = Set.of(REFERENCE, "gnd");

  private final boolean chassisIsReference;
  private final List<String> globals;
  private final Report report;
  private final List<Node> nodes = new ArrayList<>();
  private final Map<String, Node> byKey = new LinkedHashMap<>();
  private final Map<String, SourceSpan> spans = new HashMap<>();

  /**
   * An empty table.
   *
   * @param chassisIsReference whether {@code chassis} is another name of the reference
   * @param globals names that mean the same node inside sub-circuits, lower case
   */
  NodeTable(boolean chassisIsReference, List<String> globals, Report report) {
    this.chassisIsReference = chassisIsReference;
    this.globals = globals;
    this.report = report;
  }

  /** Returns the node that {@code word} names in {@code frame}. */
  Node node(Word word, Frame frame) {
    String text = word.text();
    if (word.isExpression() || text.indexOf('.') >= 0 || text.isBlank()) {
      report.add(Problem.BAD_NODE_NAME, word.span(), text);
    }
    String lower = text.toLowerCase(Locale.ROOT);
    Node port = frame.ports().get(lower);
    if (port != null) {
      return port;
    }
    String key = key(lower);
    boolean shared = key.equals(REFERENCE) || key.equals(CHASSIS) || globals.contains(key);
    return shared
        ? make(key, text, word.span())
        : make(key(frame.node(lower)), frame.node(text), word.span());
  }

  /** Returns a node inside a tube, made if need be. */
  Node inside(String name, SourceSpan span) {
    return make(key(name.toLowerCase(Locale.ROOT)), name, span);
  }

  /** Returns the reference node, made if the text never names it. */
  Node reference() {
    Node known = byKey.get(REFERENCE);
    return known == null ? make(REFERENCE, REFERENCE, null) : known;
  }

  /** Returns whether {@code node} is the one called 0 or gnd. */
  boolean isZero(Node node) {
    return node.equals(byKey.get(REFERENCE));
  }

  /** Returns the node that the text calls {@code name} outside sub-circuits. */
  Optional<Node> find(String name) {
    return Optional.ofNullable(byKey.get(key(name.toLowerCase(Locale.ROOT))));
  }

  /** Returns the chassis where it is a node of its own. */
  Optional<Node> chassis() {
    return chassisIsReference ? Optional.empty() : Optional.ofNullable(byKey.get(CHASSIS));
  }

  /** Returns the nodes in order of first appearance. */
  List<Node> nodes() {
    return nodes;
  }

  /** Returns where nodes are first named, by name in upper case. */
  Map<String, SourceSpan> spans() {
    return spans;
  }

  private Node make(String key, String name, @Nullable SourceSpan span) {
    Node known = byKey.get(key);
    if (known != null) {
      return known;
    }
    Node node = new Node(nodes.size(), name);
    nodes.add(node);
    byKey.put(key, node);
    if (span != null) {
      spans.put(name.toUpperCase(Locale.ROOT), span);
    }
    return node;
  }

  private String key(String lower) {
    boolean reference =
        REFERENCE_NAMES.contains(lower) || (chassisIsReference && lower.equals(CHASSIS));
    return reference ? REFERENCE : lower;
  }
}
