package railwalk.chart;

import java.util.ArrayList;
import java.util.List;
import railwalk.diagnosis.Diagnosis;
import railwalk.diagnosis.Evidence;
import railwalk.diagnosis.Suspect;
import railwalk.readings.Reading;
import railwalk.readings.ReadingKind;
import railwalk.units.Quantity;

/** Readings, suspects and their evidence in a bench report's words. */
final class BenchWords {
  private final Diagnosis diagnosis;
  private final FaultWords faults;

  BenchWords(Diagnosis diagnosis, FaultWords faults) {
    this.diagnosis = diagnosis;
    this.faults = faults;
  }

  /** Returns what a suspect says, as a clause. */
  String name(Suspect suspect) {
    return switch (suspect.kind()) {
      case HEALTHY -> "a healthy amplifier, or a fault that these readings do not show";
      case NOT_THIS_AMPLIFIER -> "not the amplifier of this netlist, or more than one fault";
      case FAULT -> {
        List<String> names = new ArrayList<>();
        for (int i = 0; i < suspect.faults().size(); i++) {
          names.add(faults.name(suspect.faults().get(i), suspect.estimates().get(i)));
        }
        yield String.join("; and ", names);
      }
    };
  }

  /** Returns a reading that speaks for a suspect, in a clause. */
  String speaksFor(Evidence e) {
    Reading reading = reading(e);
    return read(reading)
        + ": "
        + figure(reading.kind(), e.healthy())
        + " when healthy, "
        + figure(reading.kind(), e.suspected())
        + " with this";
  }

  /** Returns a reading that speaks against a suspect, in a clause. */
  String speaksAgainst(Evidence e, Suspect suspect) {
    Reading reading = reading(e);
    return read(reading)
        + ": "
        + figure(reading.kind(), e.suspected())
        + (suspect.kind() == Suspect.Kind.HEALTHY ? " when healthy" : " with this");
  }

  Reading reading(Evidence e) {
    return diagnosis.readings().get(e.reading()).reading();
  }

  private static String read(Reading reading) {
    return place(reading) + " reads " + figure(reading.kind(), reading.value());
  }

  /** Returns where, what and in which state. */
  static String place(Reading reading) {
    String kind =
        switch (reading.kind()) {
          case DC -> "";
          case AC -> " (AC)";
          case RIPPLE -> " (ripple)";
          case OHMS -> " (ohms)";
          case MA -> " (current)";
        };
    return reading.point() + kind + (reading.state().isEmpty() ? "" : " in " + reading.state());
  }

  static String figure(ReadingKind kind, double value) {
    return switch (kind) {
      case DC, AC -> Quantity.volts(value);
      case RIPPLE -> Quantity.of(value, "V");
      case OHMS -> Double.isInfinite(value) || value >= 2e7 ? "open" : Quantity.ohms(value);
      case MA -> Quantity.amps(value);
    };
  }
}
