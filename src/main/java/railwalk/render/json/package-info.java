/** Floor 8: a chart's figures as JSON. */
@NullMarked
package railwalk.render.json;

import org.jspecify.annotations.NullMarked;
