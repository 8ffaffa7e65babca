package railwalk.spread;

/**
 * How the builds behind sampled bands were drawn.
 *
 * @param builds how many
 * @param seed of the draws
 * @param unsettled how many of them have no operating point, and were left out
 */
public record Sampling(int builds, long seed, int unsettled) {}
