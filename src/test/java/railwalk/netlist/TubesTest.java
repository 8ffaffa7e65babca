package railwalk.netlist;

import static org.assertj.core.api.Assertions.assertThat;
import static railwalk.netlist.Reading.circuit;
import static railwalk.netlist.Reading.codes;
import static railwalk.netlist.Reading.names;
import static railwalk.netlist.Reading.part;
import static railwalk.netlist.Reading.read;

import java.util.List;
import java.util.Optional;
import java.util.TreeMap;
import org.junit.jupiter.api.Test;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Bottle;
import railwalk.circuit.Circuit;
import railwalk.circuit.Filament;
import railwalk.circuit.GlowLamp;
import railwalk.circuit.Inductor;
import railwalk.circuit.RectifierSection;
import railwalk.circuit.RegulatorSection;
import railwalk.circuit.StandIn;
import railwalk.circuit.VoltageSource;
import railwalk.circuit.Wire;
import railwalk.device.Catalogue;
import railwalk.device.DataFile;
import railwalk.device.Electrode;
import railwalk.device.SectionType;
import railwalk.device.TubeType;

class TubesTest {
  private static AmplifierSection section(Circuit circuit, String name) {
    return part(circuit, name, AmplifierSection.class);
  }

  @Test
  void aTwinBySocketPinHasTwoSections() {
    Circuit circuit = circuit("XV1 ECC83 1=p1 2=g1 3=k1 6=p2 7=g2 8=k2");
    AmplifierSection b = section(circuit, "V1B");
    assertThat(b.plate().name()).isEqualTo("p2");
    assertThat(b.grid().name()).isEqualTo("g2");
    assertThat(b.cathode().name()).isEqualTo("k2");
    assertThat(b.screen()).isNull();
    assertThat(b.bottle()).isEqualTo("V1");
    assertThat(b.section()).isEqualTo("B");
    Bottle bottle = circuit.bottle("V1").orElseThrow();
    assertThat(bottle.type().name()).isEqualTo("12AX7");
    assertThat(bottle.wiring()).isEqualTo(Bottle.Wiring.BY_PIN);
    assertThat(bottle.pins().keySet()).containsExactly(1, 2, 3, 6, 7, 8);
  }

  @Test
  void aWhollyUnlistedSectionIsAbsent() {
    Circuit circuit = circuit("XV1 12AX7 1=p1 2=g1 3=k1");
    assertThat(circuit.element("V1B")).isEmpty();
  }

  @Test
  void theXMayBeMissing() {
    assertThat(section(circuit("V1 12AX7 1=p1 2=g1 3=k1"), "V1A").grid().name()).isEqualTo("g1");
    assertThat(part(circuit("VR1 0A2 5=a 2=0"), "VR1", RegulatorSection.class).anode().name())
        .isEqualTo("a");
  }

  @Test
  void blanksAroundTheEqualsSignAndCommasAreAllowed() {
    Circuit circuit = circuit("XV1 12AX7 1 = p1, 2 =g1, 3= k1");
    assertThat(section(circuit, "V1A").cathode().name()).isEqualTo("k1");
  }

  @Test
  void electrodesGoByAnyOfTheirNames() {
    Circuit circuit =
        circuit("XV3 6V6 a=p3 g2=b2 g1=g3 k=k3", "XV4 6V6GT plate=p screen=s grid=g cathode=c");
    AmplifierSection v3 = section(circuit, "V3");
    assertThat(names(v3.nodes())).containsExactly("p3", "b2", "g3", "k3");
    assertThat(circuit.bottle("V3").orElseThrow().pins().get(3)).isEqualTo(v3.plate());
  }

  @Test
  void positionalSectionsShareABottle() {
    Circuit circuit = circuit("XV1A p g k 12AX7", "R1 p 0 1k", "XV1B q h j 12AX7_X");
    assertThat(circuit.bottles()).hasSize(1);
    assertThat(circuit.bottles().get(0).wiring()).isEqualTo(Bottle.Wiring.BY_POSITION);
    assertThat(circuit.elements().stream().map(e -> e.name())).containsExactly("V1A", "R1", "V1B");
    assertThat(circuit.bottles().get(0).pins().get(7)).isEqualTo(section(circuit, "V1B").grid());
  }

  @Test
  void lettersOnATypeOfOneSectionAreTwoBottles() {
    Circuit circuit = circuit("XV1A p s g k 6V6GT", "XV1B q s h k 6V6GT");
    assertThat(circuit.bottles().stream().map(Bottle::name)).containsExactly("V1A", "V1B");
    assertThat(section(circuit, "V1A").section()).isEmpty();
  }

  @Test
  void pentodesTakeFourOrFiveNodesAndHeaterNodesAfterThem() {
    Circuit circuit =
        circuit("XV1 p s g k EF86", "XV2 p s x g k EF86", "XV3 p s g k h1 h2 EF86", "R1 x 0 1k");
    assertThat(section(circuit, "V1").suppressor()).isNull();
    AmplifierSection five = section(circuit, "V2");
    assertThat(five.suppressor()).isNotNull();
    assertThat(names(five.nodes())).containsExactly("p", "s", "x", "g", "k");
    assertThat(circuit.node("h1")).isEmpty();
  }

  @Test
  void aTriodeConnectedPentodeHasPlateAndScreenOnOneNode() {
    AmplifierSection section = section(circuit("XV1 p p g k 6V6GT"), "V1");
    assertThat(section.screen()).isEqualTo(section.plate());
  }

  @Test
  void theTypeMayStandTwice() {
    assertThat(section(circuit("XV1 p s g k 6V6GT 6V6GT"), "V1").plate().name()).isEqualTo("p");
  }

  @Test
  void orderAndHeaderChangeThePositions() {
    Circuit ordered = circuit(".order 6V6GT plate grid cathode screen", "XV1 p g k s 6V6GT");
    assertThat(section(ordered, "V1").screen()).extracting(n -> n.name()).isEqualTo("s");
    Circuit header =
        circuit(".subckt EL84 A G2 G1 K", "B1 A K V={rubbish(", ".ends", "XV1 p s g k EL84");
    assertThat(names(section(header, "V1").nodes())).containsExactly("p", "s", "g", "k");
    Circuit turned = circuit(".subckt 12AX7 K G A", ".ends", "XV1A k g p 12AX7");
    assertThat(section(turned, "V1A").plate().name()).isEqualTo("p");
  }

  @Test
  void aSubcircuitWhoseNameOnlyResemblesATypeStaysOne() {
    Circuit circuit =
        circuit(
            ".subckt 12AX7_stage in out hot",
            "R1 hot out 1k",
            "R2 in 0 1M",
            ".ends",
            "X1 a b c 12AX7_stage");
    assertThat(circuit.bottles()).isEmpty();
    assertThat(circuit.element("X1.R1")).isPresent();
  }

  @Test
  void rectifiersTakeTwoOrThreeNodes() {
    Circuit circuit = circuit("XV1 p k EZ81", "XV2 p1 p2 k EZ81", "R1 p1 p2 1k");
    assertThat(names(part(circuit, "V1", RectifierSection.class).plates()))
        .containsExactly("p", "p");
    assertThat(names(part(circuit, "V2", RectifierSection.class).plates()))
        .containsExactly("p1", "p2");
  }

  /** 5Y3GT, base 5T: filament on pins 2 and 8, the DC taken from either (RCA). */
  @Test
  void aFilamentWithBothEndsApartHasItsMiddleAsCathode() {
    Circuit circuit = circuit("XV5 5Y3GT 2=f1 8=f2 4=a 6=b");
    RectifierSection rectifier = part(circuit, "V5", RectifierSection.class);
    assertThat(rectifier.cathode().name()).isEqualTo("V5:filament");
    List<Filament> halves = circuit.elements(Filament.class);
    assertThat(halves).hasSize(2);
    assertThat(halves.get(0).ratedVolts()).isEqualTo(2.5);
    assertThat(halves.get(0).ratedAmps()).isEqualTo(2);
    assertThat(halves.get(0).hotOhms()).isEqualTo(1.25);
  }

  @Test
  void aFilamentWithOneEndNamedIsThatNode() {
    assertThat(
            part(circuit("XV5 5Y3GT 8=hot 4=a 6=b"), "V5", RectifierSection.class).cathode().name())
        .isEqualTo("hot");
    assertThat(
            part(circuit("XV5 5Y3GT 2=hot 8=hot 4=a 6=b"), "V5", RectifierSection.class)
                .cathode()
                .name())
        .isEqualTo("hot");
  }

  /** GZ34, base 5DA: cathode joined to the heater at pin 8 (GE 5AR4). */
  @Test
  void aCathodeJoinedToItsHeaterEndsTheHeaterThere() {
    Circuit circuit = circuit("XV5 GZ34 2=f 8=hot 4=a 6=b");
    assertThat(part(circuit, "V5", RectifierSection.class).cathode().name()).isEqualTo("hot");
    Filament heater = circuit.elements(Filament.class).get(0);
    assertThat(names(heater.nodes())).containsExactly("f", "hot");
    assertThat(heater.ratedVolts()).isEqualTo(5);
  }

  /** 12AX7: 12.6 V 0.15 A between 4 and 5, or 6.3 V 0.3 A with 4 and 5 joined against 9. */
  @Test
  void aTappedHeaterIsTwoHalvesOnceItsTapIsWired() {
    Circuit series = circuit("XV1 12AX7 1=p 2=g 3=k 4=x 5=y");
    assertThat(series.elements(Filament.class)).hasSize(1);
    assertThat(series.elements(Filament.class).get(0).ratedVolts()).isEqualTo(12.6);
    Circuit parallel = circuit("XV1 12AX7 1=p 2=g 3=k 4=x 5=x 9=y");
    assertThat(parallel.elements(Filament.class).stream().map(Filament::ratedVolts))
        .allMatch(volts -> Math.abs(volts - 6.3) < 1e-9)
        .hasSize(2);
  }

  /** 35W4, base 5BQ: 35 V on pins 3 and 4, of which 7.5 V between 4 and the lamp tap 6 (RCA). */
  @Test
  void aLampTapDividesTheHeaterUnequally() {
    Circuit circuit = circuit("XV1 35W4 3=a 4=b 6=t 5=p 7=k", "R1 p k 1k");
    assertThat(circuit.elements(Filament.class).stream().map(Filament::ratedVolts))
        .containsExactly(27.5, 7.5);
    assertThat(names(circuit.elements(Filament.class).get(1).nodes())).containsExactly("t", "b");
  }

  @Test
  void aHeaterWiredAtOneEndIsNoPart() {
    assertThat(circuit("XV1 12AX7 1=p 2=g 3=k 4=x").elements(Filament.class)).isEmpty();
  }

  @Test
  void detectorDiodesAreASectionOfTheirOwn() {
    Circuit circuit = circuit("XV1 6AV6 1=g 2=k 5=d2 6=d1 7=p", "R1 d1 d2 1M");
    RectifierSection diodes = part(circuit, "V1D", RectifierSection.class);
    assertThat(names(diodes.plates())).containsExactly("d1", "d2");
    assertThat(diodes.cathode().name()).isEqualTo("k");
    assertThat(section(circuit, "V1T").cathode().name()).isEqualTo("k");
  }

  @Test
  void diodesTiedToTheirCathodeAreOutOfUse() {
    assertThat(circuit("XV1 6AV6 1=g 2=k 5=k 6=k 7=p").element("V1D")).isEmpty();
  }

  @Test
  void pinsJoinedInsideJoinTheirNodes() {
    NetlistResult result = read("XV1 50C5 1=k 2=g 5=h 6=s 7=p", "R1 h 0 1M");
    Circuit circuit = result.circuit().orElseThrow();
    Wire wire = circuit.elements(Wire.class).get(0);
    assertThat(wire.bottle()).isEqualTo("V1");
    assertThat(names(wire.nodes())).containsExactly("g", "h");
    assertThat(codes(result)).contains("pins-joined");
  }

  @Test
  void anEmptyPinIsATiePoint() {
    NetlistResult result =
        read("XV1 6V6GT 3=p 4=s 5=g 8=k 6=tie", "R1 tie g 1k5", "R2 p s 1k", "R3 k 0 1k");
    Circuit circuit = result.circuit().orElseThrow();
    assertThat(circuit.bottle("V1").orElseThrow().pins().get(6))
        .isEqualTo(circuit.node("tie").orElseThrow());
    assertThat(codes(result)).doesNotContain("tie-point-in-use", "node-of-one-part");
  }

  @Test
  void aShieldOnTheReferenceIsAsItShouldBe() {
    assertThat(codes(read("XV1 EF86 1=s 2=0 3=k 6=p 7=0 8=k 9=g")))
        .doesNotContain("tie-point-in-use");
    assertThat(codes(read("XV1 EF86 1=s 2=x 3=k 6=p 8=k 9=g", "R1 x 0 1k")))
        .contains("tie-point-in-use");
  }

  @Test
  void anUnlistedElectrodeIsOpen() {
    NetlistResult result = read("XV1 12AX7 1=p 3=k");
    Circuit circuit = result.circuit().orElseThrow();
    assertThat(section(circuit, "V1A").grid().name()).isEqualTo("V1A:grid");
    assertThat(codes(result)).contains("electrode-open");
  }

  @Test
  void standInsDrawWhatIsWritten() {
    Circuit circuit = circuit("XV6 UNKNOWN plate=p g2=s cathode=k draws plate=2.6mA screen=0.5mA");
    StandIn standIn = part(circuit, "V6", StandIn.class);
    assertThat(standIn.draws().get(Electrode.PLATE)).isEqualTo(2.6e-3);
    assertThat(standIn.electrodes().get(Electrode.SCREEN))
        .isEqualTo(circuit.node("s").orElseThrow());
  }

  @Test
  void neonLampsGoByTheirNumber() {
    assertThat(part(circuit("XN1 a b NE-2", "R1 a b 1k"), "N1", GlowLamp.class).law().strikeVolts())
        .isEqualTo(90);
  }

  @Test
  void aSourceAndATubeOfOneNameLiveSideBySide() {
    Circuit circuit = circuit("V1 b 0 300", "XV1 b g k 12AX7", "L1 g k 1 rdc=1");
    assertThat(part(circuit, "V1", VoltageSource.class).volts()).isEqualTo(300);
    assertThat(circuit.bottle("XV1")).isPresent();
    assertThat(part(circuit, "L1", Inductor.class).dcOhms()).isEqualTo(1);
  }

  /** A catalogue with one type more: unlike sections, and no source for its pins. */
  @Test
  void unlikeSectionsMustBeNamedAndUnknownPinsCannotBe() {
    TubeType triode = Catalogue.standard().find("12AX7").orElseThrow();
    TubeType pentode = Catalogue.standard().find("EL84").orElseThrow();
    TubeType mixed =
        new TubeType(
            "9XY9",
            List.of(),
            "triode and pentode",
            "",
            "",
            triode.heater(),
            List.of(section(triode, "T"), section(pentode, "P")),
            new TreeMap<>());
    Catalogue catalogue =
        new Catalogue() {
          @Override
          public List<TubeType> types() {
            return List.of(mixed);
          }

          @Override
          public Optional<TubeType> find(String name) {
            return name.equalsIgnoreCase("9XY9") ? Optional.of(mixed) : Optional.empty();
          }

          @Override
          public List<String> near(String name) {
            return List.of("9XY9");
          }

          @Override
          public Optional<DataFile> file(String name) {
            return Optional.empty();
          }
        };
    String title = "* mixed\n";
    assertThat(codes(NetlistReader.readText("t", title + "XV1 p g k 9XY9\n", catalogue)))
        .contains("section-needed");
    assertThat(codes(NetlistReader.readText("t", title + "XV1 9XY9 1=p 2=g 3=k\n", catalogue)))
        .contains("pins-not-known");
    Circuit circuit =
        NetlistReader.readText("t", title + "XV1T p g k 9XY9\nXV1P q s h j 9XY9\n", catalogue)
            .circuit()
            .orElseThrow();
    assertThat(circuit.bottles()).hasSize(1);
    assertThat(section(circuit, "V1P").screen()).extracting(n -> n.name()).isEqualTo("s");
  }

  private static SectionType section(TubeType type, String id) {
    SectionType like = type.sections().get(0);
    return new SectionType(
        id,
        like.kind(),
        like.law(),
        like.ratings(),
        like.rectifierRatings(),
        like.spreadLow(),
        like.spreadHigh());
  }

  @Test
  void aCascodeNeedsNothingElseBetweenItsHalves() {
    NetlistResult result =
        read("VB b 0 250", "RP b p 100k", "XV1A p 0 m 12AX7", "XV1B m 0 k 12AX7", "RK k 0 1k");
    assertThat(codes(result)).doesNotContain("node-of-one-part");
  }
}
