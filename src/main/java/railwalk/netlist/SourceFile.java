package railwalk.netlist;

import java.nio.file.Path;
import org.jspecify.annotations.Nullable;
import railwalk.source.SourceText;

/**
 * A netlist or a file that it includes.
 *
 * @param path where it lies; null for text that stands alone
 */
record SourceFile(SourceText text, @Nullable Path path) {}
