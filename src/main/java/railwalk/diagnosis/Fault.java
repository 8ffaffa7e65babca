package railwalk.diagnosis;

import railwalk.circuit.Circuit;

/**
 * One thing that may be wrong with an amplifier.
 *
 * @param element name of the part, section or tube; "line" for the line itself
 * @param detail which end, pin, type or node; empty where the kind says all
 * @param range how bad it may be
 */
public record Fault(FaultKind kind, String element, String detail, Range range, Change change) {
  /** Makes the faulted amplifier. */
  @FunctionalInterface
  public interface Change {
    /** Returns {@code circuit} with the fault in it, as bad as {@code severity} says. */
    Circuit applyTo(Circuit circuit, double severity);
  }

  /** Returns {@code circuit} with the fault in it; {@code severity} is in the range's unit. */
  public Circuit applyTo(Circuit circuit, double severity) {
    return change.applyTo(circuit, severity);
  }

  /** Two faults are the same when they say the same. */
  @Override
  public boolean equals(Object other) {
    return other instanceof Fault f
        && kind == f.kind
        && element.equals(f.element)
        && detail.equals(f.detail);
  }

  @Override
  public int hashCode() {
    return element.hashCode();
  }
}
