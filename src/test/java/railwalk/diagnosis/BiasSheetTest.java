package railwalk.diagnosis;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Circuit;
import railwalk.circuit.Inductor;
import railwalk.circuit.Resistor;
import railwalk.device.Catalogue;
import railwalk.netlist.NetlistReader;
import railwalk.solve.OperatingPoint;
import railwalk.solve.OperatingPointSolver;
import railwalk.solve.SolveOutcome;
import railwalk.walk.Walk;

/** Bias sheets against Ohm's law and against the amplifier written with the bias found. */
class BiasSheetTest {
  private static OperatingPoint solved(Circuit circuit) {
    return ((SolveOutcome.Solved) OperatingPointSolver.solve(circuit, Walk.of(circuit))).point();
  }

  private static String text(String name) throws IOException {
    return Files.readString(Path.of("test-netlists/amps/" + name + ".cir"));
  }

  private static OperatingPoint of(String text) {
    return solved(
        NetlistReader.readText("test.cir", text, Catalogue.standard()).circuit().orElseThrow());
  }

  /** The pot positions found, typed into the netlist, give 50, 60 and 70 % of 30 W. */
  @Test
  void controlFoundGivesTheWattsAskedFor() throws IOException {
    BiasSheet sheet = BiasSheet.of(of(text("millrace")));
    assertThat(sheet.groups()).hasSize(1);
    BiasSheet.Group group = sheet.groups().get(0);
    assertThat(group.tubes()).hasSize(2);
    for (int i = 0; i < BiasSheet.TARGETS.size(); i++) {
      BiasSheet.Setting setting = group.targets().get(i).orElseThrow();
      OperatingPoint again =
          of(text("millrace").replace("25k set=0.35", "25k set=" + setting.controlShare()));
      AmplifierSection tube =
          (AmplifierSection) again.circuit().element(setting.hottest()).orElseThrow();
      double share = again.at(tube).plateWatts() / 30;
      System.out.printf("P1 at %.4f: %.4f of 30 W%n", setting.controlShare(), share);
      assertThat(share).isCloseTo(BiasSheet.TARGETS.get(i), within(1e-3));
      assertThat(again.volts(tube.grid())).isCloseTo(setting.gridVolts(), within(0.02));
    }
    assertThat(group.ends()).hasSize(2);
    assertThat(group.ends().get(0).at().plateWatts())
        .isGreaterThan(group.ends().get(1).at().plateWatts());
  }

  /** Ohm's law: volts across a sense resistor and a winding are current times resistance. */
  @Test
  void senseResistorAndWindingObeyOhm() throws IOException {
    OperatingPoint point = of(text("millrace"));
    BiasSheet sheet = BiasSheet.of(point);
    assertThat(sheet.tubes()).hasSize(2);
    for (BiasSheet.Tube tube : sheet.tubes()) {
      Resistor sense = java.util.Objects.requireNonNull(tube.sense());
      Inductor coil = java.util.Objects.requireNonNull(tube.coil());
      assertThat(tube.biasesItself()).isFalse();
      assertThat(point.volts(sense.a()) - point.volts(sense.b()))
          .isCloseTo(tube.at().cathodeAmps() * 1.0, within(1e-5));
      assertThat(point.volts(coil.a()) - point.volts(coil.b()))
          .isCloseTo(tube.at().plateAmps() * coil.dcOhms(), within(1e-3));
    }
  }

  /** Both output valves of one cathode resistor: it carries the sum of their currents. */
  @Test
  void sharedCathodeResistorCarriesBoth() throws IOException {
    OperatingPoint point = of(text("lockgate"));
    BiasSheet sheet = BiasSheet.of(point);
    assertThat(sheet.groups()).isEmpty();
    double amps = 0;
    for (BiasSheet.Tube tube : sheet.tubes()) {
      assertThat(java.util.Objects.requireNonNull(tube.cathodeResistor()).name()).isEqualTo("R25");
      amps += tube.at().cathodeAmps();
    }
    assertThat(amps * 150)
        .isCloseTo(point.volts(point.circuit().node("kk").orElseThrow()), within(1e-3));
  }

  /** Without a control the grid volts are found: held there by a battery, the watts come out. */
  @Test
  void gridVoltsWithoutControl() throws IOException {
    String fixed =
        text("millrace")
            .replace("XP1 n1 bias n2 POT 25k set=0.35", "RA n1 bias 16250\nRB bias n2 8750")
            .replace(".state hottest_bias P1=0", "");
    BiasSheet.Group group = BiasSheet.of(of(fixed)).groups().get(0);
    assertThat(group.control()).isNull();
    BiasSheet.Setting setting = group.targets().get(2).orElseThrow();
    OperatingPoint again =
        of(
            fixed.replace(
                ".state standby", "VB bias 0 DC " + setting.gridVolts() + "\n.state standby"));
    AmplifierSection tube =
        (AmplifierSection) again.circuit().element(setting.hottest()).orElseThrow();
    assertThat(again.at(tube).plateWatts() / 30).isCloseTo(0.7, within(0.01));
  }
}
