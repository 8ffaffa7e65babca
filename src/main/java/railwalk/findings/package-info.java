/** Floor 5: what is electrically wrong or doubtful, by part and code. */
@NullMarked
package railwalk.findings;

import org.jspecify.annotations.NullMarked;
