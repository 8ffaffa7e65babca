/** Floor 3: netlist text to circuit, with positions beside it and diagnostics about it. */
@NullMarked
package railwalk.netlist;

import org.jspecify.annotations.NullMarked;
