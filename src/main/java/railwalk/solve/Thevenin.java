package railwalk.solve;

/**
 * What a ripple group looks like from the DC network: at each port mean volts that fall with the
 * mean currents drawn, {@code V = openVolts − ohms · I}. Exact at the currents it was taken at, a
 * tangent elsewhere.
 *
 * @param openVolts by port
 * @param ohms by port and port
 */
record Thevenin(double[] openVolts, double[][] ohms) {}
