/** Floor 0: the only place that reads or formats numbers for people. */
@NullMarked
package railwalk.units;

import org.jspecify.annotations.NullMarked;
