package railwalk.solve;

import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Element;
import railwalk.circuit.GlowLamp;
import railwalk.circuit.RegulatorSection;
import railwalk.device.AmplifierLaw;
import railwalk.device.GasLaw;
import railwalk.device.SectionCurrents;
import railwalk.device.SectionLaw;
import railwalk.device.TwoPoleCurrent;
import railwalk.device.TwoPoleLaw;

/**
 * The parts of a network that follow a law of volts: tube sections, diodes, gas tubes, each with
 * its places in the equations. A gas tube is dark or lit until {@link #updateGlow} says otherwise.
 */
final class Devices {
  /** A tube section: unknowns of its electrodes (−1: reference) and places of its 4 × 4 block. */
  record Amplifier(
      AmplifierSection section, int plate, int screen, int grid, int cathode, int[] places) {}

  /** A diode or one plate of a rectifier or regulator. */
  record TwoPole(Element element, int anode, int cathode, int[] places) {}

  final List<Amplifier> amplifiers = new ArrayList<>();
  final List<TwoPole> twoPoles = new ArrayList<>();
  private AmplifierLaw[] laws;
  private TwoPoleLaw[] twoPoleLaws;
  private final int[] glow;
  private final SectionCurrents currents = new SectionCurrents();
  private final TwoPoleCurrent current = new TwoPoleCurrent();

  Devices(DcStamper stamper, SparseMatrix matrix) {
    for (DcStamper.AmplifierDraft d : stamper.amplifiers) {
      int[] places = matrix.places(d.entry(), 16);
      amplifiers.add(
          new Amplifier(d.section(), d.plate(), d.screen(), d.grid(), d.cathode(), places));
    }
    for (DcStamper.TwoPoleDraft d : stamper.twoPoles) {
      twoPoles.add(new TwoPole(d.element(), d.anode(), d.cathode(), matrix.places(d.entry(), 4)));
    }
    glow = new int[twoPoles.size()];
    laws = new AmplifierLaw[0];
    twoPoleLaws = new TwoPoleLaw[0];
    load(stamper);
  }

  /** Takes the parts and laws of a circuit of the same topology. */
  void load(DcStamper stamper) {
    laws = new AmplifierLaw[amplifiers.size()];
    for (int i = 0; i < laws.length; i++) {
      Amplifier was = amplifiers.get(i);
      AmplifierSection section = stamper.amplifiers.get(i).section();
      amplifiers.set(
          i, new Amplifier(section, was.plate, was.screen, was.grid, was.cathode, was.places));
      laws[i] = section.law();
    }
    twoPoleLaws = new TwoPoleLaw[twoPoles.size()];
    for (int i = 0; i < twoPoleLaws.length; i++) {
      TwoPole was = twoPoles.get(i);
      DcStamper.TwoPoleDraft is = stamper.twoPoles.get(i);
      twoPoles.set(i, new TwoPole(is.element(), was.anode, was.cathode, was.places));
      twoPoleLaws[i] = branchOf(is.law(), glow[i]);
    }
  }

  private static TwoPoleLaw branchOf(SectionLaw law, int glow) {
    if (law instanceof GasLaw gas) {
      return glow == 0 ? gas.dark() : glow > 0 ? gas.lit() : new Turned(gas.lit());
    }
    return (TwoPoleLaw) law;
  }

  /** A neon lamp lit the other way round. */
  private record Turned(TwoPoleLaw law) implements TwoPoleLaw {
    @Override
    public void evaluate(double volts, TwoPoleCurrent out) {
      law.evaluate(-volts, out);
      out.amps = -out.amps;
    }

    @Override
    public TwoPoleLaw withEmission(double emission) {
      return this;
    }
  }

  /**
   * Adds the currents at {@code x} to the residuals (ampere that leave a node) and their slopes to
   * the Jacobian.
   */
  void addTo(double[] x, double[] residual, double[] jacobian) {
    for (int i = 0; i < twoPoles.size(); i++) {
      TwoPole pole = twoPoles.get(i);
      twoPoleLaws[i].evaluate(DcNetwork.at(x, pole.anode) - DcNetwork.at(x, pole.cathode), current);
      add(residual, pole.anode, current.amps);
      add(residual, pole.cathode, -current.amps);
      int[] p = pole.places;
      jacobian[p[0]] += current.siemens;
      jacobian[p[1]] -= current.siemens;
      jacobian[p[2]] -= current.siemens;
      jacobian[p[3]] += current.siemens;
    }
    for (int i = 0; i < laws.length; i++) {
      Amplifier tube = amplifiers.get(i);
      law(i, x);
      add(residual, tube.plate, currents.plateAmps);
      add(residual, tube.screen, currents.screenAmps);
      add(residual, tube.grid, currents.gridAmps);
      add(residual, tube.cathode, -currents.plateAmps - currents.screenAmps - currents.gridAmps);
      stampSection(tube.places, jacobian);
    }
  }

  private void law(int tube, double[] x) {
    Amplifier a = amplifiers.get(tube);
    double cathode = DcNetwork.at(x, a.cathode);
    double screen = a.section.screen() == null ? 0 : DcNetwork.at(x, a.screen) - cathode;
    laws[tube].evaluate(
        DcNetwork.at(x, a.plate) - cathode, screen, DcNetwork.at(x, a.grid) - cathode, currents);
  }

  private void stampSection(int[] p, double[] jacobian) {
    SectionCurrents c = currents;
    double plateSum = c.plateByPlateSiemens + c.plateByScreenSiemens + c.plateByGridSiemens;
    double screenSum = c.screenByPlateSiemens + c.screenByScreenSiemens + c.screenByGridSiemens;
    double gridSum = c.gridByPlateSiemens + c.gridByScreenSiemens + c.gridByGridSiemens;
    double byPlate = c.plateByPlateSiemens + c.screenByPlateSiemens + c.gridByPlateSiemens;
    double byScreen = c.plateByScreenSiemens + c.screenByScreenSiemens + c.gridByScreenSiemens;
    double byGrid = c.plateByGridSiemens + c.screenByGridSiemens + c.gridByGridSiemens;
    jacobian[p[0]] += c.plateByPlateSiemens;
    jacobian[p[1]] += c.plateByScreenSiemens;
    jacobian[p[2]] += c.plateByGridSiemens;
    jacobian[p[3]] -= plateSum;
    jacobian[p[4]] += c.screenByPlateSiemens;
    jacobian[p[5]] += c.screenByScreenSiemens;
    jacobian[p[6]] += c.screenByGridSiemens;
    jacobian[p[7]] -= screenSum;
    jacobian[p[8]] += c.gridByPlateSiemens;
    jacobian[p[9]] += c.gridByScreenSiemens;
    jacobian[p[10]] += c.gridByGridSiemens;
    jacobian[p[11]] -= gridSum;
    jacobian[p[12]] -= byPlate;
    jacobian[p[13]] -= byScreen;
    jacobian[p[14]] -= byGrid;
    jacobian[p[15]] += plateSum + screenSum + gridSum;
  }

  /** Returns the currents of a tube section at {@code x}; valid until the next call. */
  SectionCurrents section(int tube, double[] x) {
    law(tube, x);
    return currents;
  }

  /** Returns the current of a two-pole at {@code x}. */
  double twoPoleAmps(int pole, double[] x) {
    TwoPole p = twoPoles.get(pole);
    twoPoleLaws[pole].evaluate(DcNetwork.at(x, p.anode) - DcNetwork.at(x, p.cathode), current);
    return current.amps;
  }

  /**
   * Lights every gas tube whose volts at {@code x} pass its strike, and puts out every lit one
   * whose current would reverse. Returns whether any changed.
   */
  boolean updateGlow(double[] x) {
    boolean changed = false;
    for (int i = 0; i < twoPoles.size(); i++) {
      TwoPole pole = twoPoles.get(i);
      GasLaw gas = gasOf(pole.element);
      if (gas == null) {
        continue;
      }
      double volts = DcNetwork.at(x, pole.anode) - DcNetwork.at(x, pole.cathode);
      int next = glow[i];
      if (glow[i] == 0) {
        boolean bothWays = pole.element instanceof GlowLamp;
        if (volts > gas.strikeVolts()) {
          next = 1;
        } else if (bothWays && volts < -gas.strikeVolts()) {
          next = -1;
        }
      } else if (glow[i] * twoPoleAmps(i, x) < 0) {
        next = 0;
      }
      if (next != glow[i]) {
        glow[i] = next;
        twoPoleLaws[i] = branchOf(gas, next);
        changed = true;
      }
    }
    return changed;
  }

  private static @Nullable GasLaw gasOf(Element element) {
    if (element instanceof RegulatorSection regulator) {
      return regulator.law();
    }
    return element instanceof GlowLamp lamp ? lamp.law() : null;
  }

  /** Returns 1 (or −1, turned round) for a gas tube that glows, 0 for a dark one or other part. */
  int glow(int pole) {
    return glow[pole];
  }

  /** Takes over which gas tubes glow. */
  void copyGlow(Devices other) {
    System.arraycopy(other.glow, 0, glow, 0, glow.length);
    for (int i = 0; i < glow.length; i++) {
      GasLaw gas = gasOf(twoPoles.get(i).element);
      if (gas != null) {
        twoPoleLaws[i] = branchOf(gas, glow[i]);
      }
    }
  }

  /** Takes over which gas tubes glow from a network that has other parts beside them. */
  void glowAs(Devices other) {
    for (int i = 0; i < glow.length; i++) {
      GasLaw gas = gasOf(twoPoles.get(i).element);
      for (int j = 0; gas != null && j < other.glow.length; j++) {
        if (other.twoPoles.get(j).element.name().equals(twoPoles.get(i).element.name())) {
          glow[i] = other.glow[j];
          twoPoleLaws[i] = branchOf(gas, glow[i]);
        }
      }
    }
  }

  private static void add(double[] target, int unknown, double amount) {
    if (unknown >= 0) {
      target[unknown] += amount;
    }
  }
}
