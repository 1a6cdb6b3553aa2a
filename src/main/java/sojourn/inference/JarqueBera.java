package sojourn.inference;

/**
 * Whether skewness and kurtosis are those of a normal: JB = n/6 (g1^2 + g2^2 / 4) with g1 = m3 / m2^1.5 and g2 = m4 / m2^2 - 3 (divisor n), chi-squared
 * with 2 degrees of freedom in large samples. Undefined for fewer than two values or a constant. Jarque and Bera (1980), Economics Letters 6, 255-259.
 */
public final class JarqueBera {
    private JarqueBera() {}

    /** The test. {@code values} is not modified. */
    public static TestResult of(double... values) {
        if (values.length < 2) {
            return TestResult.undefined(Estimate.tooFew(values.length, 2));
        }
        Moments moments = Moments.of(values);
        Estimate skewness = moments.skewness();
        Estimate kurtosis = moments.excessKurtosis();
        if (skewness instanceof Estimate.Value s && kurtosis instanceof Estimate.Value k) {
            double statistic = values.length / 6.0 * (s.amount() * s.amount() + 0.25 * k.amount() * k.amount());
            return TestResult.chiSquare(statistic, 2);
        }
        return TestResult.undefined(skewness instanceof Estimate.Undefined ? skewness : kurtosis);
    }
}
