package sojourn.numeric;

/**
 * A running sum with Neumaier's compensation: the rounding error of each addition is carried along and added at the
 * end, so that long sums of money and likelihoods keep their last digits. Source: Neumaier (1974), ZAMM 54, 39-51.
 */
public final class CompensatedSum {
    private double sum;
    private double compensation;

    /** Adds one term. */
    public void add(double term) {
        double next = sum + term;
        compensation += StrictMath.abs(sum) >= StrictMath.abs(term) ? (sum - next) + term : (term - next) + sum;
        sum = next;
    }

    /** The sum so far. */
    public double value() {
        return sum + compensation;
    }

    /** The sum of all of {@code terms}; 0 for none. Not modified. */
    public static double of(double... terms) {
        CompensatedSum total = new CompensatedSum();
        for (double term : terms) {
            total.add(term);
        }
        return total.value();
    }
}
