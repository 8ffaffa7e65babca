/** Floor 8: a chart's points as CSV. */
@NullMarked
package railwalk.render.csv;

import org.jspecify.annotations.NullMarked;
