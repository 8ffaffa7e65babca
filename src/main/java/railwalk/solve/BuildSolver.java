package railwalk.solve;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.walk.RippleGroup;
import railwalk.walk.SupplyMap;

/**
 * Solves builds of one amplifier after each other, thousands of them: same wiring, other values.
 * All are written into one set of equations, whose order of elimination stays, and each starts from
 * the nominal amplifier's solution and derivatives, so that the answer does not depend on the
 * builds before. Rails come out within a few millivolts.
 */
public final class BuildSolver {
  private final SolvedPoint nominal;
  private final CoupledSolver settled;
  private final CoupledSolver solver;
  private final NearbySolver oneByOne;
  private final List<GroupPlaces> groups = new ArrayList<>();

  /** Where the parts of a ripple group stand in the circuit's list. */
  private record GroupPlaces(int[] elements, int[] feeders) {}

  /** Starts from {@code nominal}, as {@link OperatingPointSolver} returned it. */
  public BuildSolver(OperatingPoint nominal) {
    this.nominal = (SolvedPoint) nominal;
    settled = this.nominal.solver();
    solver = new CoupledSolver(nominal.circuit(), settled.map(), false);
    oneByOne = new NearbySolver(nominal);
    Map<Element, Integer> places = new HashMap<>();
    List<Element> elements = nominal.circuit().elements();
    for (int i = 0; i < elements.size(); i++) {
      places.put(elements.get(i), i);
    }
    for (RippleGroup group : settled.map().groups()) {
      groups.add(new GroupPlaces(of(group.elements(), places), of(group.feeders(), places)));
    }
  }

  private static int[] of(List<Element> elements, Map<Element, Integer> places) {
    return elements.stream().mapToInt(e -> places.getOrDefault(e, -1)).toArray();
  }

  /**
   * Returns the operating point of a build, which holds until the next one is solved; empty when it
   * does not settle.
   *
   * @param build the nominal circuit with other values: the same parts in the same order
   */
  public Optional<OperatingPoint> solve(Circuit build) {
    SupplyMap map = mapOf(build.elements());
    if (solver.load(build, map)) {
      solver.startFrom(settled);
      if (solver.settle(CoupledSolver.Accuracy.SAMPLED)) {
        return Optional.of(new SolvedPoint(solver, nominal.map()));
      }
    }
    return oneByOne.solve(build);
  }

  private SupplyMap mapOf(List<Element> elements) {
    SupplyMap map = settled.map();
    List<RippleGroup> changed = new ArrayList<>(groups.size());
    for (int g = 0; g < groups.size(); g++) {
      RippleGroup group = map.groups().get(g);
      changed.add(
          new RippleGroup(
              group.arrangements(),
              at(groups.get(g).elements, elements),
              group.nodes(),
              group.ports(),
              group.outputs(),
              at(groups.get(g).feeders, elements)));
    }
    return map.withGroups(changed);
  }

  private static List<Element> at(int[] places, List<Element> elements) {
    List<Element> found = new ArrayList<>(places.length);
    for (int place : places) {
      found.add(elements.get(place));
    }
    return found;
  }
}
