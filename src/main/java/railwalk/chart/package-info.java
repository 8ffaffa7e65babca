/** Floor 7: pages, tables, drawings and cautions as plain data; all wording. */
@NullMarked
package railwalk.chart;

import org.jspecify.annotations.NullMarked;
