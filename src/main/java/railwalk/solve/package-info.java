/** Floor 4: the DC operating point, supplies included. */
@NullMarked
package railwalk.solve;

import org.jspecify.annotations.NullMarked;
