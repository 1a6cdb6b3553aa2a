/**
 * How did it do? The wealth of a strategy, bar by bar, goes in; a {@link sojourn.measure.Scorecard} comes out, in which every
 * {@link sojourn.measure.Measure} is a {@link sojourn.measure.Measured}: a number, where it can be had with its interval, or undefined with the
 * reason. The calculators beside it are pure formulas; only the scorecard refuses to annualise less than a year. Nothing here trades or
 * formats. Start with {@link sojourn.measure.EvaluatedPath} and {@link sojourn.measure.Scorecard}.
 */
@NullMarked
package sojourn.measure;

import org.jspecify.annotations.NullMarked;
