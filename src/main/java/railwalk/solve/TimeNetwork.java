package railwalk.solve;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Circuit;
import railwalk.circuit.Diode;
import railwalk.circuit.Element;
import railwalk.circuit.Inductor;
import railwalk.circuit.Node;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.Winding;
import railwalk.walk.RippleGroup;
import railwalk.walk.RippleGroups;
import railwalk.walk.SupplyMap;

/**
 * The equations of the whole netlist at an instant of the line's period: every tube, capacitor,
 * coil and winding at once, with nothing cut out and nothing averaged. Unknowns are node volts,
 * then currents of parts that have an equation of their own.
 */
final class TimeNetwork {
  /** Ties nodes that have no DC path, so that the equations of the others can be solved. */
  private static final double TIE_SIEMENS = 1e-12;

  final Circuit circuit;
  final Map<Node, Integer> unknowns = new HashMap<>();
  final List<Node> nodes = new ArrayList<>();
  final int nodeCount;
  final int size;
  final SparseMatrix matrix;
  final Devices devices;
  final List<Stores.Store> stores;
  final List<Windings.Emf> emfs;
  final Windings windings;
  final Map<Element, Integer> branches;
  final double[] linear;
  final double[] source;
  final double hertz;

  TimeNetwork(Circuit circuit, SupplyMap map) {
    this.circuit = circuit;
    this.hertz = circuit.line().hertz();
    Set<Node> touched = new HashSet<>();
    circuit.elements().forEach(e -> touched.addAll(e.nodes()));
    for (Node node : circuit.nodes()) {
      if (node.equals(circuit.reference())) {
        unknowns.put(node, -1);
      } else if (touched.contains(node)) {
        unknowns.put(node, nodes.size());
        nodes.add(node);
      }
    }
    nodeCount = nodes.size();
    Stamps stamps = new Stamps();
    stamps.start(nodeCount);
    TimeStamper stamper = new TimeStamper(circuit, map, stamps, unknowns);
    circuit.elements().forEach(e -> e.accept(stamper));
    stamper.finish();
    stamper.windings.coupleThroughPrimaries(stamper.stores);
    for (int n = 0; n < nodeCount; n++) {
      stamps.entry(n, n, map.undefined().contains(nodes.get(n)) ? TIE_SIEMENS : 0);
    }
    size = stamps.size();
    matrix = new SparseMatrix(stamps);
    linear = matrix.newValues();
    matrix.load(stamps, linear);
    source = stamps.rightHandSide();
    devices = new Devices(stamper, matrix);
    stores = stamper.stores.placed(matrix);
    windings = stamper.windings;
    emfs = windings.emfs();
    branches = stamper.branches();
  }

  /** Returns the unknown of a node's volts; −1 for the reference. */
  int at(Node node) {
    return unknowns.getOrDefault(node, -1);
  }

  private static final class TimeStamper extends DcStamper {
    private final Stores stores = new Stores(this);
    private final Windings windings;
    private final Set<Element> rippling = new HashSet<>();

    TimeStamper(Circuit circuit, SupplyMap map, Stamps stamps, Map<Node, Integer> unknowns) {
      super(stamps, unknowns);
      windings = new Windings(circuit, this);
      for (RippleGroup group : map.groups()) {
        rippling.addAll(group.elements());
      }
    }

    @Override
    public Void visit(Capacitor capacitor) {
      stores.stamp(capacitor);
      return null;
    }

    @Override
    public Void visit(Inductor inductor) {
      double henries = inductor.henries();
      if (!Double.isNaN(henries)) {
        stores.stamp(inductor, henries);
      } else if (rippling.contains(inductor)) {
        stores.stamp(inductor, RippleGroups.USUAL_CHOKE_HENRIES);
      } else {
        super.visit(inductor);
      }
      return null;
    }

    @Override
    public Void visit(Winding winding) {
      windings.stamp(winding);
      return null;
    }

    @Override
    public Void visit(Diode diode) {
      stamps.conductance(at(diode.anode()), at(diode.cathode()), CycleNetwork.LEAK_SIEMENS);
      return super.visit(diode);
    }

    @Override
    public Void visit(RectifierSection section) {
      for (Node plate : section.plates()) {
        stamps.conductance(at(plate), at(section.cathode()), CycleNetwork.LEAK_SIEMENS);
      }
      return super.visit(section);
    }
  }
}
