/** Floor 8: a chart as plain text. */
@NullMarked
package railwalk.render.text;

import org.jspecify.annotations.NullMarked;
