package railwalk.device;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import railwalk.source.SourceText;

/** A data file that contradicts itself says so, with the place. */
class DataFileTest {
  private static final String GOOD =
      """
      type     DEMO
      summary  triode for a test
      base     9A noval
      heater   6.3V 0.3A
      section  triode
      pin      1 plate
      pin      2 grid
      pin      3 cathode
      rating   system=design-centre plate=300V platewatts=1W
      spread   0.70 1.30
      source   s1 made up
      point    plate=250V grid=-2V current=1.2mA gm=1.6mS mu=100 rp=62.5k source=s1 \
      provenance=memory confidence=high
      fit      triode mu=100 exponent=1.4 kg=1060 kp=600 kvb=300 contact=0 gridperveance=5e-4 \
      gridstart=-0.1 gridslope=0.1
      """;

  @Test
  void readsWhatItHolds() {
    DataFile file = read(GOOD);
    TubeType type = file.type();
    assertThat(type.name()).isEqualTo("DEMO");
    assertThat(type.sections().get(0).ratings().plateWattsMax()).isEqualTo(1);
    PublishedPoint point = file.points().get(0);
    assertThat(point.published().plateAmps()).isEqualTo(1.2e-3);
    assertThat(point.published().plateOhms()).isEqualTo(62_500);
    assertThat(point.credit().source()).isEqualTo("made up");
    assertThat(file.curves()).containsExactly("triode");
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "pin      3 cathode|pin      2 cathode|demo.tube:8:10|pin 2 stands twice",
        "plate=300V platewatts|plate=-300V platewatts|demo.tube:9:31|makes no sense",
        "plate=300V platewatts|plate=lots platewatts|demo.tube:9:31|lots is not a voltage",
        "plate=300V platewatts|plate=300W platewatts|demo.tube:9:31|300W is not a voltage",
        "plate=300V platewatts|plates=300V platewatts|demo.tube:9:31|unknown word plates=",
        "system=design-centre||demo.tube:9:1|rating system is missing",
        "spread   0.70|width    0.70|demo.tube:10:1|unknown key word width",
        "mu=100 rp|mu=60 rp|demo.tube:12:53|differ by more than 15 %",
        "source=s1|source=s2|demo.tube:12:69|source is not listed",
        "confidence=high|confidence=low|demo.tube:12:97|confidence= must be given",
        "current=1.2mA||demo.tube:12:1|has no current",
        "kg=1060|kg=0|demo.tube:13:37|a constant of 0 makes no sense",
        "kg=1060||demo.tube:13:1|kg= is missing",
        "fit      triode|fit      beam|demo.tube:5:1|no fit line for this triode section",
        "section  triode|section  hexode|demo.tube:5:1|no such kind of section: hexode",
        "pin      2 grid|pin      2 gird|demo.tube:7:1|no electrode is called gird",
        "pin      2 grid|pin      2 Z grid|demo.tube:7:12|no section Z",
        "heater   6.3V 0.3A|heater   6.3V|demo.tube:4:1|something is missing after heater",
        "summary  triode|type triode|demo.tube:2:1|type stands twice",
        "base     9A noval||demo.tube:1:1|the file has no base line"
      })
  void aContradictionIsNamedWithItsPlace(String good, String bad, String place, String message) {
    assertThat(GOOD).contains(good);
    String text = GOOD.replace(good, bad == null ? "" : bad);
    assertThatThrownBy(
            () -> {
              DataFile file = read(text);
              file.type();
              file.points();
            })
        .isInstanceOf(DataFileException.class)
        .hasMessageStartingWith(place + ": error[tube-data]")
        .hasMessageContaining(message);
  }

  @Test
  void anEmptyFile() {
    assertThatThrownBy(() -> read("# nothing\n").type()).hasMessageContaining("the file is empty");
  }

  private static DataFile read(String text) {
    return DataFile.read(
        SourceText.of("demo.tube", text),
        name -> {
          throw new IllegalArgumentException(name);
        });
  }
}
