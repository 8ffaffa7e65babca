package railwalk.circuit;

/** A supply transformer's primary: its rated volts rms and its resistance. */
public record Transformer(String name, double primaryVolts, double primaryOhms) {}
