package railwalk.netlist;

import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import railwalk.circuit.Node;

/**
 * Where a line is read: in the netlist itself or in one use of a sub-circuit.
 *
 * @param prefix empty, or the path of uses such as "X1" or "X1.X2"
 * @param ports the sub-circuit's nodes, lower case, and what they are connected to
 * @param scope the parameters that hold here
 * @param plainNames names, upper case, of the lines here that are neither X lines nor tubes
 * @param open the sub-circuits that are being expanded, lower case, outermost first
 */
record Frame(
    String prefix,
    Map<String, Node> ports,
    Scope scope,
    Set<String> plainNames,
    List<String> open) {

  /** Returns the name of a part here: {@code R3} or {@code X1.R3}, in upper case. */
  String part(String name) {
    String upper = name.toUpperCase(Locale.ROOT);
    return prefix.isEmpty() ? upper : prefix + "." + upper;
  }

  /** Returns the name of a node here: {@code n} or {@code X1:n}. */
  String node(String name) {
    return prefix.isEmpty() ? name : prefix + ":" + name;
  }
}
