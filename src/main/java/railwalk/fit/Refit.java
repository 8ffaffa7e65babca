package railwalk.fit;

/**
 * What fitting a type anew comes to.
 *
 * @param dataFile the type's data file with the new constants in place of the old
 * @param sheet how well they meet the points
 * @param borrowed whether law and points are another type's, and the file stays as it is
 */
public record Refit(String dataFile, TypeSheet sheet, boolean borrowed) {}
