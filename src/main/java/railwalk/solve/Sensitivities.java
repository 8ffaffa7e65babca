package railwalk.solve;

import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Element;
import railwalk.circuit.GlowLamp;
import railwalk.circuit.Node;
import railwalk.circuit.Potentiometer;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.RegulatorSection;
import railwalk.circuit.Resistor;
import railwalk.circuit.VoltageSource;
import railwalk.circuit.Winding;
import railwalk.device.GasLaw;
import railwalk.device.SectionCurrents;

/**
 * How every node's volts follow every part's value, to first order, supplies included.
 *
 * <p>With the settled equations F(x, p) = 0 a node's volts change by −λᵀ · ∂F/∂p, where λ solves
 * the adjoint system (∂F/∂x)ᵀ · λ = eₙ: one solve a node serves all parts (S. W. Director and R. A.
 * Rohrer, "The generalized adjoint network and network sensitivities", IEEE Trans. Circuit Theory
 * 16 (1969)). What lies inside a ripple group enters by the group's own derivatives.
 */
public final class Sensitivities {
  private final List<SpreadPart> parts;
  private final double[][] voltsByShare;

  private Sensitivities(List<SpreadPart> parts, double[][] voltsByShare) {
    this.parts = List.copyOf(parts);
    this.voltsByShare = voltsByShare;
  }

  /** Returns the sensitivities of a solved point. */
  public static Sensitivities of(OperatingPoint point) {
    return new Builder((SolvedPoint) point).build();
  }

  /** Returns the parts in netlist order. */
  public List<SpreadPart> parts() {
    return parts;
  }

  /**
   * Returns the change of a node's volts for a relative change of part {@code part} of {@link
   * #parts()}: volt per 1 (per 100 %); 0 for nodes without a DC path.
   */
  public double volts(Node node, int part) {
    return voltsByShare[node.index()][part];
  }

  /** The derivatives of the equations by one part: rows and amounts, and what the groups add. */
  private record Source(int[] rows, double[] amounts, @Nullable Element inGroup) {}

  private static final class Builder {
    private final SolvedPoint point;
    private final CoupledSolver solver;
    private final DcNetwork dc;
    private final List<SpreadPart> parts = new ArrayList<>();
    private final List<Source> sources = new ArrayList<>();

    Builder(SolvedPoint point) {
      this.point = point;
      this.solver = point.solver();
      this.dc = solver.dc;
    }

    Sensitivities build() {
      for (CycleReport report : point.reports()) {
        for (Element element : report.net().group.elements()) {
          if (report.voltsByShare().containsKey(element)) {
            add(partOf(element), new Source(new int[0], new double[0], element));
          }
        }
      }
      for (Element element : dc.elements) {
        addDcPart(element);
      }
      double[][] volts = new double[solver.circuit().nodes().size()][parts.size()];
      SparseLu lu = solver.factored();
      for (Node node : solver.circuit().nodes()) {
        if (!node.equals(solver.circuit().reference()) && !Double.isNaN(point.volts(node))) {
          fill(node, lu, volts[node.index()]);
        }
      }
      return new Sensitivities(parts, volts);
    }

    private void add(SpreadPart part, Source source) {
      parts.add(part);
      sources.add(source);
    }

    private static SpreadPart partOf(Element element) {
      if (element instanceof Winding winding) {
        return new SpreadPart.WindingVolts(winding);
      }
      return element instanceof RectifierSection rectifier
          ? new SpreadPart.Emission(rectifier)
          : new SpreadPart.Ohms(element);
    }

    private void addDcPart(Element element) {
      double[] x = solver.x;
      Integer branch = dc.branchOf(element);
      if (element instanceof Resistor r) {
        if (branch != null) {
          add(new SpreadPart.Ohms(r), one(branch, -r.ohms() * x[branch]));
        } else {
          add(new SpreadPart.Ohms(r), through(r.a(), r.b(), -point.amps(r)));
        }
      } else if (element instanceof Potentiometer p) {
        double upper =
            -volts(p.a(), p.wiper())
                / Math.max((1 - p.share()) * p.ohms(), LinearStamper.BRANCH_OHMS);
        double lower =
            -volts(p.wiper(), p.b()) / Math.max(p.share() * p.ohms(), LinearStamper.BRANCH_OHMS);
        add(
            new SpreadPart.Ohms(p),
            new Source(
                new int[] {at(p.a()), at(p.wiper()), at(p.b())},
                new double[] {upper, lower - upper, -lower},
                null));
      } else if (element instanceof VoltageSource v && branch != null) {
        add(new SpreadPart.SourceVolts(v), one(branch, -v.volts()));
      } else if (element instanceof RegulatorSection r && point.lit(r.name())) {
        add(new SpreadPart.GlowVolts(r), glow(r.anode(), r.cathode(), r.law()));
      } else if (element instanceof GlowLamp g && point.lit(g.name())) {
        add(new SpreadPart.GlowVolts(g), glow(g.a(), g.b(), g.law()));
      }
      for (int i = 0; i < dc.devices.amplifiers.size(); i++) {
        Devices.Amplifier tube = dc.devices.amplifiers.get(i);
        if (tube.section().equals(element)) {
          SectionCurrents c = dc.devices.section(i, x);
          add(
              new SpreadPart.SpaceCurrent(tube.section()),
              new Source(
                  new int[] {tube.plate(), tube.screen(), tube.cathode()},
                  new double[] {c.plateAmps, c.screenAmps, -c.plateAmps - c.screenAmps},
                  null));
        }
      }
    }

    private Source glow(Node anode, Node cathode, GasLaw law) {
      double sense = volts(anode, cathode) < 0 ? -1 : 1;
      return through(anode, cathode, -sense * law.operatingVolts() / law.slopeOhms());
    }

    private Source one(int row, double amount) {
      return new Source(new int[] {row}, new double[] {amount}, null);
    }

    private Source through(Node a, Node b, double amps) {
      return new Source(new int[] {at(a), at(b)}, new double[] {amps, -amps}, null);
    }

    private int at(Node node) {
      return dc.unknowns.getOrDefault(node, -1);
    }

    private double volts(Node a, Node b) {
      return DcNetwork.at(solver.x, at(a)) - DcNetwork.at(solver.x, at(b));
    }

    private void fill(Node node, SparseLu lu, double[] row) {
      double[] adjoint = new double[dc.size];
      Integer unknown = dc.unknowns.get(node);
      CycleReport inside = unknown == null ? groupOf(node) : null;
      if (unknown != null) {
        adjoint[unknown] = 1;
      } else if (inside != null) {
        for (DcNetwork.Port port : point.portsOf(inside)) {
          adjoint[port.branch()] =
              inside.voltsByDrawn()[inside.net().at(node)][SolvedPoint.portNode(inside, port)];
        }
      } else {
        return;
      }
      lu.solveTransposed(adjoint, adjoint);
      for (int p = 0; p < parts.size(); p++) {
        Source source = sources.get(p);
        double sum = 0;
        for (int i = 0; i < source.rows.length; i++) {
          sum -= DcNetwork.at(adjoint, source.rows[i]) * source.amounts[i];
        }
        if (source.inGroup != null) {
          sum += throughGroup(source.inGroup, adjoint, inside, node);
        }
        row[p] = sum;
      }
    }

    /** A part inside a group moves the open-circuit volts of its ports, and the node if inside. */
    private double throughGroup(
        Element element, double[] adjoint, @Nullable CycleReport inside, Node node) {
      double sum = 0;
      for (CycleReport report : point.reports()) {
        double[] byShare = report.voltsByShare().get(element);
        if (byShare == null) {
          continue;
        }
        for (DcNetwork.Port port : point.portsOf(report)) {
          sum += adjoint[port.branch()] * byShare[SolvedPoint.portNode(report, port)];
        }
        if (inside != null && report.net().unknowns.containsKey(node)) {
          sum += byShare[report.net().at(node)];
        }
      }
      return sum;
    }

    private @Nullable CycleReport groupOf(Node node) {
      return point.reports().stream()
          .filter(r -> r.net().unknowns.containsKey(node))
          .findFirst()
          .orElse(null);
    }
  }
}
