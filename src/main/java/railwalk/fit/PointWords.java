package railwalk.fit;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import railwalk.device.PublishedPoint;
import railwalk.units.Quantity;

/** A published point in a few words: "250 V, screen 250 V, cathode 135 Ω". */
final class PointWords {
  private PointWords() {}

  static String of(PublishedPoint point) {
    PublishedPoint.Setup setup = point.setup();
    List<String> words = new ArrayList<>();
    words.add(Quantity.volts(setup.plateVolts()));
    if (setup.loadOhms() > 0) {
      words.set(0, words.get(0) + " through " + Quantity.ohms(setup.loadOhms()));
    }
    if (setup.triodeConnected()) {
      words.add("as triode");
    } else if (setup.screenOhms() > 0) {
      words.add("screen through " + Quantity.ohms(setup.screenOhms()));
    } else if (!Double.isNaN(setup.screenVolts())) {
      words.add("screen " + Quantity.volts(setup.screenVolts()));
    }
    if (setup.cathodeOhms() > 0) {
      String shared = setup.sharing() > 1 ? " for " + setup.sharing() : "";
      words.add("cathode " + Quantity.ohms(setup.cathodeOhms()) + shared);
    } else if (!Double.isNaN(setup.gridVolts())) {
      words.add("grid " + Quantity.volts(setup.gridVolts()));
    }
    if (!point.credit().of().isEmpty()) {
      words.add(point.credit().of());
    }
    return String.join(", ", words);
  }

  static String figure(double value, FigureKind measure) {
    return measure.unit().isEmpty()
        ? Quantity.of(value, "").strip()
        : Quantity.of(value, measure.unit());
  }

  static String percent(double share) {
    double rounded = Math.rint(1000 * share) / 10;
    return rounded == 0
        ? "0.0"
        : String.format(Locale.ROOT, "%+.1f", rounded).replace('-', '\u2212');
  }
}
