package railwalk.chart;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import railwalk.chart.Table.Use;
import railwalk.circuit.Bottle;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.diagnosis.JudgedReading;
import railwalk.readings.Reading;
import railwalk.readings.ReadingKind;
import railwalk.units.Quantity;

/** Every reading through the three steps to its verdict: supply nodes, then tubes in V order. */
final class ReadingsPage {
  private final Circuit circuit;
  private final Wording wording;

  ReadingsPage(Circuit circuit, Wording wording) {
    this.circuit = circuit;
    this.wording = wording;
  }

  Page page(List<JudgedReading> readings) {
    List<Table.Column> columns =
        List.of(
            new Table.Column("Point", Use.WORDS),
            new Table.Column("Expected", "Chart", Use.FIGURES),
            new Table.Column("Expected", wording.say("This {line}"), Use.FIGURES),
            new Table.Column("Expected", "This meter", Use.FIGURES),
            new Table.Column("Healthy", "Low", Use.FIGURES),
            new Table.Column("Healthy", "High", Use.FIGURES),
            new Table.Column("Read", Use.KEY_FIGURES),
            new Table.Column("Verdict", Use.WORDS));
    List<Table.Group> groups = new ArrayList<>();
    for (Map.Entry<Place, List<JudgedReading>> entry : sorted(readings).entrySet()) {
      List<Table.Row> rows = entry.getValue().stream().map(ReadingsPage::row).toList();
      groups.add(new Table.Group(title(entry.getKey()), "", rows, List.of()));
    }
    return new Page(
        "Readings",
        List.of(
            new Table("", columns, groups),
            new Paragraph(
                wording.say(
                    "Three steps: solved again at this {line}; the meter’s loading counted in; then"
                        + " judged. Low and high hold 99 of 100 healthy amplifiers, read off 2,048"
                        + " that were drawn within their parts’ limits (seed 1) and solved; the"
                        + " verdict adds the meter’s own error. Far off"
                        + " is a whole band’s width outside."))));
  }

  private static Table.Row row(JudgedReading judged) {
    Reading r = judged.reading();
    ReadingKind kind = r.kind();
    return new Table.Row(
        List.of(
            r.point(),
            bare(kind, judged.chart()),
            bare(kind, judged.expected()),
            bare(kind, judged.meter()),
            bare(kind, judged.low()),
            bare(kind, judged.high()),
            bare(kind, r.value()),
            judged.verdict().word()),
        r.note());
  }

  /**
   * What a group of rows shares.
   *
   * @param tube empty for supply nodes and other places outside a tube
   */
  private record Place(String state, ReadingKind kind, String tube) {}

  /** Returns the readings by state, kind and tube; each group by rising pin, nodes as written. */
  Map<Place, List<JudgedReading>> sorted(List<JudgedReading> readings) {
    Map<Place, List<JudgedReading>> groups =
        new TreeMap<>(
            Comparator.comparing(Place::state)
                .thenComparing(Place::kind)
                .thenComparing(Place::tube, NaturalOrder.INSTANCE));
    for (JudgedReading judged : readings) {
      Reading r = judged.reading();
      groups
          .computeIfAbsent(new Place(r.state(), r.kind(), tube(r)), p -> new ArrayList<>())
          .add(judged);
    }
    groups.forEach(
        (place, rows) -> {
          if (!place.tube().isEmpty()) {
            rows.sort(Comparator.comparing(j -> j.reading().point(), NaturalOrder.INSTANCE));
          }
        });
    return groups;
  }

  /** Returns the tube that a point is a pin or an electrode of; empty when it is of none. */
  private String tube(Reading reading) {
    int period = reading.point().indexOf('.');
    if (period < 0) {
      return "";
    }
    String owner = reading.point().substring(0, period);
    for (Bottle bottle : circuit.bottles()) {
      if (bottle.name().equalsIgnoreCase(owner)) {
        return bottle.name();
      }
    }
    Optional<Element> section =
        circuit.elements().stream().filter(e -> e.name().equalsIgnoreCase(owner)).findFirst();
    return section.map(e -> e.bottle().isEmpty() ? e.name() : e.bottle()).orElse("");
  }

  private String title(Place place) {
    String where =
        place.tube().isEmpty()
            ? ""
            : circuit
                    .bottle(place.tube())
                    .map(bottle -> bottle.name() + " " + bottle.type().name())
                    .orElse(place.tube())
                + ", ";
    String state = place.state().isEmpty() ? "" : ", " + place.state();
    String what = where + title(place.kind()) + state;
    return Character.toUpperCase(what.charAt(0)) + what.substring(1);
  }

  private static String title(ReadingKind kind) {
    return switch (kind) {
      case DC -> "DC volts";
      case AC -> "AC volts";
      case RIPPLE -> "ripple, volts rms";
      case OHMS -> "ohms, power off";
      case MA -> "milliamperes";
    };
  }

  static String bare(ReadingKind kind, double value) {
    return switch (kind) {
      case DC, AC, RIPPLE -> Quantity.plainVolts(value);
      case OHMS -> BenchWords.figure(kind, value);
      case MA -> Quantity.plainVolts(1000 * value);
    };
  }
}
