package railwalk.units;

/** What a written number measures; it decides how the letters after the digits are read. */
public enum Measure {
  RESISTANCE("a resistance", "4k7", "ohm"),
  CAPACITANCE("a capacitance", "20u", "farad"),
  INDUCTANCE("an inductance", "10H", "henry"),
  VOLTAGE("a voltage", "450V", "volt"),
  CURRENT("a current", "150mA", "ampere"),
  CONDUCTANCE("a conductance", "1.6mS", "siemens"),
  POWER("a power", "1/2W", "watt"),
  FREQUENCY("a frequency", "60Hz", "hertz"),
  SHARE("a share or percentage", "40%", "per cent"),
  /** A plain number in an expression or a parameter: the SPICE rule holds for its letters. */
  NUMBER("a number", "4.7k", "");

  private final String words;
  private final String example;
  private final String unit;

  Measure(String words, String example, String unit) {
    this.words = words;
    this.example = example;
    this.unit = unit;
  }

  /** Returns it in words with the article, for messages. */
  public String words() {
    return words;
  }

  /** Returns how such a value may be written. */
  public String example() {
    return example;
  }

  /** Returns the unit's name; empty for a plain number. */
  public String unit() {
    return unit;
  }
}
