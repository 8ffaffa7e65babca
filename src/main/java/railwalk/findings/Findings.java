package railwalk.findings;

import java.util.Comparator;
import java.util.List;
import java.util.function.Function;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Circuit;
import railwalk.solve.OperatingPoint;
import railwalk.walk.DcPaths;
import railwalk.walk.SupplyMap;

/** The door: circuit, walk and operating point in, findings out. */
public final class Findings {
  private static final List<Function<Scene, Stream<Finding>>> WIRING =
      List.of(
          HotChassis::check,
          LineCapacitors::check,
          RectifierWiring::check,
          TubeWiring::check,
          CapacitorWiring::check,
          Unpredictable::check);

  private static final List<Function<Solved, Stream<Finding>>> LOADS =
      List.of(
          PartLoads::check,
          RectifierLoads::check,
          TubeLoads::check,
          GridLoads::check,
          GasTubes::check,
          SupplyParts::check);

  private Findings() {}

  /**
   * Returns the findings, what can hurt people first, then in the order of {@link FindingCode} and
   * of the netlist.
   *
   * @param point null when there is none: then only what the wiring shows is told
   */
  public static List<Finding> of(Circuit circuit, SupplyMap map, @Nullable OperatingPoint point) {
    return of(circuit, map, point, null);
  }

  /**
   * Returns the findings, in the same order.
   *
   * @param point null when there is none: then only what the wiring shows is told
   * @param unloaded the amplifier on a high line before its tubes warm up; null to leave out what
   *     it would show
   */
  public static List<Finding> of(
      Circuit circuit,
      SupplyMap map,
      @Nullable OperatingPoint point,
      @Nullable OperatingPoint unloaded) {
    Scene scene =
        new Scene(circuit, map, point, circuit.elementsByNode(), new DcPaths(map, circuit));
    Stream<Finding> wiring = WIRING.stream().flatMap(check -> check.apply(scene));
    Stream<Finding> loads =
        point == null
            ? Stream.empty()
            : LOADS.stream().flatMap(check -> check.apply(new Solved(scene, point, unloaded)));
    return Stream.concat(wiring, loads).sorted(Comparator.comparing(Findings::rank)).toList();
  }

  private static int rank(Finding finding) {
    return Stream.of(FindingCode.values())
        .filter(code -> code.code().equals(finding.code()))
        .mapToInt(Enum::ordinal)
        .findFirst()
        .orElseThrow();
  }
}
