package sojourn.inference;

/**
 * A test of a hypothesis: its statistic, and the probability of one at least as extreme if the hypothesis held.
 *
 * @param statistic undefined with the reason
 * @param pValue defined exactly where the statistic is
 */
public record TestResult(Estimate statistic, Estimate pValue) {
    /** No result, and why. */
    static TestResult undefined(Estimate because) {
        return new TestResult(because, because);
    }

    /** Both numbers; out of range unless both are finite. */
    static TestResult of(double statistic, double pValue) {
        Estimate first = Estimate.of(statistic);
        Estimate second = Estimate.of(pValue);
        return first instanceof Estimate.Undefined ? undefined(first) : new TestResult(first, second);
    }

    /** A statistic that is chi-squared with {@code dof} degrees of freedom if the hypothesis holds, large values against it. */
    static TestResult chiSquare(double statistic, int dof) {
        return Double.isFinite(statistic)
                ? of(statistic, Probability.chiSquareAbove(statistic, dof))
                : undefined(Estimate.of(statistic));
    }
}
