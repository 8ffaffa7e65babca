package railwalk.units;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import railwalk.units.ValueReading.Refusal;
import railwalk.units.ValueReading.Refused;
import railwalk.units.ValueReading.Remark;
import railwalk.units.ValueReading.Value;

class ValueReaderTest {
  private static double amount(String text, Measure measure) {
    ValueReading reading = ValueReader.read(text, measure);
    assertThat(reading).as("%s as %s", text, measure).isInstanceOf(Value.class);
    return ((Value) reading).amount();
  }

  private static Refused refused(String text, Measure measure) {
    ValueReading reading = ValueReader.read(text, measure);
    assertThat(reading).as("%s as %s", text, measure).isInstanceOf(Refused.class);
    return (Refused) reading;
  }

  /** The examples of IEC 60062, marking codes for resistance values (from memory of its table). */
  @ParameterizedTest
  @CsvSource({
    "R10, 0.10",
    "R15, 0.15",
    "R332, 0.332",
    "1R0, 1",
    "1R5, 1.5",
    "3R32, 3.32",
    "10R, 10",
    "33R2, 33.2",
    "590R, 590",
    "1K0, 1e3",
    "3K32, 3320",
    "10K, 10e3",
    "33K2, 33200",
    "100K, 100e3",
    "1M0, 1e6",
    "3M32, 3.32e6",
    "10M, 10e6",
    "332M, 332e6",
    "1G0, 1e9",
    "3G32, 3.32e9",
    "1T0, 1e12"
  })
  void readsTheResistanceCodesOfTheStandard(String code, double ohms) {
    assertThat(amount(code, Measure.RESISTANCE)).isEqualTo(ohms);
  }

  /** The examples of IEC 60062, marking codes for capacitance values (from memory of its table). */
  @ParameterizedTest
  @CsvSource({
    "p10, 0.10e-12",
    "p332, 0.332e-12",
    "1p0, 1e-12",
    "3p32, 3.32e-12",
    "10p, 10e-12",
    "100p, 100e-12",
    "1n0, 1e-9",
    "33n2, 33.2e-9",
    "100n, 100e-9",
    "1µ0, 1e-6",
    "3μ32, 3.32e-6",
    "10µ, 10e-6",
    "1m0, 1e-3",
    "10m, 10e-3"
  })
  void readsTheCapacitanceCodesOfTheStandard(String code, double farads) {
    assertThat(amount(code, Measure.CAPACITANCE)).isEqualTo(farads);
  }

  /** IEC 60062 tolerance letters: F 1 %, G 2 %, J 5 %, K 10 %, M 20 %. */
  @ParameterizedTest
  @CsvSource({"4K7F, 0.01", "4K7G, 0.02", "4k7J, 0.05", "100RK, 0.10", "2M2M, 0.20"})
  void readsTheToleranceLetter(String code, double tolerance) {
    assertThat(((Value) ValueReader.read(code, Measure.RESISTANCE)).tolerance())
        .isEqualTo(tolerance);
  }

  @ParameterizedTest
  @CsvSource({
    "100k, RESISTANCE, 100e3",
    "1kohm, RESISTANCE, 1e3",
    "4.7kΩ, RESISTANCE, 4700",
    "2.2Meg, RESISTANCE, 2.2e6",
    "1MEG, RESISTANCE, 1e6",
    "2.2megohm, RESISTANCE, 2.2e6",
    "11Mohm, RESISTANCE, 11e6",
    "470, RESISTANCE, 470",
    "1e5, RESISTANCE, 1e5",
    "1.5E+3, RESISTANCE, 1500",
    "20uF, CAPACITANCE, 20e-6",
    ".047u, CAPACITANCE, .047e-6",
    "470p, CAPACITANCE, 470e-12",
    "0.022UF, CAPACITANCE, 0.022e-6",
    "50H, INDUCTANCE, 50",
    "10, INDUCTANCE, 10",
    "5Hy, INDUCTANCE, 5",
    "20mH, INDUCTANCE, 20e-3",
    "450V, VOLTAGE, 450",
    "450WVDC, VOLTAGE, 450",
    "6.3Vac, VOLTAGE, 6.3",
    "1.2kV, VOLTAGE, 1200",
    "5V1, VOLTAGE, 5.1",
    "−45, VOLTAGE, -45",
    "90mA, CURRENT, 0.09",
    "500MA, CURRENT, 0.5",
    "2A, CURRENT, 2",
    "2W, POWER, 2",
    "1/2W, POWER, 0.5",
    "1/4watt, POWER, 0.25",
    "3/8A, CURRENT, 0.375",
    "1-1/2A, CURRENT, 1.5",
    "500mW, POWER, 0.5",
    "5%, SHARE, 0.05",
    "±10%, SHARE, 0.10",
    "+-10%, SHARE, 0.10",
    "0.4, SHARE, 0.4",
    "60Hz, FREQUENCY, 60",
    "60cps, FREQUENCY, 60",
    "1M, NUMBER, 1e-3",
    "3meg, NUMBER, 3e6",
    "10f, NUMBER, 10e-15",
    "2t, NUMBER, 2e12",
    "4k7, NUMBER, 4700"
  })
  void readsSuffixesAndUnits(String text, Measure measure, double expected) {
    assertThat(amount(text, measure)).isCloseTo(expected, within(Math.abs(expected) * 1e-15));
  }

  /** Old capacitors: MFD is microfarad, MMF and UUF micromicrofarad, today's picofarad. */
  @ParameterizedTest
  @CsvSource({
    "20mfd, 20e-6, OLD_MARK_IS_MICRO",
    ".02MFD, .02e-6, OLD_MARK_IS_MICRO",
    "8mf, 8e-6, OLD_MARK_IS_MICRO",
    "250mmf, 250e-12, OLD_MARK_IS_PICO",
    "250mmfd, 250e-12, OLD_MARK_IS_PICO",
    "100uuF, 100e-12, OLD_MARK_IS_PICO"
  })
  void readsTheMarksOfOldCapacitors(String text, double farads, Remark remark) {
    Value value = (Value) ValueReader.read(text, Measure.CAPACITANCE);
    assertThat(value.amount()).isEqualTo(farads);
    assertThat(value.remarks()).containsExactly(remark);
  }

  @Test
  void ohmsTakeCapitalMForMegaAndRefuseSmallM() {
    Value mega = (Value) ValueReader.read("1M", Measure.RESISTANCE);
    assertThat(mega.amount()).isEqualTo(1e6);
    assertThat(mega.remarks()).containsExactly(Remark.CAPITAL_M_IS_MEGA);
    Refused milli = refused("1m", Measure.RESISTANCE);
    assertThat(milli.reason()).isEqualTo(Refusal.SMALL_M_ON_RESISTANCE);
    assertThat(milli.hint()).isEqualTo("1M for megohm, 0.001 if you mean a milliohm");
    assertThat(refused("2m2", Measure.RESISTANCE).hint()).isEqualTo("2M2");
    assertThat(refused("1mΩ", Measure.RESISTANCE).reason())
        .isEqualTo(Refusal.SMALL_M_ON_RESISTANCE);
  }

  @Test
  void bareCapacitancesAboveAMillifaradAreRefused() {
    assertThat(refused("20", Measure.CAPACITANCE).hint())
        .isEqualTo("20u for microfarad, 20p for picofarad");
    assertThat(refused(".02", Measure.CAPACITANCE).reason()).isEqualTo(Refusal.BARE_CAPACITANCE);
    assertThat(refused("20F", Measure.CAPACITANCE).reason()).isEqualTo(Refusal.BARE_CAPACITANCE);
    assertThat(amount("2e-5", Measure.CAPACITANCE)).isEqualTo(2e-5);
    assertThat(((Value) ValueReader.read(".001", Measure.CAPACITANCE)).remarks())
        .containsExactly(Remark.BARE_FARADS);
    assertThat(((Value) ValueReader.read("20m", Measure.CAPACITANCE)).remarks())
        .containsExactly(Remark.MILLIFARAD);
  }

  @ParameterizedTest
  @CsvSource({
    "1OOk, RESISTANCE, LETTER_FOR_DIGIT",
    "l00k, RESISTANCE, LETTER_FOR_DIGIT",
    "10l, RESISTANCE, LETTER_FOR_DIGIT",
    "450V, RESISTANCE, WRONG_UNIT",
    "10uF, RESISTANCE, WRONG_UNIT",
    "4k7, CAPACITANCE, NOT_A_NUMBER",
    "abc, RESISTANCE, NOT_A_NUMBER",
    "lol, RESISTANCE, NOT_A_NUMBER",
    "'', RESISTANCE, NOT_A_NUMBER",
    "1..2, RESISTANCE, NOT_A_NUMBER",
    "1/0W, POWER, NOT_A_NUMBER",
    "1/2W, CURRENT, WRONG_UNIT",
    "1M5, NUMBER, M_CODE_IN_EXPRESSION",
    "1e999, NUMBER, OUT_OF_RANGE",
    "1e9999, NUMBER, NOT_A_NUMBER",
    "?, RESISTANCE, NOT_A_NUMBER"
  })
  void refusesWhatCannotBeMeant(String text, Measure measure, Refusal reason) {
    assertThat(refused(text, measure).reason()).isEqualTo(reason);
  }

  @Test
  void lettersThatAreNoUnitAreRemarkedOn() {
    Value value = (Value) ValueReader.read("10kfoo", Measure.RESISTANCE);
    assertThat(value.amount()).isEqualTo(10e3);
    assertThat(value.remarks()).containsExactly(Remark.LETTERS_IGNORED);
  }

  @ParameterizedTest
  @CsvSource({"450V, VOLTAGE", "1/2W, POWER", "5%, SHARE", "90mA, CURRENT", "120ohm, RESISTANCE"})
  void tellsWhatAUnitMeasures(String text, Measure measure) {
    assertThat(ValueReader.statedMeasure(text)).contains(measure);
  }

  @Test
  void aBareNumberStatesNothing() {
    assertThat(ValueReader.statedMeasure("100k")).isEmpty();
    assertThat(ValueReader.statedMeasure("b+")).isEmpty();
  }
}
