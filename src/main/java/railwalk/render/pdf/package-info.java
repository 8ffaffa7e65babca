/** Floor 8: a chart as PDF pages. */
@NullMarked
package railwalk.render.pdf;

import org.jspecify.annotations.NullMarked;
