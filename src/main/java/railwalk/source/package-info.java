/** Floor 0: text with positions, and the diagnostics that point into it. */
@NullMarked
package railwalk.source;

import org.jspecify.annotations.NullMarked;
