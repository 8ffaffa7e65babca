package railwalk.chart;

import java.util.Optional;
import railwalk.device.PublishedPoint;

/**
 * Where a published point stands among the curves: electrode volts against the cathode, worked out
 * of supply volts, resistors and the published currents where the sheet gives those.
 *
 * @param screenVolts NaN in a triode
 * @param joined whether screen and plate are joined; the current is then the sum
 */
record PointPlace(
    int number,
    double plateVolts,
    double screenVolts,
    double gridVolts,
    double amps,
    boolean joined) {

  /** Returns the place of {@code numbered}; empty where a current is missing that it hangs on. */
  static Optional<PointPlace> of(NumberedPoint numbered) {
    PublishedPoint.Setup setup = numbered.point().setup();
    PublishedPoint.Figures figures = numbered.point().published();
    double amps = figures.plateAmps();
    boolean hasScreen = !Double.isNaN(setup.screenVolts()) && !setup.triodeConnected();
    double screenAmps = hasScreen ? figures.screenAmps() : 0;
    double cathodeAmps =
        Double.isNaN(figures.cathodeAmps()) ? amps + screenAmps : figures.cathodeAmps();
    double lift = setup.cathodeOhms() > 0 ? setup.cathodeOhms() * setup.sharing() * cathodeAmps : 0;
    double foot = setup.reference() == PublishedPoint.Reference.SUPPLY ? lift : 0;
    double screenDrop = setup.screenOhms() > 0 ? setup.screenOhms() * screenAmps : 0;
    double plateVolts = setup.plateVolts() - foot - setup.loadOhms() * amps;
    double screenVolts = hasScreen ? setup.screenVolts() - foot - screenDrop : Double.NaN;
    double gridVolts = setup.gridVolts() - lift;
    boolean known =
        Double.isFinite(plateVolts + gridVolts + amps)
            && (!hasScreen || Double.isFinite(screenVolts));
    return known
        ? Optional.of(
            new PointPlace(
                numbered.number(),
                plateVolts,
                screenVolts,
                gridVolts,
                amps,
                setup.triodeConnected()))
        : Optional.empty();
  }
}
