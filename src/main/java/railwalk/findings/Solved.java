package railwalk.findings;

import org.jspecify.annotations.Nullable;
import railwalk.solve.OperatingPoint;

/**
 * What a check of volts, currents and watts looks at.
 *
 * @param unloaded the amplifier on a high line before its tubes warm up; null when not known
 */
record Solved(Scene scene, OperatingPoint point, @Nullable OperatingPoint unloaded) {}
