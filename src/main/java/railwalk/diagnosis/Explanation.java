package railwalk.diagnosis;

import org.jspecify.annotations.Nullable;

/**
 * An explanation of the readings on its way to becoming a {@link Suspect}.
 *
 * @param candidate null for the healthy amplifier and for another one
 * @param severity the likeliest
 * @param low of nine in ten of its probability
 * @param high of it
 * @param logPosterior not yet made to add up to 1
 * @param fit at the likeliest severity
 * @param prediction at the likeliest severity; the healthy one's spread before it was refined
 */
record Explanation(
    Suspect.Kind kind,
    @Nullable Candidate candidate,
    double severity,
    double low,
    double high,
    double logPosterior,
    Fit fit,
    Prediction prediction) {}
