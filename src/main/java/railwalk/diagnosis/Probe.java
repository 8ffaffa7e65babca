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
  /** Returns the place of a reading. */
  static Probe of(Reading reading) {
    return new Probe(
        reading.point(), reading.at(), reading.kind(), reading.state(), reading.rangeVolts());
  }

  /**
   * Returns this place with its range settled where the sheet does not give it: the one on which
   * the chart has the point read, or the lowest that holds the reading when it does not fit there.
   */
  Probe onRange(Meter meter, double expectedVolts, double reading) {
    double expected = Double.isNaN(expectedVolts) ? reading : expectedVolts;
    double range = meter.rangeFor(Math.max(Math.abs(expected), Math.abs(reading)));
    return Double.isNaN(rangeVolts) ? new Probe(name, at, kind, state, range) : this;
  }

  /** Returns the meter's input resistance when this place stands at {@code volts}. */
  double meterOhms(Meter meter, double volts) {
    boolean needle = !Double.isNaN(meter.ohmsPerVolt());
    return needle && !Double.isNaN(rangeVolts)
        ? meter.ohmsPerVolt() * rangeVolts
        : meter.inputOhms(volts);
  }
}
