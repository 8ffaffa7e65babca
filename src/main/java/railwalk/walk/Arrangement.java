package railwalk.walk;

import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.stream.Collectors;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Circuit;
import railwalk.circuit.Diode;
import railwalk.circuit.Element;
import railwalk.circuit.Filament;
import railwalk.circuit.Inductor;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.Winding;

/**
 * What a rectifier arrangement is called, told from its parts. The name is for people only: the
 * solver treats all arrangements alike.
 */
final class Arrangement {
  private static final String HALF_WAVE = "half-wave";
  private static final String DOUBLER = "voltage doubler";

  private Arrangement() {}

  /** Returns the arrangement of the parts that feed {@code outputs}, one phrase for each output. */
  static List<String> of(Circuit circuit, List<Element> alternating, List<Node> outputs) {
    return outputs.stream().map(n -> name(circuit, alternating, n)).toList();
  }

  /** Returns whether an output so arranged is charged once in a period of the line, not twice. */
  static boolean chargesOnce(String arrangement) {
    return arrangement.startsWith(HALF_WAVE) || arrangement.startsWith(DOUBLER);
  }

  private record Path(Node anode, Node cathode) {}

  private static String name(Circuit circuit, List<Element> alternating, Node output) {
    List<Path> paths =
        alternating.stream()
            .flatMap(
                e ->
                    e instanceof Diode d
                        ? List.of(new Path(d.anode(), d.cathode())).stream()
                        : e instanceof RectifierSection s
                            ? s.plates().stream().map(p -> new Path(p, s.cathode()))
                            : List.<Path>of().stream())
            .toList();
    Set<Node> rectified = new HashSet<>();
    paths.forEach(path -> rectified.addAll(List.of(path.anode, path.cathode)));
    addFilaments(alternating, rectified);
    Set<Node> here = new HashSet<>(Set.of(output));
    boolean choke = false;
    for (Element e : alternating) {
      boolean passes = !(e instanceof Capacitor || e instanceof Diode || e instanceof Winding);
      if (passes && !(e instanceof RectifierSection) && e.nodes().contains(output)) {
        boolean meetsRectifier =
            e.nodes().stream()
                .filter(n -> !n.equals(output) && !n.equals(circuit.reference()))
                .anyMatch(rectified::contains);
        if (meetsRectifier) {
          here.addAll(e.nodes());
          choke |= e instanceof Inductor;
        }
      }
    }
    addFilaments(alternating, here);
    here.remove(circuit.reference());
    List<Path> in = paths.stream().filter(p -> here.contains(p.cathode)).toList();
    List<Path> out = paths.stream().filter(p -> here.contains(p.anode)).toList();
    List<Path> feeding = in.isEmpty() ? out : in;
    boolean negative = in.isEmpty() && !out.isEmpty();
    Set<Node> driven =
        feeding.stream().map(p -> negative ? p.cathode : p.anode).collect(Collectors.toSet());
    long returned =
        paths.stream()
            .filter(p -> !feeding.contains(p))
            .filter(p -> driven.contains(negative ? p.anode : p.cathode))
            .map(p -> negative ? p.anode : p.cathode)
            .distinct()
            .count();
    String kind;
    if (driven.size() >= 2) {
      kind = returned >= 2 ? "bridge" : "full-wave, centre tap";
    } else {
      kind = returned >= 1 ? DOUBLER : HALF_WAVE;
    }
    return kind + (choke ? ", choke input" : "") + (negative ? ", negative" : "");
  }

  /** Adds the other ends of rectifiers' filaments to the nodes that hold one end. */
  private static void addFilaments(List<Element> alternating, Set<Node> nodes) {
    Set<String> rectifiers = new HashSet<>();
    for (Element element : alternating) {
      if (element instanceof RectifierSection section) {
        rectifiers.add(section.bottle());
      }
    }
    boolean grown = true;
    while (grown) {
      grown = false;
      for (Element element : alternating) {
        if (element instanceof Filament filament
            && rectifiers.contains(filament.bottle())
            && filament.nodes().stream().anyMatch(nodes::contains)) {
          grown |= nodes.addAll(filament.nodes());
        }
      }
    }
  }
}
