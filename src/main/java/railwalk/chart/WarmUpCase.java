package railwalk.chart;

import railwalk.solve.OperatingPoint;
import railwalk.solve.WarmUpOutcome;

/**
 * One way of switching an amplifier on.
 *
 * @param title such as "Cold switch-on"
 * @param circumstances what is cold, empty and switched, in a few words
 * @param occasion for a sentence: "a cold switch-on"
 * @param running what it comes to in the end
 */
public record WarmUpCase(
    String title,
    String circumstances,
    String occasion,
    OperatingPoint running,
    WarmUpOutcome outcome) {}
