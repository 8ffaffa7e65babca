/** Floor 6: faults tried on the circuit, ranked against readings, and the next point to probe. */
@NullMarked
package railwalk.diagnosis;

import org.jspecify.annotations.NullMarked;
