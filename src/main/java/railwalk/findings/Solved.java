package railwalk.findings;

import railwalk.solve.OperatingPoint;

/** What a check of volts, currents and watts looks at. */
record Solved(Scene scene, OperatingPoint point) {}
