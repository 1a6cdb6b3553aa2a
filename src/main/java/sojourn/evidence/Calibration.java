package sojourn.evidence;

import java.util.Arrays;
import sojourn.inference.Estimate;
import sojourn.inference.LongRunVariance;
import sojourn.inference.Moments;
import sojourn.inference.RegressionLine;
import sojourn.inference.TestResult;

/**
 * Whether forecasts of squared returns are right on average and move one for one with what comes. Ratio: mean(r^2) / mean(h), 1 if right, with a standard error
 * that allows for serial correlation. Line: r^2 = a + b h + u with the errors of Newey and West, a = 0 and b = 1 if right, tested together; a slope below 1 means
 * that the forecasts move too much. Mincer and Zarnowitz (1969), Economic Forecasts and Expectations, NBER.
 *
 * @param ratio mean squared return over mean forecast
 * @param ratioError its standard error
 * @param intercept a
 * @param slope b
 * @param slopeError its standard error
 * @param explained R^2
 * @param right whether a = 0 and b = 1
 */
public record Calibration(
        Estimate ratio,
        Estimate ratioError,
        Estimate intercept,
        Estimate slope,
        Estimate slopeError,
        Estimate explained,
        TestResult right) {
    /** Of forecasts and what came, in the order of time; at least one. Neither is modified. */
    static Calibration of(double[] forecasts, double[] squares) {
        int lags = LongRunVariance.defaultLags(forecasts.length);
        double forecast = Moments.of(forecasts).mean();
        double ratio = Moments.of(squares).mean() / forecast;
        double[] influence = new double[forecasts.length];
        Arrays.setAll(influence, t -> (squares[t] - ratio * forecasts[t]) / forecast);
        double longRun = LongRunVariance.bartlett(influence, lags).number().orElseThrow();
        Estimate ratioError = Estimate.root(longRun / forecasts.length, "the variance of the ratio");
        RegressionLine.Outcome outcome = RegressionLine.through(forecasts, squares, lags);
        if (outcome instanceof RegressionLine.Outcome.Fitted fitted) {
            RegressionLine line = fitted.line();
            return new Calibration(
                    Estimate.of(ratio),
                    ratioError,
                    Estimate.of(line.intercept()),
                    Estimate.of(line.slope()),
                    line.slopeError(),
                    Estimate.of(line.explained()),
                    line.against(0, 1));
        }
        Estimate none = ((RegressionLine.Outcome.None) outcome).because();
        return new Calibration(Estimate.of(ratio), ratioError, none, none, none, none, new TestResult(none, none));
    }
}
