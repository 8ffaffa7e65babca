/** Floor 1: device laws as pure functions, and the catalogue of tube types. */
@NullMarked
package railwalk.device;

import org.jspecify.annotations.NullMarked;
