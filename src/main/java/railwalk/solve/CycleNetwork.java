package railwalk.solve;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Circuit;
import railwalk.circuit.Diode;
import railwalk.circuit.Element;
import railwalk.circuit.Inductor;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.Winding;
import railwalk.device.TwoPoleLaw;
import railwalk.walk.RippleGroup;
import railwalk.walk.RippleGroups;

/**
 * The equations of one {@link RippleGroup} at an instant: unknowns are node volts, then the
 * currents of windings, chokes and parts without resistance. Linear parts are in {@link #matrix};
 * rectifying paths, states (capacitor volts, choke currents) and alternating sources stand beside
 * it for {@link CycleSweep} to add.
 *
 * <p>The pattern is made once; {@link #load} writes the values of a group of the same topology.
 */
final class CycleNetwork {
  /** One rectifying path between two unknowns; {@code entry} is its first of four places. */
  record Path(int anode, int cathode, TwoPoleLaw law, Element element, int[] places) {
    /** Adds a conductance along the path. */
    void add(double siemens, double[] values) {
      values[places[0]] += siemens;
      values[places[1]] -= siemens;
      values[places[2]] -= siemens;
      values[places[3]] += siemens;
    }
  }

  /** Where the slope of the current drawn at one port by the volts of another one goes. */
  record Slope(int drawn, int by, int place) {}

  /** Leak of a rectifier that is off: 1000 megohms, which ties a floating winding. */
  static final double LEAK_SIEMENS = 1e-9;

  /** Ties what nothing else ties. */
  private static final double TIE_SIEMENS = 1e-13;

  final double hertz;
  final Map<Node, Integer> unknowns = new HashMap<>();
  final int nodeCount;
  final int size;
  final SparseMatrix matrix;
  final double[] constant;
  final List<Path> paths = new ArrayList<>();
  final int[] diagonal;
  final List<Slope> slopes = new ArrayList<>();
  RippleGroup group;
  double[] source;
  List<Stores.Store> stores;
  List<Windings.Emf> emfs;
  Map<Element, Integer> branches;
  private final Stamps stamps = new Stamps();
  private Windings windings;

  CycleNetwork(Circuit circuit, RippleGroup group) {
    this.group = group;
    this.hertz = circuit.line().hertz();
    int next = 0;
    for (Node node : group.nodes()) {
      unknowns.put(node, node.equals(circuit.reference()) ? -1 : next++);
    }
    nodeCount = next;
    CycleStamper stamper = stamp(circuit, group);
    size = stamps.size();
    matrix = new SparseMatrix(stamps);
    diagonal = matrix.places(stamper.firstDiagonal, nodeCount);
    constant = matrix.newValues();
    windings = stamper.windings;
    emfs = windings.emfs();
    branches = stamper.branches();
    source = stamps.rightHandSide();
    stores = List.of();
    take(stamper);
  }

  /** Writes all equations: parts, ties, then the slopes of what the ports draw. */
  private CycleStamper stamp(Circuit circuit, RippleGroup of) {
    stamps.start(nodeCount);
    CycleStamper stamper = new CycleStamper(circuit, stamps);
    of.elements().forEach(e -> e.accept(stamper));
    stamper.windings.coupleThroughPrimaries(stamper.stores);
    stamper.firstDiagonal = stamps.count();
    for (int n = 0; n < nodeCount; n++) {
      stamps.entry(n, n, TIE_SIEMENS);
    }
    for (Node drawn : of.ports()) {
      for (Node by : of.ports()) {
        if (!drawn.equals(by)) {
          stamper.slopes.add(new Slope(at(drawn), at(by), stamps.entry(at(drawn), at(by), 0)));
        }
      }
    }
    return stamper;
  }

  private void take(CycleStamper stamper) {
    matrix.load(stamps, constant);
    source = stamps.rightHandSide();
    windings = stamper.windings;
    emfs = windings.emfs();
    branches = stamper.branches();
    slopes.clear();
    for (Slope s : stamper.slopes) {
      slopes.add(new Slope(s.drawn, s.by, matrix.place(s.place)));
    }
    paths.clear();
    for (PathDraft d : stamper.pathDrafts) {
      paths.add(new Path(d.anode, d.cathode, d.law, d.element, matrix.places(d.entry, 4)));
    }
    stores = stamper.stores.placed(matrix);
  }

  /**
   * Writes the values of a group of the same topology. Returns false, and writes none, when one
   * asks for equations of another shape.
   */
  boolean load(Circuit circuit, RippleGroup changed) {
    CycleStamper stamper = stamp(circuit, changed);
    boolean fits = circuit.line().hertz() == hertz && matrix.fits(stamps);
    if (fits) {
      group = changed;
      take(stamper);
    }
    return fits;
  }

  /** Returns the unknown of a node's volts; −1 for the reference. */
  int at(Node node) {
    return unknowns.getOrDefault(node, -1);
  }

  /** Returns the unknown of the current through a section of a winding. */
  int sectionBranch(Winding.Section section) {
    return windings.branch(section);
  }

  private record PathDraft(int anode, int cathode, TwoPoleLaw law, Element element, int entry) {}

  private final class CycleStamper extends LinearStamper {
    private final Windings windings;
    private final List<PathDraft> pathDrafts = new ArrayList<>();
    private final List<Slope> slopes = new ArrayList<>();
    private int firstDiagonal;
    private final Stores stores = new Stores(this);

    CycleStamper(Circuit circuit, Stamps stamps) {
      super(stamps, unknowns);
      windings = new Windings(circuit, this);
    }

    @Override
    public Void visit(Capacitor capacitor) {
      stores.stamp(capacitor);
      return null;
    }

    @Override
    public Void visit(Inductor inductor) {
      double henries = inductor.henries();
      stores.stamp(inductor, Double.isNaN(henries) ? RippleGroups.USUAL_CHOKE_HENRIES : henries);
      return null;
    }

    @Override
    public Void visit(Winding winding) {
      windings.stamp(winding);
      return null;
    }

    @Override
    public Void visit(Diode diode) {
      path(diode.anode(), diode.cathode(), diode.law(), diode);
      return null;
    }

    @Override
    public Void visit(RectifierSection section) {
      section.plates().forEach(p -> path(p, section.cathode(), section.law(), section));
      return null;
    }

    private void path(Node anode, Node cathode, TwoPoleLaw law, Element element) {
      int a = at(anode);
      int c = at(cathode);
      pathDrafts.add(new PathDraft(a, c, law, element, stamps.conductance(a, c, LEAK_SIEMENS)));
    }
  }
}
