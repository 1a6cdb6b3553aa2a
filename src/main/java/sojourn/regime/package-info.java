/**
 * What state is a series in? Observations without dates go in; fits of regime models, filtered states and moments of a window
 * come out. Dates, prices and the schedule of refits are left to the walk; so are the names of states. Smoothed probabilities and
 * most likely paths use the whole series and therefore have types of their own, which deciding code may not import. Start with
 * {@link sojourn.regime.Gauge}, {@link sojourn.regime.GaugeSettings} that fit one, and {@link sojourn.regime.FilterState}.
 */
@NullMarked
package sojourn.regime;

import org.jspecify.annotations.NullMarked;
