/**
 * How sure can one be of a statistic? Series of numbers without dates go in; moments, autocorrelations, long-run variances and
 * standard errors come out, each an {@link sojourn.inference.Estimate}: a number, or undefined with the reason. Nothing here
 * annualises or knows about wealth; that is left to measures. Tests come out as a {@link sojourn.inference.TestResult}. Start with
 * {@link sojourn.inference.Moments}, {@link sojourn.inference.SharpeError} and {@link sojourn.inference.DieboldMariano}.
 */
@NullMarked
package sojourn.inference;

import org.jspecify.annotations.NullMarked;
