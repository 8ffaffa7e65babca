package railwalk.netlist;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static railwalk.netlist.Reading.circuit;
import static railwalk.netlist.Reading.part;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import railwalk.circuit.Resistor;

class ExpressionsTest {
  private static double ohms(String value, String... more) {
    String[] lines = new String[more.length + 1];
    lines[0] = "R1 a b " + value;
    System.arraycopy(more, 0, lines, 1, more.length);
    return part(circuit(lines), "R1", Resistor.class).ohms();
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      quoteCharacter = '"',
      value = {
        "{1+2*3}|7",
        "{(1+2)*3}|9",
        "{2^3^2}|512",
        "{2**3}|8",
        "{-2^2+10}|6",
        "{100/2/5}|10",
        "{10-3-2}|5",
        "{2*-3+10}|4",
        "'2*50k'|100000",
        "{ 4k7 + 300 }|5000",
        "{1meg}|1000000",
        "{sqrt(16)}|4",
        "{exp(1)}|2.718281828459045",
        "{log(exp(2))}|2",
        "{ln(exp(2))}|2",
        "{log10(1000)}|3",
        "{abs(-7)}|7",
        "{min(3,1,2)}|1",
        "{max(3,1,2)}|3",
        "{int(3.9)}|3",
        "{pow(2,10)}|1024",
        "{sgn(-5)+2}|1",
        "{1e-3k}|1"
      })
  void reckonsAsOneWould(String expression, double expected) {
    assertThat(ohms(expression)).isCloseTo(expected, within(expected * 1e-12));
  }

  @Test
  void parametersMayBeDefinedBeforeOrAfterUse() {
    assertThat(ohms("{2*load}", ".param load={base+50k}", ".param base=25k")).isEqualTo(150e3);
    assertThat(ohms("load", ".PARAM Load=47k")).isEqualTo(47e3);
  }

  /** SPICE's rule inside braces: M is milli whatever its case. */
  @Test
  void insideBracesTheSpiceRuleHolds() {
    assertThat(ohms("{1000*1M}")).isEqualTo(1);
  }
}
