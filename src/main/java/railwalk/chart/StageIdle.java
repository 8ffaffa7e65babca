package railwalk.chart;

/**
 * How a section idles with one type or another in its socket; NaN where the amplifier does not
 * settle.
 *
 * @param type in the socket
 * @param section such as V1A
 * @param plateVolts plate to cathode
 * @param plateWattsMax limit; NaN when none is known
 */
public record StageIdle(
    String type,
    String section,
    double plateAmps,
    double plateVolts,
    double plateWatts,
    double plateWattsMax) {}
