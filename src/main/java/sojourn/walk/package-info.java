/**
 * What was known, and when? Prices and the settings of regimes and refits go in; a timeline comes out that holds, for each close,
 * the fit in force and the filtered probabilities. Prices are seen only through what was known at each close. Start with
 * {@link sojourn.walk.Signal} and {@link sojourn.walk.Reading}.
 */
@NullMarked
package sojourn.walk;

import org.jspecify.annotations.NullMarked;
