/** Floor 9: the use cases, from netlist to written file. */
@NullMarked
package railwalk.app;

import org.jspecify.annotations.NullMarked;
