package railwalk.device;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** The catalogue: names, pins, heaters, ratings. Laws have tests of their own. */
class CatalogueTest {
  private final Catalogue catalogue = Catalogue.standard();

  @Test
  void everyFileReadsAndTheIndexAgreesWithIt() {
    assertThat(catalogue.types())
        .extracting(TubeType::name)
        .contains(
            "12AX7", "12AT7", "12AU7", "12AY7", "6SN7GT", "6SL7GT", "6AV6", "12AV6", "EF86", "6SJ7")
        .contains("6V6GT", "6L6GC", "5881", "EL84", "EL34", "KT66", "50C5", "KT88")
        .contains("5Y3GT", "GZ34", "EZ80", "EZ81", "6X4", "5U4GB", "35W4", "0A2", "0B2");
    ResourceCatalogue resources = (ResourceCatalogue) catalogue;
    for (TubeType type : catalogue.types()) {
      assertThat(resources.namesOf(type.name()))
          .as(type.name())
          .containsExactlyElementsOf(type.aliases());
      assertThat(catalogue.file(type.name()).orElseThrow().points()).isNotNull();
      assertThat(type.summary()).isNotBlank();
    }
  }

  /** Same tube under another number: sheets of both names print the same data. */
  @ParameterizedTest
  @CsvSource({
    "ECC83,12AX7",
    "7025,12AX7",
    "ecc81,12AT7",
    "ECC82,12AU7",
    "6072,12AY7",
    "6BQ5,EL84",
    "6CA7,EL34",
    "5AR4,GZ34",
    "6CA4,EZ81",
    "6V4,EZ80",
    "EZ90,6X4",
    "6267,EF86",
    "EBC91,6AV6",
    "6L6WGB,5881",
    "7247,12DW7",
    "ECC832,12DW7",
    "6FQ7,6CG7",
    "ECC88,6DJ8",
    "6922,E88CC",
    "6AQ8,ECC85",
    "6080,6AS7G",
    "EBC90,6AT6",
    "ECC91,6J6",
    "EF94,6AU6",
    "EF93,6BA6",
    "5654,6AK5",
    "6BX6,EF80",
    "ECF82,6U8A",
    "6BL8,ECF80",
    "6BM8,ECL82",
    "6GW8,ECL86",
    "6L6G,6L6",
    "6CW5,EL86",
    "EL90,6AQ5A",
    "6DL5,EL95",
    "OA2,0A2",
    "ob2,0B2"
  })
  void aliases(String alias, String name) {
    assertThat(catalogue.find(alias).orElseThrow().name()).isEqualTo(name);
  }

  @ParameterizedTest
  @CsvSource({
    "12AX7A,12AX7",
    "12ax7wa,12AX7",
    "12AX7_JJ,12AX7",
    "ECC83S,12AX7",
    "12AU7A,12AU7",
    "6V6GTA,6V6GT",
    "6V6,6V6GT",
    "6V6G,6V6GT",
    "6V6-GT,6V6GT",
    "5881WXT,5881",
    "6SN7GTB,6SN7GT",
    "6SN7,6SN7GT",
    "5Y3,5Y3GT",
    "6L6-GC,6L6GC",
    "EL34B,EL34",
    "KT88_new,KT88",
    "6L6GC_x,6L6GC",
    "6SJ7GT,6SJ7",
    "6sl7,6SL7GT"
  })
  void suffixesThatTellAnIssueOrABulbAreStripped(String typed, String name) {
    assertThat(catalogue.find(typed).orElseThrow().name()).isEqualTo(name);
  }

  /** RCA Receiving Tube Manual RC-30 and the makers' sheets named in the data files. */
  @Test
  void theCatalogueIsWide() {
    List<TubeType> amplifying =
        catalogue.types().stream()
            .filter(t -> t.sections().stream().anyMatch(s -> s.law() instanceof AmplifierLaw))
            .toList();
    long electrodesOnly = amplifying.stream().filter(t -> t.pins().isEmpty()).count();
    System.out.printf(
        "%d amplifying types, %d of them by electrode only%n", amplifying.size(), electrodesOnly);
    assertThat(amplifying).hasSizeGreaterThanOrEqualTo(90);
    assertThat(amplifying)
        .filteredOn(t -> List.of("300B", "2A3", "45", "6B4G").contains(t.name()))
        .hasSize(4)
        .allMatch(t -> t.heater().directlyHeated() && t.pinsOf("", Electrode.CATHODE).isEmpty());
    assertThat(amplifying)
        .filteredOn(t -> t.sections().size() == 2)
        .filteredOn(t -> t.section("P").isPresent())
        .hasSizeGreaterThanOrEqualTo(7)
        .allMatch(t -> !t.sections().get(0).law().equals(t.sections().get(1).law()));
  }

  @Test
  void whatToMindAboutPinsAndLookAlikes() {
    assertThat(catalogue.find("12DW7").orElseThrow().care().cautions()).hasSize(1);
    assertThat(catalogue.find("7591").orElseThrow().care().straps()).containsExactly(List.of(4, 8));
    assertThat(catalogue.find("12AX7").orElseThrow().care().lookAlikes())
        .extracting(TubeType.LookAlike::type)
        .contains("6DJ8", "6CG7", "6N1P");
    assertThat(catalogue.find("6L6GC").orElseThrow().care().lookAlikes())
        .extracting(TubeType.LookAlike::type)
        .contains("7027A");
    assertThat(catalogue.find("6DJ8").orElseThrow().pins())
        .containsEntry(9, new PinUse(PinUse.Role.SHIELD, "", null));
    assertThat(catalogue.find("7027A").orElseThrow().pins()).isEmpty();
  }

  /** Other tubes than the catalogue's, though the names look alike. */
  @ParameterizedTest
  @ValueSource(strings = {"5U4", "12AX8", "7189A", "7027", "EL8", "GZ3", "", "12", "X"})
  void otherTubesAreNotFound(String typed) {
    assertThat(catalogue.find(typed)).isEmpty();
  }

  @Test
  void nearNames() {
    assertThat(catalogue.near("12AX8")).hasSize(3).startsWith("12AX7");
    assertThat(catalogue.near("EL48")).contains("EL84");
    assertThat(catalogue.near("6L6GX")).contains("6L6GC");
    assertThat(catalogue.near("5U4")).contains("5U4G");
    assertThat(catalogue.near("2N3055XYZ")).isEmpty();
  }

  /** Socket pins, plate to cathode, checked against makers' basing diagrams. */
  @ParameterizedTest
  @CsvSource({
    "12AX7,A,1,2,3", "12AX7,B,6,7,8", "12AU7,B,6,7,8", "6SN7GT,A,2,1,3", "6SN7GT,B,5,4,6",
    "6SL7GT,A,2,1,3", "6AV6,T,7,1,2", "12AV6,T,7,1,2", "EF86,'',6,9,3", "6SJ7,'',8,4,5",
    "6V6GT,'',3,5,8", "6L6GC,'',3,5,8", "EL84,'',7,2,3", "EL34,'',3,5,8", "KT88,'',3,5,8",
    "12DW7,A,1,2,3", "12DW7,B,6,7,8", "6CG7,A,1,2,3", "6DJ8,B,6,7,8", "5687,A,1,2,3",
    "5687,B,9,7,6", "6AS7G,A,2,1,3", "6SC7,A,2,3,6", "6SC7,B,5,4,6", "6J5GT,'',3,5,8",
    "6SQ7,T,6,2,3", "6J6,A,1,6,7", "6J6,B,2,5,7", "6AU6,'',5,1,7", "5879,'',8,1,3",
    "7199,T,1,9,8", "7199,P,2,7,6", "6AN8,T,1,2,3", "6AN8,P,6,8,9", "6U8A,P,6,2,7",
    "ECF80,T,1,9,8", "ECL82,T,9,1,8", "ECL82,P,6,3,2", "ECL86,T,9,1,2", "ECL86,P,6,8,7",
    "EL41,'',2,6,7", "7591,'',3,6,5"
  })
  void pins(String name, String section, int plate, int grid, int cathode) {
    TubeType type = catalogue.find(name).orElseThrow();
    assertThat(type.pinsOf(section, Electrode.PLATE)).containsExactly(plate);
    assertThat(type.pinsOf(section, Electrode.GRID)).containsExactly(grid);
    assertThat(type.pinsOf(section, Electrode.CATHODE)).containsExactly(cathode);
  }

  @Test
  void pinsWithAStoryOfTheirOwn() {
    TubeType beam = catalogue.find("50C5").orElseThrow();
    assertThat(beam.pinsOf("", Electrode.GRID)).containsExactly(2, 5);
    TubeType regulator = catalogue.find("0A2").orElseThrow();
    assertThat(regulator.pinsOf("", Electrode.PLATE)).containsExactly(1, 5);
    assertThat(regulator.pinsOf("", Electrode.CATHODE)).containsExactly(2, 4, 7);
    TubeType detector = catalogue.find("12AV6").orElseThrow();
    assertThat(detector.pinsOf("D", Electrode.DIODE1)).containsExactly(6);
    assertThat(detector.pinsOf("D", Electrode.CATHODE)).containsExactly(2);
    assertThat(catalogue.find("KT88").orElseThrow().pins())
        .containsEntry(1, new PinUse(PinUse.Role.SLEEVE, "", null));
    assertThat(catalogue.find("EL84").orElseThrow().pins())
        .containsEntry(1, new PinUse(PinUse.Role.INTERNAL, "", null));
    assertThat(catalogue.find("6V6GT").orElseThrow().pins())
        .containsEntry(6, new PinUse(PinUse.Role.EMPTY, "", null));
  }

  /** Pins that a sheet leaves out, or that a base lacks, need not be listed. */
  @Test
  void noPinIsBeyondItsSocket() {
    Map<String, Integer> terminals =
        Map.of("noval", 9, "octal", 8, "miniature-7", 7, "rimlock", 8, "UX4", 4);
    for (TubeType type : catalogue.types()) {
      int count = terminals.getOrDefault(type.family(), 0);
      assertThat(type.pins().keySet()).as(type.name()).allMatch(pin -> pin <= count);
    }
  }

  @Test
  void heaters() {
    Heater twin = catalogue.find("12AX7").orElseThrow().heater();
    assertThat(twin.connections())
        .containsExactly(new Heater.Connection(12.6, 0.15), new Heater.Connection(6.3, 0.3));
    assertThat(twin.tapVolts()).isEqualTo(6.3);
    assertThat(catalogue.find("35W4").orElseThrow().heater().tapVolts()).isEqualTo(7.5);
    assertThat(catalogue.find("12AV6").orElseThrow().heater().connections())
        .containsExactly(new Heater.Connection(12.6, 0.15));
    assertThat(catalogue.find("5Y3GT").orElseThrow().heater().directlyHeated()).isTrue();
    assertThat(catalogue.find("5U4GB").orElseThrow().heater().directlyHeated()).isTrue();
    Heater joined = catalogue.find("GZ34").orElseThrow().heater();
    assertThat(joined.cathodeJoined()).isTrue();
    assertThat(joined.directlyHeated()).isFalse();
    assertThat(catalogue.find("0A2").orElseThrow().heater().connections()).isEmpty();
  }

  @Test
  void aTypeLikeAnotherTakesItsPinsAndLaw() {
    TubeType six = catalogue.find("6AV6").orElseThrow();
    TubeType twelve = catalogue.find("12AV6").orElseThrow();
    assertThat(twelve.pins()).isEqualTo(six.pins());
    assertThat(twelve.sections()).isEqualTo(six.sections());
    assertThat(twelve.aliases()).isEmpty();
    assertThat(catalogue.file("12AV6").orElseThrow().borrowsLaw()).isTrue();
  }

  @Test
  void ratings() {
    SectionType output = catalogue.find("6L6GC").orElseThrow().sections().get(0);
    assertThat(output.ratings().system()).isEqualTo("design-maximum");
    assertThat(output.ratings().plateWattsMax()).isEqualTo(30);
    assertThat(output.ratings().gridLeakFixedBiasOhmsMax()).isEqualTo(100_000);
    assertThat(List.of(output.spreadLow(), output.spreadHigh())).containsExactly(0.70, 1.30);
    SectionType rectifier = catalogue.find("5Y3GT").orElseThrow().sections().get(0);
    assertThat(rectifier.rectifierRatings().peakInverseVoltsMax()).isEqualTo(1400);
    assertThat(rectifier.rectifierRatings().firstCapacitorFaradsMax()).isEqualTo(20e-6);
  }

  @Test
  void regulatorsStandAtTheirVolts() {
    // RCA 0A2: 151 V at mid current, 2 V over 5 to 30 mA.
    GasLaw law = (GasLaw) catalogue.find("0A2").orElseThrow().sections().get(0).law();
    TwoPoleCurrent out = new TwoPoleCurrent();
    law.lit().evaluate(151, out);
    assertThat(out.amps).isBetween(0.0174, 0.0176);
    law.lit().evaluate(152, out);
    assertThat(out.amps).isBetween(0.0299, 0.0301);
  }

  /** Rectifier tubes and gas tubes: enough of them, and what each is easily taken for. */
  @Test
  void rectifiersAndRegulators() {
    List<String> rectifiers = namesOf(SectionKind.RECTIFIER);
    List<String> regulators = namesOf(SectionKind.REGULATOR);
    System.out.println(rectifiers.size() + " rectifiers " + rectifiers);
    System.out.println(regulators.size() + " regulators " + regulators);
    assertThat(rectifiers).hasSizeGreaterThanOrEqualTo(24);
    assertThat(regulators)
        .contains("0A2", "0B2", "0C2", "0A3", "0B3", "0C3", "0D3", "5651", "85A2");
    assertThat(catalogue.find("VR150").orElseThrow().name()).isEqualTo("0D3");
    assertThat(catalogue.find("0G3").orElseThrow().name()).isEqualTo("85A2");
    assertThat(catalogue.find("GZ32").orElseThrow().name()).isEqualTo("GZ32");
    assertThat(catalogue.find("12X4").orElseThrow().heater().connections())
        .containsExactly(new Heater.Connection(12.6, 0.3));
    assertThat(lookAlikes("5V4G")).contains("GZ32");
    assertThat(lookAlikes("80")).contains("5Y3GT", "83", "5Z3");
    assertThat(catalogue.find("35Z5GT").orElseThrow().heater().tapVolts()).isEqualTo(7.5);
    assertThat(catalogue.find("35Z5GT").orElseThrow().pins()).isEmpty();
  }

  private List<String> namesOf(SectionKind kind) {
    return catalogue.types().stream()
        .filter(type -> type.sections().get(0).kind() == kind)
        .map(TubeType::name)
        .toList();
  }

  private List<String> lookAlikes(String name) {
    return catalogue.find(name).orElseThrow().care().lookAlikes().stream()
        .map(TubeType.LookAlike::type)
        .toList();
  }

  /** RCA 83: 15 V at 225 mA a plate, nearly whatever the current. */
  @Test
  void mercuryVapourDropsTheSameAtAnyCurrent() {
    VapourLaw law = (VapourLaw) catalogue.find("83").orElseThrow().sections().get(0).law();
    TwoPoleCurrent out = new TwoPoleCurrent();
    for (double amps : new double[] {0.03, 0.1, 0.225, 0.5, 1}) {
      law.evaluate(law.volts(amps), out);
      assertThat(out.amps).isCloseTo(amps, within(1e-9));
      assertThat(law.volts(amps)).isBetween(14.0, 16.7);
    }
    assertThat(law.volts(0.225)).isCloseTo(15, within(1e-9));
  }

  /** RCA RC-30: pins 3 and 7 of the octal regulators are joined inside and nothing else. */
  @Test
  void jumpersOfTheOctalRegulators() {
    TubeType regulator = catalogue.find("0D3").orElseThrow();
    assertThat(regulator.pins()).containsEntry(3, new PinUse(PinUse.Role.INTERNAL, "jumper", null));
    assertThat(regulator.pins()).containsEntry(7, new PinUse(PinUse.Role.INTERNAL, "jumper", null));
  }
}
