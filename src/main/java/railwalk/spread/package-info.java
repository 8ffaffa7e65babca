/** Floor 5: part spreads in, expected bands out. */
@NullMarked
package railwalk.spread;

import org.jspecify.annotations.NullMarked;
