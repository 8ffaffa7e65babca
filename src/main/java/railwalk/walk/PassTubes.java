package railwalk.walk;

import java.util.ArrayDeque;
import java.util.Deque;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Circuit;
import railwalk.circuit.Node;

/**
 * Finds the series tubes of stabilised supplies: sections whose cathode is held by a filter
 * capacitor and feeds plates or screens that no other way leads to.
 */
final class PassTubes {
  /** Smallest capacitor behind a series tube. */
  private static final double FILTER_FARADS = 1e-6;

  private final Circuit circuit;
  private final List<DcBranch> branches;
  private final Grounds grounds;
  private final Electrodes electrodes;

  PassTubes(Circuit circuit, List<DcBranch> branches, Grounds grounds) {
    this.circuit = circuit;
    this.branches = branches;
    this.grounds = grounds;
    this.electrodes = Electrodes.of(circuit);
  }

  /** Returns the first plate-to-cathode way by which the supply goes on from {@code ladder}. */
  Optional<DcBranch> next(Ladder ladder) {
    return branches.stream()
        .filter(branch -> branch.way() == DcBranch.Way.PLATE)
        .filter(branch -> !ladder.conductorsAt(branch.a()).contains(branch))
        .filter(branch -> ladder.reaches(branch.a()) && !ladder.reaches(branch.b()))
        .filter(branch -> !grounds.common(branch.a()) && !grounds.common(branch.b()))
        .filter(branch -> filtered(branch.b()) && feedsOthers(branch.b(), ladder))
        .findFirst();
  }

  private boolean filtered(Node node) {
    return circuit.elements(Capacitor.class).stream()
        .filter(capacitor -> capacitor.nodes().contains(node))
        .anyMatch(c -> c.farads() >= FILTER_FARADS && grounds.bypasses(c, node));
  }

  private boolean feedsOthers(Node cathode, Ladder ladder) {
    Set<Node> seen = new HashSet<>(Set.of(cathode));
    Deque<Node> open = new ArrayDeque<>(seen);
    while (!open.isEmpty()) {
      Node node = open.remove();
      if (electrodes.fedAt(node)) {
        return true;
      }
      for (DcBranch branch : ladder.conductorsAt(node)) {
        Node next = branch.other(node);
        if (!grounds.common(next) && seen.add(next)) {
          open.add(next);
        }
      }
    }
    return false;
  }
}
