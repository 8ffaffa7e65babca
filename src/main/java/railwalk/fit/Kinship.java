package railwalk.fit;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import railwalk.device.AmplifierLaw;
import railwalk.device.PentodeLaw;
import railwalk.device.TriodeLaw;

/**
 * A family of curves narrowed to the kin of one tube: the priors' centres are that tube's own
 * constants. The size of the cathode (kg) stays open; all else is held as far as the points of the
 * new type say nothing of it, about as closely as variants of one design agree (widths: this
 * project's choice).
 */
final class Kinship {
  private static final Map<String, Double> WIDTHS =
      Map.of(
          "kg", 3.0,
          "mu", 0.1,
          "exponent", 0.04,
          "kp", 0.1,
          "kvb", 0.3,
          "contact", 0.15,
          "lambda", 0.4,
          "knee", 0.1,
          "screenshare", 0.5,
          "screenrise", 0.5);

  private Kinship() {}

  /** Returns {@code curve} with its priors about {@code law}, a law of that family. */
  static Curve around(Curve curve, AmplifierLaw law) {
    List<Curve.Constant> constants = new ArrayList<>();
    for (Curve.Constant constant : curve.constants()) {
      String name = constant.name();
      constants.add(
          new Curve.Constant(
              name,
              constant.logarithmic(),
              value(law, name, constant.centre()),
              WIDTHS.getOrDefault(name, constant.width())));
    }
    return new Curve(curve.word(), constants, curve.form());
  }

  private static double value(AmplifierLaw law, String name, double otherwise) {
    if (law instanceof TriodeLaw triode) {
      return switch (name) {
        case "mu" -> triode.mu();
        case "exponent" -> triode.exponent();
        case "kg" -> triode.kg();
        case "kp" -> triode.kp() / triode.mu();
        case "kvb" -> triode.kvb();
        case "contact" -> triode.contactVolts();
        default -> otherwise;
      };
    }
    PentodeLaw pentode = (PentodeLaw) law;
    return switch (name) {
      case "mu" -> pentode.mu();
      case "exponent" -> pentode.exponent();
      case "kg" -> pentode.kg();
      case "kp" -> pentode.kp() / pentode.mu();
      case "kvb" -> pentode.kvb();
      case "contact" -> pentode.contactVolts();
      case "lambda" -> pentode.lambda();
      case "knee" -> pentode.knee();
      case "screenshare" -> pentode.screenShare();
      case "screenrise" -> pentode.screenRise();
      default -> otherwise;
    };
  }
}
