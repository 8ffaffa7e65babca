package railwalk.fit;

import railwalk.device.AmplifierLaw;
import railwalk.device.PublishedPoint;
import railwalk.device.SectionCurrents;

/**
 * Where a section settles in the small circuit that a published point describes: supplies, plate
 * and screen resistor, and a cathode resistor that like sections may share. Two unknowns, plate and
 * screen current, by Newton's method with halved steps; grid current is left out.
 */
final class Standing {
  private static final int STEPS = 200;
  private static final double SETTLED = 1e-12;

  private final AmplifierLaw law;
  private final PublishedPoint.Setup setup;
  private final SectionCurrents currents = new SectionCurrents();
  private double plateVolts;
  private double screenVolts;
  private double gridVolts;

  private Standing(AmplifierLaw law, PublishedPoint.Setup setup) {
    this.law = law;
    this.setup = setup;
  }

  /** Returns where {@code law} settles at {@code point}. */
  static Standing of(AmplifierLaw law, PublishedPoint point) {
    Standing standing = new Standing(law, point.setup());
    standing.settle(point.published());
    return standing;
  }

  SectionCurrents currents() {
    return currents;
  }

  double plateVolts() {
    return plateVolts;
  }

  double screenVolts() {
    return screenVolts;
  }

  double gridVolts() {
    return gridVolts;
  }

  /** Returns plate volts against the foot of the cathode resistor. */
  double plateVoltsToFoot() {
    return setup.plateVolts() - setup.loadOhms() * currents.plateAmps;
  }

  /** Settles, starting from the published currents. */
  private void settle(PublishedPoint.Figures published) {
    double plate =
        Double.isNaN(published.plateAmps()) ? 0.8 * published.cathodeAmps() : published.plateAmps();
    double screen = hasScreen() ? 0.15 * plate : 0;
    double off = mismatch(plate, screen);
    for (int step = 0; step < STEPS && off > SETTLED; step++) {
      double common = -(lifted() ? cathodeOhms() : 0);
      double joined = setup.triodeConnected() ? -setup.loadOhms() : 0;
      double plateVoltsByPlate = common - setup.loadOhms();
      double plateVoltsByScreen = common + joined;
      double screenVoltsByPlate = setup.triodeConnected() ? plateVoltsByPlate : common;
      double screenVoltsByScreen =
          setup.triodeConnected() ? plateVoltsByScreen : common - setup.screenOhms();
      double a = row(plateVoltsByPlate, screenVoltsByPlate, true) - 1;
      double b = row(plateVoltsByScreen, screenVoltsByScreen, true);
      double c = row(plateVoltsByPlate, screenVoltsByPlate, false);
      double d = row(plateVoltsByScreen, screenVoltsByScreen, false) - 1;
      double r = currents.plateAmps - plate;
      double s = currents.screenAmps - screen;
      double determinant = a * d - b * c;
      double platePush = (b * s - d * r) / determinant;
      double screenPush = (c * r - a * s) / determinant;
      double share = 1;
      double next = mismatch(plate + platePush, screen + screenPush);
      while (!(next < off) && share > 1e-6) {
        share /= 2;
        next = mismatch(plate + share * platePush, screen + share * screenPush);
      }
      plate += share * platePush;
      screen += share * screenPush;
      off = next;
    }
  }

  /** Evaluates the law at the volts those currents leave, and returns how far off they are. */
  private double mismatch(double plate, double screen) {
    double lift = cathodeOhms() * (plate + screen);
    double foot = lifted() ? lift : 0;
    double load = setup.loadOhms() * (setup.triodeConnected() ? plate + screen : plate);
    plateVolts = setup.plateVolts() - foot - load;
    screenVolts =
        setup.triodeConnected()
            ? plateVolts
            : hasScreen() ? setup.screenVolts() - foot - setup.screenOhms() * screen : 0;
    gridVolts = setup.gridVolts() - lift;
    law.evaluate(plateVolts, screenVolts, gridVolts, currents);
    return Math.abs(currents.plateAmps - plate) + Math.abs(currents.screenAmps - screen);
  }

  /** Returns how the plate (or screen) current changes with one of the unknowns. */
  private double row(double plateVoltsBy, double screenVoltsBy, boolean plate) {
    return plate
        ? currents.plateByPlateSiemens * plateVoltsBy
            + currents.plateByScreenSiemens * screenVoltsBy
            - currents.plateByGridSiemens * cathodeOhms()
        : currents.screenByPlateSiemens * plateVoltsBy
            + currents.screenByScreenSiemens * screenVoltsBy
            - currents.screenByGridSiemens * cathodeOhms();
  }

  private double cathodeOhms() {
    return setup.cathodeOhms() * setup.sharing();
  }

  private boolean lifted() {
    return setup.reference() == PublishedPoint.Reference.SUPPLY;
  }

  private boolean hasScreen() {
    return setup.triodeConnected() || !Double.isNaN(setup.screenVolts());
  }
}
