package sojourn.inference;

import sojourn.numeric.Check;
import sojourn.numeric.CompensatedSum;

/**
 * Count, mean and central moments of a sample, m_k = (1/n) sum (x - mean)^k for k = 2, 3, 4. Two passes with compensated sums,
 * and the rounding of the first pass's mean taken out of every moment, so that a large mean does not swallow a small spread.
 * Cost: two reads of the data. Joanes and Gill (1998), The Statistician 47, 183-189, for the four shape statistics.
 */
public final class Moments {
    private static final double RELATIVE_SPREAD_OF_A_CONSTANT = 1e-12;

    private final int count;
    private final double mean;
    private final double m2;
    private final double m3;
    private final double m4;

    private Moments(int count, double mean, double m2, double m3, double m4) {
        this.count = count;
        this.mean = mean;
        this.m2 = m2;
        this.m3 = m3;
        this.m4 = m4;
    }

    /**
     * The moments of {@code values}. Not modified.
     *
     * @param values at least one, all finite; anything else is refused
     */
    public static Moments of(double... values) {
        int n = values.length;
        Check.that(n > 0, "there are no values, moments need at least one");
        CompensatedSum total = new CompensatedSum();
        for (int i = 0; i < n; i++) {
            total.add(Check.finite(values[i], "value", i));
        }
        double near = total.value() / n;
        CompensatedSum first = new CompensatedSum();
        CompensatedSum second = new CompensatedSum();
        CompensatedSum third = new CompensatedSum();
        CompensatedSum fourth = new CompensatedSum();
        for (double value : values) {
            double d = value - near;
            first.add(d);
            second.add(d * d);
            third.add(d * d * d);
            fourth.add(d * d * d * d);
        }
        // Moments about `near`, moved to the mean near + shift (binomial expansion).
        double shift = first.value() / n;
        double a2 = second.value() / n;
        double a3 = third.value() / n;
        double a4 = fourth.value() / n;
        double square = shift * shift;
        return new Moments(
                n,
                near + shift,
                Math.max(0, a2 - square),
                a3 - 3 * shift * a2 + 2 * shift * square,
                a4 - 4 * shift * a3 + 6 * square * a2 - 3 * square * square);
    }

    /** Number of values. */
    public int count() {
        return count;
    }

    /** The arithmetic mean. */
    public double mean() {
        return mean;
    }

    /** The variance with divisor n; 0 for one value. */
    public double populationVariance() {
        return m2;
    }

    /** The standard deviation with divisor n - 1. Undefined for one value; 0 for a constant. */
    public Estimate standardDeviation() {
        return count < 2 ? Estimate.tooFew(count, 2) : Estimate.of(sampleDeviation());
    }

    /** Whether the values count as constant: standard deviation (n - 1) below 1e-12 max(1, |mean|), or a single value. */
    public boolean constant() {
        return count < 2 || sampleDeviation() < RELATIVE_SPREAD_OF_A_CONSTANT * Math.max(1, Math.abs(mean));
    }

    /** g1 = m3 / m2^1.5. Undefined for fewer than two values or a constant. */
    public Estimate skewness() {
        return shape(2, m3 / (m2 * Math.sqrt(m2)));
    }

    /** g2 = m4 / m2^2 - 3, 0 for a normal. Undefined for fewer than two values or a constant. */
    public Estimate excessKurtosis() {
        return shape(2, m4 / (m2 * m2) - 3);
    }

    /** G1 = g1 sqrt(n (n - 1)) / (n - 2). Undefined for fewer than three values or a constant. */
    public Estimate sampleSkewness() {
        double n = count;
        return shape(3, m3 / (m2 * Math.sqrt(m2)) * Math.sqrt(n * (n - 1)) / (n - 2));
    }

    /** G2 = (n - 1) ((n + 1) g2 + 6) / ((n - 2)(n - 3)). Undefined for fewer than four values or a constant. */
    public Estimate sampleExcessKurtosis() {
        double n = count;
        return shape(4, (n - 1) / ((n - 2) * (n - 3)) * ((n + 1) * (m4 / (m2 * m2) - 3) + 6));
    }

    private Estimate shape(int needed, double amount) {
        if (count < needed) {
            return Estimate.tooFew(count, needed);
        }
        return constant() ? Estimate.zeroVariance() : Estimate.of(amount);
    }

    private double sampleDeviation() {
        return Math.sqrt(m2 * count / (count - 1));
    }
}
