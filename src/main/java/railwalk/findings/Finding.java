package railwalk.findings;

import railwalk.source.Severity;

/**
 * One thing found in the circuit or in its operating point that a technician ought to know.
 *
 * @param severity a warning, or a note on what cannot be told
 * @param code short stable name, one of {@link FindingCode}
 * @param message one sentence with its figures, no full stop
 * @param hint what to do or to look at; empty when there is nothing to add
 * @param elementName the part it is about, whose line in the netlist it points at
 */
public record Finding(
    Severity severity, String code, String message, String hint, String elementName) {}
