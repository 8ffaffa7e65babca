/** Floor 10: the commands. */
@NullMarked
package railwalk.cli;

import org.jspecify.annotations.NullMarked;
