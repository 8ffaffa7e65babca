package railwalk.diagnosis;

import railwalk.circuit.Meter;
import railwalk.readings.MeasuredAt;
import railwalk.readings.Reading;
import railwalk.readings.ReadingKind;

/**
 * A place that can be read: where, what, in which state of the amplifier.
 *
 * @param name as people write the point
 * @param state empty for the amplifier as its netlist stands
 * @param rangeVolts the meter's range; NaN: the lowest that holds the volts
 */
public record Probe(String name, MeasuredAt at, ReadingKind kind, String state, double rangeVolts) {
  static Probe of(Reading reading, Meter meter) {
    double range =
        Double.isNaN(reading.rangeVolts()) ? meter.rangeFor(reading.value()) : reading.rangeVolts();
    return new Probe(reading.point(), reading.at(), reading.kind(), reading.state(), range);
  }

  /** Returns the meter's input resistance when this place stands at {@code volts}. */
  double meterOhms(Meter meter, double volts) {
    boolean needle = !Double.isNaN(meter.ohmsPerVolt());
    return needle && !Double.isNaN(rangeVolts)
        ? meter.ohmsPerVolt() * rangeVolts
        : meter.inputOhms(volts);
  }
}
