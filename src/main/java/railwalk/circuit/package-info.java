/** Floor 2: the amplifier as immutable values. */
@NullMarked
package railwalk.circuit;

import org.jspecify.annotations.NullMarked;
