/** Floor 8: the typefaces' widths, and column widths for tables. */
@NullMarked
package railwalk.render.type;

import org.jspecify.annotations.NullMarked;
