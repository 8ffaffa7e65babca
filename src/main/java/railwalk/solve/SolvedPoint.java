package railwalk.solve;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.RegulatorSection;
import railwalk.circuit.Winding;
import railwalk.device.SectionCurrents;
import railwalk.walk.SupplyMap;

/**
 * The operating point that a settled {@link CoupledSolver} holds. What takes a further look over
 * the period (ripple, peaks, source resistances inside a group) is found when first asked for.
 */
final class SolvedPoint implements OperatingPoint {
  /** Up to this ratio of source to meter resistance the straight-line reading is good to 0.01 %. */
  private static final double STRAIGHT_LOADING = 1e-3;

  /** The same at a node that swings with the line, where the meter draws alternating current. */
  private static final double STRAIGHT_SWINGING_LOADING = 3e-5;

  /** A node swings when its ripple is more than this part of its volts; no reservoir does. */
  private static final double SWINGING = 0.2;

  private final CoupledSolver solver;
  private final SupplyMap walk;
  private @Nullable List<CycleReport> reports;
  private double @Nullable [] sourceOhms;
  private @Nullable AcLoads acLoads;

  /**
   * Takes a settled solver.
   *
   * @param walk as it was found; the solver's own may have ripple groups that hold more
   */
  SolvedPoint(CoupledSolver solver, SupplyMap walk) {
    this.solver = solver;
    this.walk = walk;
  }

  CoupledSolver solver() {
    return solver;
  }

  List<CycleReport> reports() {
    synchronized (solver) {
      List<CycleReport> known = reports;
      if (known == null) {
        List<CycleReport> made = new ArrayList<>();
        solver.supplies.forEach(s -> made.add(s.report()));
        reports = made;
        known = made;
      }
      return known;
    }
  }

  @Override
  public Circuit circuit() {
    return solver.circuit();
  }

  @Override
  public SupplyMap map() {
    return walk;
  }

  @Override
  public double volts(Node node) {
    if (node.equals(circuit().reference())) {
      return 0;
    }
    if (map().undefined().contains(node)) {
      return Double.NaN;
    }
    Integer unknown = solver.dc.unknowns.get(node);
    if (unknown != null) {
      return solver.x[unknown];
    }
    Supply supply = solver.supplyOf(node);
    return supply == null ? Double.NaN : supply.meanVolts(node);
  }

  private @Nullable CycleReport reportOf(Node node) {
    return reports().stream()
        .filter(r -> r.net().unknowns.containsKey(node))
        .findFirst()
        .orElse(null);
  }

  private @Nullable CycleReport reportOf(Element element) {
    for (int g = 0; g < solver.supplies.size(); g++) {
      if (solver.supplies.get(g).net.group.elements().contains(element)) {
        return reports().get(g);
      }
    }
    return null;
  }

  @Override
  public double amps(Element element) {
    CycleReport report = reportOf(element);
    if (report != null) {
      return report.meanAmps().getOrDefault(element, 0.0);
    }
    DcNetwork dc = solver.dc;
    double sum = 0;
    boolean found = false;
    for (int i = 0; i < dc.devices.twoPoles.size(); i++) {
      if (dc.devices.twoPoles.get(i).element().equals(element)) {
        sum += dc.devices.twoPoleAmps(i, solver.x);
        found = true;
      }
    }
    if (found) {
      return sum;
    }
    Integer branch = dc.branchOf(element);
    if (branch != null) {
      return solver.x[branch];
    }
    return TwoTerminal.amps(element, java.util.Map.of(), dc.unknowns, solver.x);
  }

  @Override
  public double watts(Element element) {
    CycleReport report = reportOf(element);
    if (report != null && report.watts().containsKey(element)) {
      return report.watts().get(element);
    }
    if (report != null && element instanceof Winding) {
      return Double.NaN;
    }
    List<Node> nodes = element.nodes();
    if (nodes.size() < 2) {
      return 0;
    }
    double amps = amps(element);
    return amps == 0 ? 0 : (volts(nodes.get(0)) - volts(nodes.get(1))) * amps;
  }

  @Override
  public SectionPoint at(AmplifierSection section) {
    DcNetwork dc = solver.dc;
    double cathode = known(section.cathode());
    Node screen = section.screen();
    for (int i = 0; i < dc.devices.amplifiers.size(); i++) {
      if (dc.devices.amplifiers.get(i).section().equals(section)) {
        SectionCurrents currents = dc.devices.section(i, solver.x);
        return new SectionPoint(
            known(section.plate()) - cathode,
            screen == null ? Double.NaN : known(screen) - cathode,
            known(section.grid()) - cathode,
            currents.plateAmps,
            screen == null ? Double.NaN : currents.screenAmps,
            currents.gridAmps);
      }
    }
    throw new IllegalArgumentException(section.name() + " is not in this circuit");
  }

  /** Returns the solver's volts, also where they are not predictable. */
  private double known(Node node) {
    Integer unknown = solver.dc.unknowns.get(node);
    return unknown == null || unknown < 0 ? 0 : solver.x[unknown];
  }

  @Override
  public SectionPoint at(RectifierSection section) {
    double cathode = volts(section.cathode());
    double plates = section.plates().stream().mapToDouble(this::volts).average().orElse(Double.NaN);
    return new SectionPoint(
        plates - cathode, Double.NaN, Double.NaN, amps(section), Double.NaN, Double.NaN);
  }

  @Override
  public SectionPoint at(RegulatorSection section) {
    return new SectionPoint(
        volts(section.anode()) - volts(section.cathode()),
        Double.NaN,
        Double.NaN,
        lit(section.name()) ? amps(section) : 0,
        Double.NaN,
        Double.NaN);
  }

  @Override
  public boolean lit(String elementName) {
    DcNetwork dc = solver.dc;
    for (int i = 0; i < dc.devices.twoPoles.size(); i++) {
      if (dc.devices.twoPoles.get(i).element().name().equalsIgnoreCase(elementName)) {
        return dc.devices.glow(i) != 0;
      }
    }
    return false;
  }

  @Override
  public List<SupplyPoint> supplies() {
    List<SupplyPoint> points = new ArrayList<>();
    for (CycleReport report : reports()) {
      List<Node> outputs = report.net().group.outputs();
      for (int o = 0; o < outputs.size(); o++) {
        Node node = outputs.get(o);
        points.add(
            new SupplyPoint(
                node,
                report.outputMeanAmps()[o],
                report.outputPeakAmps()[o],
                report.rippleRmsVolts()[report.net().at(node)]));
      }
    }
    return points;
  }

  @Override
  public Optional<Double> rippleVoltsRms(Node node) {
    CycleReport report = reportOf(node);
    if (report == null) {
      return RippleBehind.rippleVoltsRms(this, node);
    }
    return report.net().at(node) < 0
        ? Optional.empty()
        : Optional.of(report.rippleRmsVolts()[report.net().at(node)]);
  }

  @Override
  public AcLoads acLoads() {
    synchronized (solver) {
      if (acLoads == null) {
        acLoads = AcLoads.of(this, reports());
      }
      return acLoads;
    }
  }

  @Override
  public AcLoads.Range range(Node node) {
    return AcLoads.range(node, volts(node), reports());
  }

  @Override
  public double sourceOhms(Node node) {
    synchronized (solver) {
      double[] known = sourceOhms;
      if (known == null) {
        known = new double[circuit().nodes().size()];
        Arrays.fill(known, Double.NaN);
        SparseLu lu = solver.factored();
        for (int n = 0; n < solver.dc.nodeCount; n++) {
          Node dcNode = solver.dc.nodes.get(n);
          if (!map().undefined().contains(dcNode)) {
            double[] response = new double[solver.dc.size];
            response[n] = 1;
            lu.solve(response, response);
            known[dcNode.index()] = response[n];
          }
        }
        known[circuit().reference().index()] = 0;
        sourceOhms = known;
      }
      if (Double.isNaN(known[node.index()])) {
        known[node.index()] = sourceOhmsInGroup(node);
      }
      return known[node.index()];
    }
  }

  @Override
  public double sourceOhms(Node a, Node b) {
    Integer from = solver.dc.unknowns.get(a);
    Integer to = solver.dc.unknowns.get(b);
    if (from == null
        || to == null
        || map().undefined().contains(a)
        || map().undefined().contains(b)) {
      return Double.NaN;
    }
    synchronized (solver) {
      double[] response = new double[solver.dc.size];
      if (from >= 0) {
        response[from] = 1;
      }
      if (to >= 0) {
        response[to] -= 1;
      }
      solver.factored().solve(response, response);
      return DcNetwork.at(response, from) - DcNetwork.at(response, to);
    }
  }

  private double sourceOhmsInGroup(Node node) {
    if (map().undefined().contains(node)) {
      return Double.NaN;
    }
    SparseLu lu = solver.factored();
    double[] response = new double[solver.dc.size];
    CycleReport report = reportOf(node);
    if (report == null) {
      return Double.NaN;
    }
    int inner = report.net().at(node);
    List<DcNetwork.Port> ports = portsOf(report);
    for (DcNetwork.Port port : ports) {
      response[port.branch()] = report.voltsByDrawn()[portNode(report, port)][inner];
    }
    lu.solve(response, response);
    double volts = report.voltsByDrawn()[inner][inner];
    for (DcNetwork.Port port : ports) {
      volts += report.voltsByDrawn()[inner][portNode(report, port)] * response[port.branch()];
    }
    return -volts;
  }

  /** Returns the DC network's ports of a group. */
  List<DcNetwork.Port> portsOf(CycleReport report) {
    return solver.dc.ports.stream()
        .filter(p -> solver.supplies.get(p.group()).net == report.net())
        .toList();
  }

  /** Returns a port's node as an unknown of its group. */
  static int portNode(CycleReport report, DcNetwork.Port port) {
    return report.net().at(report.net().group.ports().get(port.number()));
  }

  @Override
  public double meterVolts(Node node, double meterOhms) {
    double volts = volts(node);
    double source = sourceOhms(node);
    if (Double.isNaN(volts) || node.equals(circuit().reference())) {
      return volts;
    }
    Integer unknown = solver.dc.unknowns.get(node);
    double ratio = source / meterOhms;
    if (ratio < STRAIGHT_SWINGING_LOADING || (ratio < STRAIGHT_LOADING && !swings(node, volts))) {
      return volts / (1 + source / meterOhms);
    }
    if (unknown == null) {
      return withMeter(node, meterOhms);
    }
    synchronized (solver) {
      return solver.loadedVolts(unknown, meterOhms);
    }
  }

  private boolean swings(Node node, double volts) {
    return solver.supplyOf(node) != null
        && rippleVoltsRms(node).filter(rms -> rms > SWINGING * Math.abs(volts)).isPresent();
  }

  /** Settles the supply again with the meter in: needed where it draws alternating current too. */
  private double withMeter(Node node, double meterOhms) {
    CoupledSolver again = new CoupledSolver(circuit(), solver.map(), false);
    again.startFrom(solver);
    Supply supply = again.supplyOf(node);
    if (supply == null) {
      return Double.NaN;
    }
    supply.connectMeter(node, 1 / meterOhms);
    return again.settle() ? supply.meanVolts(node) : Double.NaN;
  }

  @Override
  public List<String> trace() {
    return solver.trace().lines();
  }
}
