package railwalk.device;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.List;
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
    assertThat(file.likeSections()).containsExactly(new LikeSections("triode", List.of("")));
  }

  private static final String UNLIKE =
      """
      type     DEMO
      summary  triode and beam tube for a test
      base     8XX octal
      heater   6.3V 0.3A
      section  T triode
      section  P beam
      pin      cap T grid
      pin      1 T plate
      pin      2 heater1
      pin      3 P plate
      pin      4 P screen
      pin      5 P grid
      pin      6 P screen
      pin      7 heater2
      pin      8 cathode
      strap    4 6
      caution  the halves stand the other way round in one maker's sheet
      unlike   OTHER heater 12.6 V
      rating   section=T system=design-centre plate=300V
      rating   section=P system=design-maximum plate=400V screen=300V
      spread   0.70 1.30 section=T
      spread   0.80 1.20 section=P
      source   s1 made up
      point    section=P plate=250V screen=250V grid=-12V current=45mA source=s1 \
      provenance=memory confidence=high
      point    section=T plate=250V grid=-2V current=1.2mA source=s1 provenance=memory \
      confidence=high
      fit      triode mu=100 exponent=1.4 kg=1060 kp=600 kvb=300 contact=0 gridperveance=5e-4 \
      gridstart=-0.1 gridslope=0.1
      fit      beam mu=10 exponent=1.4 kg=1060 kp=40 kvb=300 contact=0 lambda=20 knee=0.07 \
      screenshare=0.02 screenrise=0.2 gridperveance=5e-4 gridstart=-0.1 gridslope=0.1
      residual section=P point=1 current=+0.1%
      residual section=T point=2 current=-0.2%
      """;

  @Test
  void unlikeSectionsHaveFiguresOfTheirOwn() {
    DataFile file = read(UNLIKE);
    TubeType type = file.type();
    SectionType triode = type.section("T").orElseThrow();
    SectionType beam = type.section("P").orElseThrow();
    assertThat(triode.law()).isInstanceOf(TriodeLaw.class);
    assertThat(beam.law()).isInstanceOf(PentodeLaw.class);
    assertThat(triode.ratings().plateVoltsMax()).isEqualTo(300);
    assertThat(beam.ratings().screenVoltsMax()).isEqualTo(300);
    assertThat(triode.spreadLow()).isEqualTo(0.7);
    assertThat(beam.spreadHigh()).isEqualTo(1.2);
    assertThat(type.pinsOf("T", Electrode.GRID)).containsExactly(0);
    assertThat(type.pinsOf("P", Electrode.SCREEN)).containsExactly(4, 6);
    assertThat(type.pinsOf("T", Electrode.CATHODE)).containsExactly(8);
    assertThat(type.care().straps()).containsExactly(List.of(4, 6));
    assertThat(type.care().cautions()).hasSize(1);
    assertThat(type.care().lookAlikes())
        .containsExactly(new TubeType.LookAlike("OTHER", "heater 12.6 V"));
    List<LikeSections> groups = file.likeSections();
    assertThat(groups).extracting(LikeSections::first).containsExactly("T", "P");
    assertThat(file.points(groups.get(0)).get(0).published().plateAmps()).isEqualTo(1.2e-3);
    assertThat(file.points(groups.get(1)).get(0).published().plateAmps()).isEqualTo(45e-3);
  }

  /** Two sections of one kind share a law until a point names one of them. */
  @Test
  void twinsAreAlikeUnlessAPointSaysOtherwise() {
    String twin =
        GOOD.replace("section  triode", "section  A triode\nsection  B triode")
            .replaceAll("(?m)^pin .*\n", "pins none\n")
            .replaceFirst("pins none\npins none\npins none", "pins     none");
    assertThat(read(twin).type().pins()).isEmpty();
    assertThat(read(twin).likeSections())
        .containsExactly(new LikeSections("triode", List.of("A", "B")));
    DataFile unlike =
        read(
            twin.replace("point    plate", "point    section=A plate")
                .replace("fit      triode mu=100", "fit      triode section=A mu=100")
                .concat(
                    "fit triode section=B mu=20 exponent=1.4 kg=1060 kp=80 kvb=300 contact=0"
                        + " gridperveance=5e-4 gridstart=-0.1 gridslope=0.1\n"));
    assertThat(unlike.likeSections()).hasSize(2);
    assertThat(((TriodeLaw) unlike.type().section("B").orElseThrow().law()).mu()).isEqualTo(20);
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "point    section=P|point    section=X|no section X",
        "point    section=P|point    |point 1 is another section's",
        "rating   section=T|rating   section=P|a second rating for the same section",
        "rating   section=T|rating   section=Q|no section Q",
        "spread   0.70 1.30 section=T||no spread line for section T",
        "spread   0.70 1.30|spread   1.10 1.30|does not straddle 1",
        "fit      triode|fit      triode section=P|no fit line for this triode section",
        "fit      beam|fit      pentode|no fit line for this beam section",
        "T point=2|P point=2|point 2 is another section's",
        "T point=2|T point=3|no point 3",
        "T point=2|T point=1|no point 1, or a second line for it",
        "residual section=T point=2 current=-0.2%||points without a residual line",
        "point=2 current=-0.2%|point=2 gm=-0.2%|point 2 publishes no gm",
        "screen=250V grid=-12V|grid=-12V|the screen volts are missing",
        "screen=250V grid=-12V|screen=250V connection=triode grid=-12V|has no volts of its own",
        "plate=250V grid=-2V|plate=250V|neither grid volts nor a cathode resistor",
        "plate=250V grid=-2V|plate=250V screen=90V grid=-2V|a triode has no screen",
        "plate=250V grid=-2V|plate=-250V grid=-2V|draw nothing",
        "pin      cap T grid|pin      5 T grid|pin 5 stands twice",
        "pin      cap T grid||no pin leads to the grid of section T",
        "pin      8 cathode||no pin leads to the cathode of section T",
        "pin      1 T plate|pin      1 T screen|has a screen",
        "strap    4 6|strap    4 9|pin 9 leads nowhere",
        "strap    4 6|pins     none|pins says none"
      })
  void unlikeSectionsThatDoNotAgree(String good, String bad, String message) {
    assertThat(UNLIKE).contains(good);
    String text = UNLIKE.replace(good, bad == null ? "" : bad);
    assertThatThrownBy(
            () -> {
              DataFile file = read(text);
              file.type();
              file.points();
            })
        .isInstanceOf(DataFileException.class)
        .hasMessageStartingWith("demo.tube:")
        .hasMessageContaining(message);
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
  void aPointOfUnlikeSectionsNamesItsOwn() {
    assertThatThrownBy(() -> read(UNLIKE.replace("point    section=P", "point    ")).points())
        .hasMessageContaining("the type has unlike sections: which one is meant?");
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
