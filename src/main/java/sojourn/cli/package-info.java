/**
 * The shell: arguments go in; calls to the rest, progress and exit codes come out. The only package that touches the console. Start
 * with {@link sojourn.cli.Shell}.
 */
@NullMarked
package sojourn.cli;

import org.jspecify.annotations.NullMarked;
