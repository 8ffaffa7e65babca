package railwalk.solve;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import railwalk.circuit.Element;
import railwalk.circuit.Filament;
import railwalk.circuit.Node;
import railwalk.circuit.Winding;

/**
 * What windings, rectifiers and filaments of a ripple group stand over its settled period, gathered
 * stage by stage.
 */
final class CycleLoads implements CycleSweep.Observer {
  private final CycleNetwork net;
  private final List<Section> sections = new ArrayList<>();
  private final List<Filament> filaments = new ArrayList<>();
  private final double[] sectionSquares;
  private final double[] ampSquares;
  private final double[] coreSquares;
  private final double[] peakAmps;
  private final double[] filamentSquares;
  private final double[] pathMeans;
  private final double[] pathPeaks;
  private final double[] pathInverse;
  private final double[] lowest;
  private final double[] highest;

  /** A section of a winding and where its unknowns stand. */
  private record Section(Winding winding, int number, int a, int b, int branch, double ohms) {}

  CycleLoads(CycleNetwork net) {
    this.net = net;
    for (Element element : net.group.elements()) {
      if (element instanceof Winding winding) {
        for (int s = 0; s < winding.sections().size(); s++) {
          Winding.Section section = winding.sections().get(s);
          sections.add(
              new Section(
                  winding,
                  s,
                  net.at(section.a()),
                  net.at(section.b()),
                  net.sectionBranch(section),
                  Windings.ohms(winding, section)));
        }
      } else if (element instanceof Filament filament) {
        filaments.add(filament);
      }
    }
    sectionSquares = new double[sections.size()];
    ampSquares = new double[sections.size()];
    coreSquares = new double[sections.size()];
    peakAmps = new double[sections.size()];
    filamentSquares = new double[filaments.size()];
    pathMeans = new double[net.paths.size()];
    pathPeaks = new double[net.paths.size()];
    pathInverse = new double[net.paths.size()];
    lowest = new double[net.nodeCount];
    highest = new double[net.nodeCount];
    Arrays.fill(lowest, Double.POSITIVE_INFINITY);
    Arrays.fill(highest, Double.NEGATIVE_INFINITY);
  }

  @Override
  public void stage(double share, double[] x, double[] pathAmps, double[] pathVolts) {
    for (int s = 0; s < sectionSquares.length; s++) {
      Section section = sections.get(s);
      double volts = DcNetwork.at(x, section.a) - DcNetwork.at(x, section.b);
      double amps = x[section.branch];
      double core = volts - section.ohms * amps;
      sectionSquares[s] += share * volts * volts;
      ampSquares[s] += share * amps * amps;
      coreSquares[s] += share * core * core;
      peakAmps[s] = Math.max(peakAmps[s], Math.abs(amps));
    }
    for (int f = 0; f < filamentSquares.length; f++) {
      Filament filament = filaments.get(f);
      double volts = DcNetwork.at(x, net.at(filament.a())) - DcNetwork.at(x, net.at(filament.b()));
      filamentSquares[f] += share * volts * volts;
    }
    for (int p = 0; p < pathAmps.length; p++) {
      pathMeans[p] += share * pathAmps[p];
      pathPeaks[p] = Math.max(pathPeaks[p], pathAmps[p]);
      pathInverse[p] = Math.max(pathInverse[p], -pathVolts[p]);
    }
    for (int n = 0; n < lowest.length; n++) {
      lowest[n] = Math.min(lowest[n], x[n]);
      highest[n] = Math.max(highest[n], x[n]);
    }
  }

  /** Returns what each section of the group's windings gives and carries. */
  List<WindingLoad> windings() {
    List<WindingLoad> loads = new ArrayList<>();
    for (int s = 0; s < sectionSquares.length; s++) {
      loads.add(
          new WindingLoad(
              sections.get(s).winding,
              sections.get(s).number,
              Math.sqrt(sectionSquares[s]),
              Math.sqrt(ampSquares[s]),
              peakAmps[s]));
    }
    return loads;
  }

  /** Returns what each rectifying path stands, plates in order. */
  List<RectifierLoad> rectifiers() {
    List<RectifierLoad> loads = new ArrayList<>();
    Map<Element, Integer> plates = new HashMap<>();
    for (int p = 0; p < pathMeans.length; p++) {
      Element element = net.paths.get(p).element();
      int plate = plates.merge(element, 1, Integer::sum) - 1;
      loads.add(new RectifierLoad(element, plate, pathMeans[p], pathPeaks[p], pathInverse[p]));
    }
    return loads;
  }

  /** Puts the volts rms across each of the group's filaments into {@code target}. */
  void addFilaments(Map<Filament, Double> target) {
    for (int f = 0; f < filamentSquares.length; f++) {
      target.put(filaments.get(f), Math.sqrt(filamentSquares[f]));
    }
  }

  /**
   * Puts what each transformer's core gives, as a share of the open volts as written, into {@code
   * target}.
   */
  void addCores(Map<String, Double> target) {
    for (int s = 0; s < coreSquares.length; s++) {
      Winding winding = sections.get(s).winding;
      double open = winding.sections().get(sections.get(s).number).openRmsVolts();
      if (!winding.transformer().isEmpty() && open > 0) {
        target.putIfAbsent(winding.transformer(), Math.sqrt(coreSquares[s]) / open);
      }
    }
  }

  /** Returns whether the group holds {@code node}, the reference left out. */
  boolean holds(Node node) {
    return net.at(node) >= 0;
  }

  /** Returns the lowest volts of {@code node} at any instant; 0 at the reference. */
  double lowestVolts(Node node) {
    return net.at(node) < 0 ? 0 : lowest[net.at(node)];
  }

  /** Returns the highest volts of {@code node} at any instant; 0 at the reference. */
  double highestVolts(Node node) {
    return net.at(node) < 0 ? 0 : highest[net.at(node)];
  }
}
