package railwalk.circuit;

import java.util.List;
import java.util.TreeMap;
import railwalk.device.AmplifierLaw;
import railwalk.device.GasLaw;
import railwalk.device.Heater;
import railwalk.device.Ratings;
import railwalk.device.RectifierLaw;
import railwalk.device.RectifierRatings;
import railwalk.device.SectionCurrents;
import railwalk.device.SectionKind;
import railwalk.device.SectionLaw;
import railwalk.device.SectionType;
import railwalk.device.TubeType;

/** Made-up tube types with simple laws, for tests of what is about the circuit, not the tube. */
public final class TestTubes {
  private static final Heater HEATER =
      new Heater(List.of(new Heater.Connection(6.3, 0.3)), false, false);

  private TestTubes() {}

  /** Returns a twin triode of mu 100 whose sections A and B pass about a milliampere. */
  public static TubeType twinTriode() {
    AmplifierLaw law = new ThreeHalves(1.0e-3, 100, 0);
    return type(
        "TWIN",
        section("A", SectionKind.TRIODE, law, ratings(330, Double.NaN, 1.2, Double.NaN)),
        section("B", SectionKind.TRIODE, law, ratings(330, Double.NaN, 1.2, Double.NaN)));
  }

  /** Returns a beam power tube of about 40 mA at 250 V on plate and screen and −12 V of bias. */
  public static TubeType beam() {
    AmplifierLaw law = new ThreeHalves(1.5e-3, 10, 0.07);
    return type("BEAM", section("", SectionKind.PENTODE, law, ratings(350, 315, 14, 2.2)));
  }

  /** Returns a two-plate rectifier that drops 60 V at 125 mA on each plate. */
  public static TubeType rectifier() {
    SectionLaw law = new RectifierLaw(0.125 / Math.pow(60, 1.5));
    return new TubeType(
        "RECT",
        List.of(),
        "test rectifier",
        "",
        "",
        HEATER,
        List.of(
            new SectionType(
                "",
                SectionKind.RECTIFIER,
                law,
                Ratings.NONE,
                new RectifierRatings(1400, 0.44, 0.125, 20e-6, 350),
                0.9,
                1.1)),
        new TreeMap<>());
  }

  /** Returns a 150 V regulator for 5 to 30 mA. */
  public static TubeType regulator() {
    GasLaw law = new GasLaw(165, 150, 17.5e-3, 150, 5e-3, 30e-3);
    return type("REG150", section("", SectionKind.REGULATOR, law, Ratings.NONE));
  }

  private static TubeType type(String name, SectionType... sections) {
    return new TubeType(
        name, List.of(), "test tube", "", "", HEATER, List.of(sections), new TreeMap<>());
  }

  private static SectionType section(String id, SectionKind kind, SectionLaw law, Ratings ratings) {
    return new SectionType(id, kind, law, ratings, RectifierRatings.NONE, 0.8, 1.2);
  }

  private static Ratings ratings(
      double plateVolts, double screenVolts, double plateWatts, double screenWatts) {
    return new Ratings(
        "design-maximum",
        plateVolts,
        screenVolts,
        plateWatts,
        screenWatts,
        Double.NaN,
        200,
        0.5e6,
        0.1e6);
  }

  /**
   * Plate current {@code K · (Vg + V/mu)^1.5} with V the plate's volts of a triode, the screen's of
   * a pentode; of the space current the share {@code screenShare} goes to the screen.
   */
  private record ThreeHalves(double perveance, double mu, double screenShare)
      implements AmplifierLaw {
    @Override
    public void evaluate(
        double plateVolts, double screenVolts, double gridVolts, SectionCurrents out) {
      out.clear();
      boolean triode = screenShare == 0;
      double drive = gridVolts + (triode ? plateVolts : screenVolts) / mu;
      if (drive <= 0 || plateVolts <= 0) {
        return;
      }
      double space = perveance * Math.pow(drive, 1.5);
      double slope = 1.5 * perveance * Math.sqrt(drive);
      out.plateAmps = space * (1 - screenShare);
      out.plateByGridSiemens = slope * (1 - screenShare);
      if (triode) {
        out.plateByPlateSiemens = slope / mu;
        return;
      }
      out.screenAmps = space * screenShare;
      out.plateByScreenSiemens = slope * (1 - screenShare) / mu;
      out.screenByScreenSiemens = slope * screenShare / mu;
      out.screenByGridSiemens = slope * screenShare;
    }

    @Override
    public AmplifierLaw withEmission(double emission) {
      return new ThreeHalves(perveance * emission, mu, screenShare);
    }
  }
}
