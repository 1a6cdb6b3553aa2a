/**
 * What would an invented market look like, with its truth known? A stated {@link sojourn.world.World} and its seed go in;
 * prices, bill rates and the true state of every day come out, and, from these, the texts of the files that a real
 * exchange would have left. Nothing here estimates, decides or trades, and writing the texts to disk is left to the shell.
 * Start with {@link sojourn.world.Inventor}.
 */
@NullMarked
package sojourn.world;

import org.jspecify.annotations.NullMarked;
