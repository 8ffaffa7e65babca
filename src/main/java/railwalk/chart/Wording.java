package railwalk.chart;

import railwalk.circuit.Line;
import railwalk.circuit.Words;
import railwalk.device.Electrode;
import railwalk.device.TubeType;
import railwalk.units.Quantity;

/** The chart's wording in one of the trade's two vocabularies. */
record Wording(Words words) {

  /** Returns {@code sentence} with the words in braces said in this vocabulary. */
  String say(String sentence) {
    return words.say(sentence);
  }

  /** Returns the line in a few words, for the head of a sheet. */
  String line(Line line) {
    return Quantity.volts(line.volts()) + say(" {line}, ") + Quantity.of(line.hertz(), "Hz");
  }

  /** Returns a type's summary, which data files give in American words. */
  String summary(TubeType type) {
    return say(type.summary().replaceAll("\\b(tubes?|plates?)\\b", "{$1}"));
  }

  /** Returns the name of an electrode. */
  String electrode(Electrode electrode) {
    return switch (electrode) {
      case PLATE -> say("{plate}");
      case PLATE1 -> say("{plate} 1");
      case PLATE2 -> say("{plate} 2");
      case DIODE1 -> "diode 1";
      case DIODE2 -> "diode 2";
      case HEATER1, HEATER2 -> "heater";
      case HEATER_TAP -> "heater tap";
      case SCREEN, SUPPRESSOR, GRID, CATHODE -> electrode.word();
    };
  }
}
