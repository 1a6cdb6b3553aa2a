/**
 * Named numerical ideas that everything else stands on: compensated sums, an exponential of fixed bits, the normal quantile, small quadratic programmes,
 * random streams that mean the same numbers everywhere, and argument checks. Plain doubles go in and come out; nothing
 * here knows about markets, files or dates. Start with {@link sojourn.numeric.RandomStream} and
 * {@link sojourn.numeric.CompensatedSum}.
 */
@NullMarked
package sojourn.numeric;

import org.jspecify.annotations.NullMarked;
