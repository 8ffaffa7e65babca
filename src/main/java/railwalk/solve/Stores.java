package railwalk.solve;

import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Capacitor;
import railwalk.circuit.Element;
import railwalk.circuit.Inductor;

/**
 * Writes the parts that store energy and keeps their places: their state runs through the period.
 */
final class Stores {
  /**
   * A capacitor (volts across it are the state) or, with a branch, a choke (its current is).
   *
   * @param part null for the magnetising current of a transformer
   * @param size farad or henry
   */
  record Store(@Nullable Element part, int a, int b, int branch, double size, int[] places) {
    boolean isChoke() {
      return branch >= 0;
    }

    /** Returns its state in a solved network: volts across it, or a coil's current. */
    double state(double[] unknowns) {
      return isChoke() ? unknowns[branch] : DcNetwork.at(unknowns, a) - DcNetwork.at(unknowns, b);
    }

    /** Adds its conductance (a coil: its resistance) over a stage to a network's values. */
    void addCompanion(double perStage, double[] values) {
      double companion = size * perStage;
      if (isChoke()) {
        values[places[0]] -= companion;
      } else {
        values[places[0]] += companion;
        values[places[1]] -= companion;
        values[places[2]] -= companion;
        values[places[3]] += companion;
      }
    }

    /** Adds what it holds from before the stage to the right-hand side. */
    void addHistory(double history, double perStage, double[] target) {
      double amount = size * perStage * history;
      if (isChoke()) {
        target[branch] -= amount;
        return;
      }
      if (a >= 0) {
        target[a] += amount;
      }
      if (b >= 0) {
        target[b] -= amount;
      }
    }
  }

  private record Draft(@Nullable Element part, int a, int b, int branch, double size, int entry) {}

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
    drafts.add(new Draft(capacitor, a, b, -1, capacitor.farads(), entry));
  }

  void stamp(Inductor inductor, double henries) {
    double ohms = Double.isNaN(inductor.dcOhms()) ? 0 : inductor.dcOhms();
    int a = stamper.at(inductor.a());
    int b = stamper.at(inductor.b());
    stamper.branches().put(inductor, stampChoke(inductor, a, b, ohms, henries));
  }

  /** Writes a coil between two unknowns and returns the unknown of its current. */
  int stampChoke(@Nullable Element part, int a, int b, double ohms, double henries) {
    int branch = stamper.stamps.newBranch();
    stamper.stamps.branch(branch, a, b, ohms, 0);
    int entry = stamper.stamps.entry(branch, branch, 0);
    drafts.add(new Draft(part, a, b, branch, henries, entry));
    return branch;
  }

  /** Returns the stores with their places in {@code matrix}. */
  List<Store> placed(SparseMatrix matrix) {
    List<Store> stores = new ArrayList<>(drafts.size());
    for (Draft d : drafts) {
      int[] places = matrix.places(d.entry, d.branch >= 0 ? 1 : 4);
      stores.add(new Store(d.part, d.a, d.b, d.branch, d.size, places));
    }
    return stores;
  }
}
