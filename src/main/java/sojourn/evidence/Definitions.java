package sojourn.evidence;

import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;

/** What each finding is, in words and formulas, for the file that holds them. */
final class Definitions {
    private Definitions() {}

    static ObjectNode node() {
        ObjectNode all = JsonNodeFactory.instance.objectNode();
        all.put(
                "identity",
                "last_fit: the asset's simple returns in the last accepted fit's window, weighted by the probability of the"
                        + " regime given the whole window (hindsight within it). as_lived: filtered probabilities at each"
                        + " close of the walk; next_bar: returns of the bar after, weighted by the probability forecast for"
                        + " it. Standard errors: Newey and West's, the weights taken as known.");
        all.put(
                "lineage",
                "Each accepted fit's regimes matched to those of the accepted fit before by least total squared Hellinger"
                        + " distance; swap: matched to another role; birth: distance above 0.1056, that of a normal from one of"
                        + " twice its standard deviation; move: largest |p_new - p_old| of any regime over the last 60 bars,"
                        + " each fit filtered from its own window's start.");
        all.put(
                "log_score_of_observation",
                "Mean of ln density that the gauge gave to the observation the close before; each gauge by its own"
                        + " distribution. own_ahead: mean difference a bar, above 0 if the strategy's own gauge scores higher.");
        all.put(
                "log_score_of_next_return",
                "The same for the asset's simple return, on equal ground for every gauge: the normal mixture of its fit's window"
                        + " moments by the probabilities one bar on.");
        all.put(
                "forecasts_of_squared_return",
                "h = variance + squared mean, forecast the close before. qlike: mean of ln h + r^2/h. squared error: mean of"
                        + " (r^2 - h)^2 over the squared mean of r^2. own_ahead: mean loss of the other less that of the strategy's own gauge."
                        + " came_over_forecast: mean r^2 over mean h. intercept, slope: r^2 = a + b h + u. ewma: 0.94 of the"
                        + " last variance and 0.06 of the last squared return. rolling: the last 21 returns. As rivals, volatility-threshold looks at"
                        + " the asset's ewma volatility (storm above the window's 80 % quantile, calm below 60 %) and jump at its log"
                        + " realised volatility over 5 bars (penalty 50).");
        all.put(
                "tests",
                "Diebold and Mariano's statistic with the small-sample factor of Harvey, Leybourne and Newbold on Student's t;"
                        + " robust: variance with Bartlett's weights and floor(4 (n/100)^(2/9)) lags. p two-sided.");
        all.put(
                "pseudo_residuals",
                "u = sum_k p(k, one bar on) F_k(x), z its normal quantile, out of sample. The p-values of Jarque and Bera (z"
                        + " normal), Ljung and Box (z and z^2 without memory) and Kolmogorov and Smirnov (u uniform) are"
                        + " approximate, for parameters were estimated. once_in_bars = 1 / (2 min(u, 1 - u)).");
        all.put(
                "reproduction",
                "sample: the last accepted fit's window; implied: the model's own long run; drawn_low, drawn_high: the middle 95 %"
                        + " of 199 series as long, drawn from the model.");
        all.put(
                "single_bars",
                "Each observation left out in turn, parameters as they were; closes up to the next fit whose most likely regime"
                        + " would have been another.");
        return all;
    }
}
