/** Floor 3: the circuit as a graph: rectifier groups, supply nodes, DC paths. */
@NullMarked
package railwalk.walk;

import org.jspecify.annotations.NullMarked;
