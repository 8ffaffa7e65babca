/** Floor 3: what was read at the bench, text to {@link railwalk.readings.ReadingSheet}. */
@NullMarked
package railwalk.readings;

import org.jspecify.annotations.NullMarked;
