package railwalk.app;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import railwalk.chart.ChartInput;
import railwalk.chart.Column;
import railwalk.chart.WhatIfPages;
import railwalk.circuit.Circuit;
import railwalk.device.Catalogue;
import railwalk.device.TubeType;
import railwalk.diagnosis.NotAFault;
import railwalk.diagnosis.StatedFault;
import railwalk.findings.Finding;
import railwalk.findings.FindingCode;
import railwalk.findings.Findings;
import railwalk.solve.OperatingPoint;
import railwalk.walk.SupplyMap;
import railwalk.walk.Walk;

/** An amplifier with supposed faults in it beside the healthy one. */
public final class WhatIfJob {
  /** What only a slip of the pen would be; an open coil looks like one. */
  private static final String SLIP = FindingCode.REFLECTED_LOAD.code();

  private WhatIfJob() {}

  /**
   * Returns the pages.
   *
   * @param phrases one fault each, all of them present together
   */
  public static BenchPaper of(Path netlist, List<String> phrases, BenchConditions conditions)
      throws CannotDo {
    TracedAmplifier amplifier = TracedAmplifier.under(conditions, netlist);
    Circuit circuit = amplifier.circuit();
    List<StatedFault> faults = faults(phrases, circuit);
    Column healthy = SolvedColumns.first(amplifier);
    Circuit faulted = StatedFault.all(faults, circuit);
    SupplyMap map = Walk.of(faulted);
    OperatingPoint point;
    try {
      point = SolvedColumns.solve("", faulted, map);
    } catch (CannotDo failure) {
      throw new CannotDo("with " + String.join(", ", phrases) + ": " + failure.lines());
    }
    ChartInput input =
        new ChartInput(amplifier.fileName(), List.of(healthy), amplifier.diagnostics());
    List<Finding> danger = rise(healthy.point(), point, map);
    return new BenchPaper(
        new WhatIfPages(input, point, faults, SolvedColumns.placed(danger, amplifier.origins()))
            .chart());
  }

  private static List<StatedFault> faults(List<String> phrases, Circuit circuit) throws CannotDo {
    List<TubeType> types = Catalogue.standard().types();
    SupplyMap map = Walk.of(circuit);
    List<StatedFault> faults = new ArrayList<>();
    try {
      for (String phrase : phrases) {
        faults.addAll(StatedFault.read(phrase, circuit, map, types));
      }
    } catch (NotAFault failure) {
      throw new CannotDo(String.valueOf(failure.getMessage()));
    }
    return faults;
  }

  /** Returns what is found in the faulted amplifier and not in the healthy one. */
  private static List<Finding> rise(OperatingPoint healthy, OperatingPoint faulted, SupplyMap map) {
    Set<String> known = new HashSet<>();
    for (Finding finding : Findings.of(healthy.circuit(), healthy.map(), healthy)) {
      known.add(finding.code() + " " + finding.elementName());
    }
    List<Finding> risen = new ArrayList<>();
    for (Finding finding : Findings.of(faulted.circuit(), map, faulted)) {
      if (!finding.code().equals(SLIP)
          && !known.contains(finding.code() + " " + finding.elementName())) {
        risen.add(finding);
      }
    }
    return risen;
  }
}
