package railwalk.solve;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Circuit;
import railwalk.circuit.Diode;
import railwalk.circuit.Element;
import railwalk.circuit.Inductor;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.Transformer;
import railwalk.circuit.Winding;
import railwalk.device.TwoPoleLaw;
import railwalk.walk.RippleGroup;
import railwalk.walk.RippleGroups;

/**
 * The equations of one {@link RippleGroup} at an instant: unknowns are node volts, then the
 * currents of windings, chokes and parts without resistance. Linear parts are in {@link #matrix};
 * rectifying paths, states (capacitor volts, choke currents) and alternating sources stand beside
 * it for {@link CycleSweep} to add.
 */
final class CycleNetwork {
  /** One rectifying path between two unknowns; {@code entry} is its first of four places. */
  record Path(int anode, int cathode, TwoPoleLaw law, Element element, int[] places) {}

  /** A capacitor (volts across it are the state) or, with a branch, a choke (its current is). */
  record Store(int a, int b, int branch, double size, int[] places) {
    boolean isChoke() {
      return branch >= 0;
    }
  }

  /** An alternating source in the equation of a winding section's current. */
  record Emf(int branch, double peakVolts, Winding winding) {}

  /** Resistance of a high-voltage winding for which none is given, per volt (common practice). */
  private static final double USUAL_OHMS_PER_OPEN_VOLT = 0.3;

  /** The same for heater windings, up to 30 V. */
  private static final double USUAL_HEATER_OHMS_PER_OPEN_VOLT = 0.005;

  /** Leak of a rectifier that is off: 1000 megohms, which ties a floating winding. */
  static final double LEAK_SIEMENS = 1e-9;

  /** Ties what nothing else ties. */
  private static final double TIE_SIEMENS = 1e-13;

  final RippleGroup group;
  final double hertz;
  final Map<Node, Integer> unknowns = new HashMap<>();
  final int nodeCount;
  final int size;
  final SparseMatrix matrix;
  final double[] constant;
  final double[] source;
  final List<Path> paths = new ArrayList<>();
  final List<Store> stores = new ArrayList<>();
  final List<Emf> emfs = new ArrayList<>();
  final int[] diagonal;
  final Map<Element, Integer> branches;
  private final IdentityHashMap<Winding.Section, Integer> sectionBranches = new IdentityHashMap<>();

  CycleNetwork(Circuit circuit, RippleGroup group) {
    this.group = group;
    this.hertz = circuit.line().hertz();
    int next = 0;
    for (Node node : group.nodes()) {
      unknowns.put(node, node.equals(circuit.reference()) ? -1 : next++);
    }
    nodeCount = next;
    Stamps stamps = new Stamps();
    stamps.start(nodeCount);
    CycleStamper stamper = new CycleStamper(circuit, stamps);
    group.elements().forEach(e -> e.accept(stamper));
    stamper.coupleThroughPrimaries();
    int[] diagonalNumbers = new int[nodeCount];
    for (int n = 0; n < nodeCount; n++) {
      diagonalNumbers[n] = stamps.entry(n, n, TIE_SIEMENS);
    }
    size = stamps.size();
    matrix = new SparseMatrix(stamps);
    constant = matrix.newValues();
    matrix.load(stamps, constant);
    source = stamps.rightHandSide();
    diagonal = places(diagonalNumbers);
    branches = stamper.branches();
    stamper.pathDrafts.forEach(
        d -> paths.add(new Path(d.anode, d.cathode, d.law, d.element, square(d.entry))));
    stamper.storeDrafts.forEach(
        d ->
            stores.add(
                new Store(
                    d.a,
                    d.b,
                    d.branch,
                    d.size,
                    d.branch >= 0 ? places(new int[] {d.entry}) : square(d.entry))));
  }

  /** Returns the unknown of a node's volts; −1 for the reference. */
  int at(Node node) {
    return unknowns.getOrDefault(node, -1);
  }

  /** Returns the unknown of the current through a section of a winding. */
  int sectionBranch(Winding.Section section) {
    return Objects.requireNonNull(sectionBranches.get(section));
  }

  private int[] square(int first) {
    return places(new int[] {first, first + 1, first + 2, first + 3});
  }

  private int[] places(int[] numbers) {
    int[] places = new int[numbers.length];
    for (int i = 0; i < numbers.length; i++) {
      places[i] = matrix.place(numbers[i]);
    }
    return places;
  }

  private record PathDraft(int anode, int cathode, TwoPoleLaw law, Element element, int entry) {}

  private record StoreDraft(int a, int b, int branch, double size, int entry) {}

  /** A winding section with its turns against the shared primary. */
  private record Coupled(int branch, double turnsRatio, Transformer transformer) {}

  private final class CycleStamper extends LinearStamper {
    private final Circuit circuit;
    private final List<PathDraft> pathDrafts = new ArrayList<>();
    private final List<StoreDraft> storeDrafts = new ArrayList<>();
    private final List<Coupled> coupled = new ArrayList<>();

    CycleStamper(Circuit circuit, Stamps stamps) {
      super(stamps, unknowns);
      this.circuit = circuit;
    }

    @Override
    public Void visit(Capacitor capacitor) {
      int a = at(capacitor.a());
      int b = at(capacitor.b());
      double leak = Double.isInfinite(capacitor.leakOhms()) ? 0 : 1 / capacitor.leakOhms();
      int entry = stamps.conductance(a, b, leak);
      storeDrafts.add(new StoreDraft(a, b, -1, capacitor.farads(), entry));
      return null;
    }

    @Override
    public Void visit(Inductor inductor) {
      double ohms = Double.isNaN(inductor.dcOhms()) ? 0 : inductor.dcOhms();
      double henries =
          Double.isNaN(inductor.henries()) ? RippleGroups.USUAL_CHOKE_HENRIES : inductor.henries();
      int branch = stamps.newBranch();
      branches().put(inductor, branch);
      stamps.branch(branch, at(inductor.a()), at(inductor.b()), ohms, 0);
      int entry = stamps.entry(branch, branch, 0);
      storeDrafts.add(new StoreDraft(at(inductor.a()), at(inductor.b()), branch, henries, entry));
      return null;
    }

    @Override
    public Void visit(Winding winding) {
      double scale = circuit.line().scale(winding.atLineVolts());
      Transformer transformer = circuit.transformer(winding.transformer()).orElse(null);
      for (Winding.Section section : winding.sections()) {
        double ohms = Double.isNaN(section.ohms()) ? usualOhms(winding, section) : section.ohms();
        int branch = stamps.newBranch();
        branches().putIfAbsent(winding, branch);
        sectionBranches.put(section, branch);
        stamps.branch(branch, at(section.a()), at(section.b()), ohms, 0);
        emfs.add(new Emf(branch, Math.sqrt(2) * section.openRmsVolts() * scale, winding));
        if (transformer != null) {
          coupled.add(
              new Coupled(
                  branch, section.openRmsVolts() / transformer.primaryVolts(), transformer));
        }
      }
      return null;
    }

    private static double usualOhms(Winding winding, Winding.Section section) {
      if (winding.wall()) {
        return 0;
      }
      boolean heater = section.openRmsVolts() <= 30;
      return section.openRmsVolts()
          * (heater ? USUAL_HEATER_OHMS_PER_OPEN_VOLT : USUAL_OHMS_PER_OPEN_VOLT);
    }

    /**
     * Writes the drop that the current of each section makes in the primary they share: section k
     * loses Nk · Rp · Σ Nj · ij, N being turns over the primary's.
     */
    void coupleThroughPrimaries() {
      for (Coupled k : coupled) {
        for (Coupled j : coupled) {
          if (k.transformer.equals(j.transformer)) {
            stamps.entry(
                k.branch, j.branch, -k.turnsRatio * j.turnsRatio * k.transformer.primaryOhms());
          }
        }
      }
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
