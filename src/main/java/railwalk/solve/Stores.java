package railwalk.solve;

import java.util.ArrayList;
import java.util.List;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Inductor;

/**
 * Writes the parts that store energy and keeps their places: their state runs through the period.
 */
final class Stores {
  /**
   * A capacitor (volts across it are the state) or, with a branch, a choke (its current is).
   *
   * @param size farad or henry
   */
  record Store(int a, int b, int branch, double size, int[] places) {
    boolean isChoke() {
      return branch >= 0;
    }
  }

  private record Draft(int a, int b, int branch, double size, int entry) {}

  private final LinearStamper stamper;
  private final List<Draft> drafts = new ArrayList<>();

  Stores(LinearStamper stamper) {
    this.stamper = stamper;
  }

  void stamp(Capacitor capacitor) {
    int a = stamper.at(capacitor.a());
    int b = stamper.at(capacitor.b());
    double leak = Double.isInfinite(capacitor.leakOhms()) ? 0 : 1 / capacitor.leakOhms();
    int entry = stamper.stamps.conductance(a, b, leak);
    drafts.add(new Draft(a, b, -1, capacitor.farads(), entry));
  }

  void stamp(Inductor inductor, double henries) {
    double ohms = Double.isNaN(inductor.dcOhms()) ? 0 : inductor.dcOhms();
    int a = stamper.at(inductor.a());
    int b = stamper.at(inductor.b());
    stamper.branches().put(inductor, stampChoke(a, b, ohms, henries));
  }

  /** Writes a coil between two unknowns and returns the unknown of its current. */
  int stampChoke(int a, int b, double ohms, double henries) {
    int branch = stamper.stamps.newBranch();
    stamper.stamps.branch(branch, a, b, ohms, 0);
    int entry = stamper.stamps.entry(branch, branch, 0);
    drafts.add(new Draft(a, b, branch, henries, entry));
    return branch;
  }

  /** Returns the stores with their places in {@code matrix}. */
  List<Store> placed(SparseMatrix matrix) {
    List<Store> stores = new ArrayList<>(drafts.size());
    for (Draft d : drafts) {
      int[] places = matrix.places(d.entry, d.branch >= 0 ? 1 : 4);
      stores.add(new Store(d.a, d.b, d.branch, d.size, places));
    }
    return stores;
  }
}
