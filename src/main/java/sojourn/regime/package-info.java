/**
 * What state is a series in? Observations without dates go in; fits of regime models, filtered states and moments of a window
 * come out. Smoothed probabilities and most likely paths use the whole series and therefore have types of their own, which
 * deciding code may not import. Start with {@link sojourn.regime.WindowMoments}.
 */
@NullMarked
package sojourn.regime;

import org.jspecify.annotations.NullMarked;
