package railwalk.solve;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.IdentityHashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.Circuit;
import railwalk.circuit.Transformer;
import railwalk.circuit.Winding;

/**
 * Writes windings as what they are at an instant of the line's period: an alternating source behind
 * the resistance of the wire, coupled to the others of its transformer through the primary.
 */
final class Windings {
  /** An alternating source in the equation of a section's current, or of a magnetising one. */
  record Emf(int branch, double peakVolts, @Nullable Winding winding) {}

  /** Resistance of a high-voltage winding for which none is given, per volt (common practice). */
  private static final double USUAL_OHMS_PER_OPEN_VOLT = 0.3;

  /** The same for heater windings, up to 30 V. */
  private static final double USUAL_HEATER_OHMS_PER_OPEN_VOLT = 0.005;

  /** Magnetising reactance over primary resistance: so large that what it draws does not count. */
  private static final double MAGNETISING_RATIO = 100;

  /** A winding section with its turns against the shared primary. */
  private record Coupled(
      int branch, double turnsRatio, double primaryPeakVolts, Transformer transformer) {}

  private final Circuit circuit;
  private final LinearStamper stamper;
  private final List<Emf> emfs = new ArrayList<>();
  private final Set<Winding> stamped = new HashSet<>();
  private final List<Coupled> coupled = new ArrayList<>();
  private final IdentityHashMap<Winding.Section, Integer> branches = new IdentityHashMap<>();

  Windings(Circuit circuit, LinearStamper stamper) {
    this.circuit = circuit;
    this.stamper = stamper;
  }

  /** Returns the sources written so far. */
  List<Emf> emfs() {
    return emfs;
  }

  /** Returns the unknown of the current through a section. */
  int branch(Winding.Section section) {
    return Objects.requireNonNull(branches.get(section));
  }

  /** Returns the resistance of a section, a usual one where none is given. */
  static double ohms(Winding winding, Winding.Section section) {
    return Double.isNaN(section.ohms()) ? usualOhms(winding, section) : section.ohms();
  }

  /** Writes a winding, each section with a current of its own. */
  void stamp(Winding winding) {
    stamped.add(winding);
    double scale = circuit.line().scale(winding.atLineVolts());
    @Nullable Transformer transformer = circuit.transformer(winding.transformer()).orElse(null);
    for (Winding.Section section : winding.sections()) {
      double ohms = ohms(winding, section);
      int branch = stamper.stamps.newBranch();
      stamper.branches().putIfAbsent(winding, branch);
      branches.put(section, branch);
      stamper.stamps.branch(branch, stamper.at(section.a()), stamper.at(section.b()), ohms, 0);
      emfs.add(new Emf(branch, Math.sqrt(2) * section.openRmsVolts() * scale, winding));
      if (transformer != null) {
        double turnsRatio = section.openRmsVolts() / transformer.primaryVolts();
        double peakVolts = Math.sqrt(2) * transformer.primaryVolts() * scale;
        coupled.add(new Coupled(branch, turnsRatio, peakVolts, transformer));
      }
    }
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
   * Writes what windings of one transformer do to each other through the primary: with turns N over
   * the primary's, currents i, primary resistance Rp and magnetising current im, section k gets Nk
   * times the core's volts e = Vp + Rp · (Σ Nj · ij − im − G · e), and L · dim/dt = e. So no mean
   * volts stand on the core, whatever direct current a half-wave rectifier draws through its
   * winding. G is what the heaters of other windings load the primary with: it divides Vp and Rp by
   * 1 + Rp·G.
   */
  void coupleThroughPrimaries(Stores stores) {
    Map<Transformer, List<Coupled>> sections = new LinkedHashMap<>();
    for (Coupled section : coupled) {
      sections.computeIfAbsent(section.transformer, t -> new ArrayList<>()).add(section);
    }
    sections.forEach((transformer, on) -> couple(transformer, on, stores));
  }

  private void couple(Transformer transformer, List<Coupled> sections, Stores stores) {
    if (!(transformer.primaryOhms() > 0)) {
      return;
    }
    double siemens = HeaterLoad.primarySiemens(circuit, transformer, stamped);
    double share = 1 / (1 + transformer.primaryOhms() * siemens);
    double ohms = share * transformer.primaryOhms();
    double omega = 2 * Math.PI * circuit.line().hertz();
    int core = stores.stampChoke(null, -1, -1, ohms, MAGNETISING_RATIO * ohms / omega);
    for (Coupled k : sections) {
      for (Coupled j : sections) {
        stamper.stamps.entry(k.branch, j.branch, -k.turnsRatio * j.turnsRatio * ohms);
      }
      stamper.stamps.entry(k.branch, core, k.turnsRatio * ohms);
      stamper.stamps.entry(core, k.branch, k.turnsRatio * ohms);
    }
    for (int i = 0; i < emfs.size(); i++) {
      Emf emf = emfs.get(i);
      if (emf.winding() != null && emf.winding().transformer().equals(transformer.name())) {
        emfs.set(i, new Emf(emf.branch(), share * emf.peakVolts(), emf.winding()));
      }
    }
    emfs.add(new Emf(core, -share * sections.get(0).primaryPeakVolts, null));
  }
}
