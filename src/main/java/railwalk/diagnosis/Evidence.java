package railwalk.diagnosis;

/**
 * A reading that speaks for or against a suspect.
 *
 * @param reading number of the reading in its sheet
 * @param healthy what a healthy amplifier shows there
 * @param suspected what the suspect shows there
 * @param deviations how far the reading lies from what it speaks against, in deviations
 */
public record Evidence(int reading, double healthy, double suspected, double deviations) {}
