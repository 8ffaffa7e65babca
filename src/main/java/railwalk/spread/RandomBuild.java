package railwalk.spread;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.function.DoubleSupplier;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Circuit;
import railwalk.circuit.Diode;
import railwalk.circuit.Element;
import railwalk.circuit.GlowLamp;
import railwalk.circuit.Line;
import railwalk.circuit.Potentiometer;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.RegulatorSection;
import railwalk.circuit.Resistor;
import railwalk.circuit.Winding;
import railwalk.device.GasLaw;
import railwalk.device.TwoPoleLaw;
import railwalk.solve.SpreadPart;

/**
 * One amplifier of many that were built after the same netlist: every part drawn within its limits,
 * as {@link SpreadFactors} takes them. Resistors, windings and the line are uniform, tubes and gas
 * tubes normal, the sections of one bottle going together in part.
 */
public final class RandomBuild {
  private final Circuit nominal;
  private final DoubleSupplier uniform;
  private final Map<String, Double> common = new HashMap<>();

  private RandomBuild(Circuit nominal, DoubleSupplier uniform) {
    this.nominal = nominal;
    this.uniform = uniform;
  }

  /**
   * Returns a build of {@code nominal}.
   *
   * @param uniform draws between 0 and 1, both left out; asked as often, in the same order, for
   *     every build
   */
  public static Circuit of(Circuit nominal, DoubleSupplier uniform) {
    return new RandomBuild(nominal, uniform).build();
  }

  /** Returns how many draws a build of {@code nominal} takes. */
  public static int draws(Circuit nominal) {
    int[] count = {0};
    of(
        nominal,
        () -> {
          count[0]++;
          return 0.5;
        });
    return count[0];
  }

  private Circuit build() {
    List<Element> elements = new ArrayList<>();
    for (Element element : nominal.elements()) {
      elements.add(drawn(element));
    }
    Circuit built = nominal.withElements(elements);
    double limit = nominal.spread().line();
    Line line = nominal.line();
    if (limit > 0 && line.stated()) {
      double volts = line.volts() * (1 + limit * (2 * uniform.getAsDouble() - 1));
      built = built.withLine(new Line(volts, line.hertz(), line.designVolts()));
    }
    return built;
  }

  private Element drawn(Element element) {
    if (element instanceof Resistor r) {
      return r.withOhms(r.ohms() * factor(new SpreadPart.Ohms(r)));
    }
    if (element instanceof Potentiometer p) {
      double ohms = p.ohms() * factor(new SpreadPart.Ohms(p));
      return new Potentiometer(p.name(), p.a(), p.wiper(), p.b(), ohms, p.share());
    }
    if (element instanceof Winding w) {
      return w.scaled(factor(new SpreadPart.WindingVolts(w)));
    }
    if (element instanceof AmplifierSection s) {
      return s.withLaw(s.law().withEmission(emission(s)));
    }
    if (element instanceof RectifierSection r) {
      return r.withLaw(r.law().withEmission(factor(new SpreadPart.Emission(r))));
    }
    if (element instanceof Diode d) {
      TwoPoleLaw law = d.law().withEmission(factor(new SpreadPart.Emission(d)));
      return new Diode(d.name(), d.anode(), d.cathode(), d.typeName(), law);
    }
    if (element instanceof RegulatorSection r) {
      return r.withLaw(scaled(r.law(), factor(new SpreadPart.GlowVolts(r))));
    }
    if (element instanceof GlowLamp g) {
      GasLaw law = scaled(g.law(), factor(new SpreadPart.GlowVolts(g)));
      return new GlowLamp(g.name(), g.a(), g.b(), g.typeName(), law);
    }
    return element;
  }

  private static GasLaw scaled(GasLaw law, double factor) {
    return new GasLaw(
        law.strikeVolts() * factor,
        law.operatingVolts() * factor,
        law.referenceAmps(),
        law.slopeOhms(),
        law.minimumAmps(),
        law.maximumAmps());
  }

  /** Returns the drawn figure of a part as a multiple of its nominal one. */
  private double factor(SpreadPart part) {
    double deviation = PartSpread.deviation(nominal, part);
    double middle = 1 + PartSpread.shift(nominal, part);
    boolean limited = part instanceof SpreadPart.Ohms || part instanceof SpreadPart.WindingVolts;
    double draw = uniform.getAsDouble();
    double deviations = limited ? Math.sqrt(3) * (2 * draw - 1) : Normal.quantile(draw);
    return Math.max(LEAST, middle + deviation * deviations);
  }

  /** No draw makes a part less than this share of itself. */
  private static final double LEAST = 0.05;

  private double emission(AmplifierSection section) {
    SpreadPart part = new SpreadPart.SpaceCurrent(section);
    Double known = common.get(section.bottle());
    double together = known == null ? Normal.quantile(uniform.getAsDouble()) : known;
    common.putIfAbsent(section.bottle(), together);
    double alone = Normal.quantile(uniform.getAsDouble());
    double share = PartSpread.SECTION_CORRELATION;
    double deviations = Math.sqrt(share) * together + Math.sqrt(1 - share) * alone;
    double middle = 1 + PartSpread.shift(nominal, part);
    return Math.max(LEAST, middle + PartSpread.deviation(nominal, part) * deviations);
  }
}
