package sojourn.evidence;

import java.util.function.DoubleUnaryOperator;
import sojourn.inference.Estimate;
import sojourn.inference.WeightedMoments;

/**
 * Moments per bar brought to a year: the mean times P bars a year, the deviation times sqrt P, errors alike. Undefined
 * where the weights, which say how many bars of the regime there were, sum to less than a year of bars: nothing is annualised from less.
 *
 * @param mean P m
 * @param meanError its standard error
 * @param volatility sqrt(P) s
 * @param volatilityError its standard error
 */
public record Annual(Estimate mean, Estimate meanError, Estimate volatility, Estimate volatilityError) {
    /** Of moments of the subject's returns. */
    public static Annual of(WalkedRegimes subject, WeightedMoments moments) {
        double periods = subject.barsPerYear();
        if (moments.weight() < periods && moments.mean() instanceof Estimate.Value) {
            Estimate none = new Estimate.Undefined(
                    Estimate.Reason.TOO_FEW_OBSERVATIONS, "there is less than a year of bars of this regime");
            return new Annual(none, none, none, none);
        }
        double root = Math.sqrt(periods);
        return new Annual(
                scaled(moments.mean(), m -> periods * m),
                scaled(moments.meanError(), e -> periods * e),
                scaled(moments.deviation(), s -> root * s),
                scaled(moments.deviationError(), e -> root * e));
    }

    private static Estimate scaled(Estimate estimate, DoubleUnaryOperator by) {
        return estimate instanceof Estimate.Value value ? Estimate.of(by.applyAsDouble(value.amount())) : estimate;
    }
}
