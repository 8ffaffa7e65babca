/** Floor 5: published points in, law constants out, and how well a law meets its points. */
@NullMarked
package railwalk.fit;

import org.jspecify.annotations.NullMarked;
