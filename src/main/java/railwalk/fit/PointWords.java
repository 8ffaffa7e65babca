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
    List<String> words = new ArrayList<>();
    words.add(Quantity.volts(point.plateVolts()));
    if (point.loadOhms() > 0) {
      words.set(0, words.get(0) + " through " + Quantity.ohms(point.loadOhms()));
    }
    if (point.triodeConnected()) {
      words.add("as triode");
    } else if (point.screenOhms() > 0) {
      words.add("screen through " + Quantity.ohms(point.screenOhms()));
    } else if (!Double.isNaN(point.screenVolts())) {
      words.add("screen " + Quantity.volts(point.screenVolts()));
    }
    if (point.cathodeOhms() > 0) {
      String shared = point.sharing() > 1 ? " for " + point.sharing() : "";
      words.add("cathode " + Quantity.ohms(point.cathodeOhms()) + shared);
    } else if (!Double.isNaN(point.gridVolts())) {
      words.add("grid " + Quantity.volts(point.gridVolts()));
    }
    if (!point.of().isEmpty()) {
      words.add(point.of());
    }
    return String.join(", ", words);
  }

  static String figure(double value, Measure measure) {
    return measure.unit().isEmpty()
        ? Quantity.of(value, "").strip()
        : Quantity.of(value, measure.unit());
  }

  static String percent(double share) {
    String text = String.format(Locale.ROOT, "%+.1f", 100 * share);
    return text.replace('-', '\u2212');
  }
}
