package railwalk.cli;

import java.io.PrintStream;
import java.nio.file.Path;

/**
 * Where a command speaks: results to {@code out}, everything else to {@code err}.
 *
 * @param folder what relative output names are resolved against
 * @param terminal whether a person is watching, so that a line of progress is welcome
 */
record Console(PrintStream out, PrintStream err, Path folder, boolean terminal) {}
