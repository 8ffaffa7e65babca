package railwalk.chart;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.List;
import railwalk.circuit.Element;
import railwalk.circuit.Filament;
import railwalk.circuit.Fuse;
import railwalk.circuit.Inductor;
import railwalk.circuit.Lamp;
import railwalk.circuit.Node;
import railwalk.circuit.Potentiometer;
import railwalk.circuit.Resistor;
import railwalk.circuit.Switch;
import railwalk.circuit.Wire;
import railwalk.solve.OperatingPoint;
import railwalk.units.Quantity;
import railwalk.walk.DcStep;

/** Turns the parts of a path into the terms of a sum. */
final class WalkTerms {
  private static final List<String> UNITS = List.of("Ω", "kΩ", "MΩ");

  /** A drop that no sum shows. */
  private static final double NO_DROP_VOLTS = 1e-6;

  private final OperatingPoint point;

  WalkTerms(OperatingPoint point) {
    this.point = point;
  }

  /** Returns the terms of the steps that drop volts; contacts and wires are left out. */
  List<WalkSum.Term> of(List<DcStep> steps) {
    List<WalkSum.Term> terms = new ArrayList<>();
    for (DcStep step : steps) {
      double drop = point.volts(step.from()) - point.volts(step.to());
      double ohms = ohms(step);
      if (ohms > 0) {
        terms.add(new WalkSum.Term(value(ohms), ohms, amps(step), drop));
      } else if (!isMetal(step.element()) && Math.abs(drop) > NO_DROP_VOLTS) {
        terms.add(new WalkSum.Term(step.element().name(), Double.NaN, amps(step), drop));
      }
    }
    return terms;
  }

  private static boolean isMetal(Element element) {
    return element instanceof Switch || element instanceof Fuse || element instanceof Wire;
  }

  /** Returns the current through a step in the direction of the path. */
  double amps(DcStep step) {
    double ohms = ohms(step);
    if (ohms > 0 && !(step.element() instanceof Filament)) {
      return (point.volts(step.from()) - point.volts(step.to())) / ohms;
    }
    double amps = point.amps(step.element());
    return step.element().nodes().get(0).equals(step.from()) ? amps : -amps;
  }

  /** Returns a step's resistance; 0 for plain metal, NaN for what has none. */
  static double ohms(DcStep step) {
    Element element = step.element();
    if (element instanceof Resistor resistor) {
      return resistor.ohms();
    }
    if (element instanceof Inductor inductor) {
      return Double.isNaN(inductor.dcOhms()) ? 0 : inductor.dcOhms();
    }
    if (element instanceof Lamp lamp) {
      return lamp.ratedVolts() / lamp.ratedAmps();
    }
    if (element instanceof Filament filament) {
      return filament.hotOhms();
    }
    if (element instanceof Potentiometer pot) {
      return potOhms(pot, step.from(), step.to());
    }
    return Double.NaN;
  }

  private static double potOhms(Potentiometer pot, Node from, Node to) {
    boolean upper = pot.a().equals(from) || pot.a().equals(to);
    return pot.ohms() * (upper ? 1 - pot.share() : pot.share());
  }

  /**
   * Returns a resistance with all its digits (five at most) and at least two: "1.0 kΩ", "4.75 kΩ".
   */
  static String value(double ohms) {
    BigDecimal exact = new BigDecimal(ohms).round(new MathContext(5)).stripTrailingZeros();
    int places = exact.precision() - exact.scale() - 1;
    int step = Math.max(0, Math.min(2, Math.floorDiv(places, 3)));
    BigDecimal scaled = exact.movePointLeft(3 * step);
    int least = scaled.compareTo(BigDecimal.TEN) < 0 ? 1 : 0;
    return Quantity.fixed(scaled.doubleValue(), Math.max(scaled.scale(), least))
        + " "
        + UNITS.get(step);
  }
}
