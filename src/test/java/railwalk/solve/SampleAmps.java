package railwalk.solve;

import railwalk.circuit.Circuit;
import railwalk.circuit.CircuitBuilder;
import railwalk.device.Catalogue;
import railwalk.device.TubeType;
import railwalk.walk.Walk;

/** Amplifiers of our own invention for solver tests, built by hand with types of the catalogue. */
final class SampleAmps {
  private SampleAmps() {}

  static TubeType type(String name) {
    return Catalogue.standard().find(name).orElseThrow();
  }

  static OperatingPoint solve(Circuit circuit) {
    SolveOutcome outcome = OperatingPointSolver.solve(circuit, Walk.of(circuit));
    if (outcome instanceof SolveOutcome.NotSolved not) {
      throw new AssertionError(not.worstNode() + ": " + not.reason() + "\n" + not.trace());
    }
    return ((SolveOutcome.Solved) outcome).point();
  }

  /** A fixed-bias pair with choke, bias supply off a tap, long-tailed pair and follower. */
  static CircuitBuilder fixedBias(double scale) {
    TubeType twin = type("12AX7");
    TubeType power = type("6L6GC");
    return new CircuitBuilder()
        .line(120, 60)
        .transformer("T1", 120, 1.6)
        .winding(
            "VHT", new double[] {285 * scale, 50 * scale, 335 * scale}, 28, "h1", "bt", "0", "h2")
        .rectifier(type("GZ34"), "V9", "h1", "h2", "b1")
        .c("C1", "b1", "0", 47e-6)
        .l("L1", "b1", "b2", 8, 110)
        .c("C2", "b2", "0", 32e-6)
        .r("R1", "b2", "b3", 4700)
        .c("C3", "b3", "0", 22e-6)
        .r("R2", "b3", "b4", 10e3)
        .c("C4", "b4", "0", 22e-6)
        .r("R3", "bt", "bx", 3300)
        .diode("D1", "m1", "bx")
        .c("C5", "0", "m1", 47e-6)
        .r("R4", "m1", "m2", 4700)
        .c("C6", "0", "m2", 47e-6)
        .pot("P1", "m2", "mw", "m3", 22e3, 0.85)
        .r("R5", "m3", "0", 15e3)
        .l("LOA", "b1", "pa", Double.NaN, 52)
        .l("LOB", "b1", "pb", Double.NaN, 57)
        .pentode(power, "V5", "pa", "sa", "ga", "0")
        .pentode(power, "V6", "pb", "sb", "gb", "0")
        .r("R6", "b2", "sa", 470)
        .r("R7", "b2", "sb", 470)
        .r("R8", "mw", "ga", 220e3)
        .r("R9", "mw", "gb", 220e3)
        .triode(twin, "V4", "A", "pc", "gc", "kc")
        .triode(twin, "V4", "B", "pd", "gd", "kc")
        .r("R10", "b3", "pc", 82e3)
        .r("R11", "b3", "pd", 100e3)
        .r("R12", "kc", "t", 470)
        .r("R13", "t", "0", 10e3)
        .r("R14", "gc", "t", 1e6)
        .r("R15", "gd", "t", 1e6)
        .c("C7", "pc", "ga", 22e-9)
        .c("C8", "pd", "gb", 22e-9)
        .triode(twin, "V2", "A", "pe", "ge", "ke")
        .triode(twin, "V2", "B", "b4", "pe", "kf")
        .r("R16", "b4", "pe", 100e3)
        .r("R17", "ke", "0", 1500)
        .r("R18", "ge", "0", 470e3)
        .r("R19", "kf", "0", 100e3)
        .triode(twin, "V1", "A", "ph", "gh", "kh")
        .triode(twin, "V1", "B", "pi", "gi", "0")
        .r("R20", "b4", "ph", 100e3)
        .r("R21", "kh", "0", 1500)
        .c("C9", "kh", "0", 25e-6)
        .r("R22", "gh", "0", 1e6)
        .r("R23", "b4", "pi", 270e3)
        .r("R24", "gi", "0", 10e6);
  }

  /** A single-ended stage behind a half-wave silicon supply, regulator tube on its screen rail. */
  static CircuitBuilder singleEnded() {
    return new CircuitBuilder()
        .line(230, 50)
        .winding("VHT", "h1", "0", 260, 120)
        .diode("D1", "h1", "b1")
        .c("C1", "b1", "0", 47e-6)
        .r("R1", "b1", "b2", 1500)
        .c("C2", "b2", "0", 47e-6)
        .r("R2", "b2", "b3", 22e3)
        .c("C3", "b3", "0", 22e-6)
        .l("LO", "b1", "p2", Double.NaN, 310)
        .pentode(type("EL84"), "V2", "p2", "b2", "g2", "k2")
        .r("R3", "g2", "0", 470e3)
        .r("R4", "k2", "0", 180)
        .c("C4", "k2", "0", 100e-6)
        .pentode(type("EF86"), "V1", "p1", "s1", "g1", "k1")
        .r("R5", "b3", "p1", 220e3)
        .r("R6", "b3", "s1", 1e6)
        .r("R7", "k1", "0", 2200)
        .r("R8", "g1", "0", 1e6)
        .c("C5", "s1", "0", 100e-9)
        .r("R9", "b1", "vr", 15e3)
        .regulator("V3", "vr", "0")
        .r("R10", "vr", "0", 220e3);
  }
}
