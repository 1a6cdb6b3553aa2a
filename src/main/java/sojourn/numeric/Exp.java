package sojourn.numeric;

/**
 * The exponential function in plain IEEE arithmetic: the same bits on every machine, unlike {@code Math.exp}, and fast enough for
 * inner loops. exp(x) = 2^k exp(r) with k the whole number nearest to x / ln 2 and |r| ≤ ln 2 / 2, ln 2 split into two parts
 * (Cody and Waite 1980, Software Manual for the Elementary Functions, ch. 6), exp(r) by its Taylor series to r^13. Within 2 units
 * in the last place of {@code StrictMath.exp}, including results too small for a normal double.
 */
@SuppressWarnings("FloatingPointLiteralPrecision") // ln 2 in two parts, printed as usual
public final class Exp {
    private static final double PER_LN2 = 1.44269504088896338700;
    /** ln 2 to 33 bits, so that k times it is exact. */
    private static final double LN2_HIGH = 6.93147180369123816490e-01;

    private static final double LN2_LOW = 1.90821492927058770002e-10;
    /** Adding and subtracting it rounds to a whole number. */
    private static final double ROUNDING = 0x1.8p52;

    private static final double LOWEST_NORMAL = -708;
    private static final double HIGHEST_SIMPLE = 709;
    private static final double UNDERFLOW = -745.2;
    private static final double OVERFLOW = 709.8;

    private Exp() {}

    /** e^x; 0 below about -745.13, infinity above about 709.78, NaN for NaN. */
    public static double of(double x) {
        if (!(x >= LOWEST_NORMAL && x <= HIGHEST_SIMPLE)) {
            return far(x);
        }
        double k = (x * PER_LN2 + ROUNDING) - ROUNDING;
        return reduced((x - k * LN2_HIGH) - k * LN2_LOW) * powerOfTwo((int) k);
    }

    /**
     * Replaces every x by e^x, for -700 <= x <= 100, as e^(x/1024) squared ten times, that by its Taylor series to the ninth power.
     * Without a branch or a change between whole and broken numbers, in short loops, so that the compiler makes vectors of it. Relative
     * error below 4e-13 where |x| <= 100 and growing to 1e-5 at -700. {@code x} is modified.
     */
    public static void bySquaring(double[] x) {
        for (int t = 0; t < x.length; t++) {
            double y = x[t] * (1.0 / 1024);
            double s = y * y;
            double fourth = (1.0 / 24 + y * (1.0 / 120))
                    + s * ((1.0 / 720 + y * (1.0 / 5040)) + s * (1.0 / 40320 + y * (1.0 / 362880)));
            x[t] = (1 + y) + s * ((1.0 / 2 + y * (1.0 / 6)) + s * fourth);
        }
        for (int t = 0; t < x.length; t++) {
            double e = x[t] * x[t];
            e *= e;
            e *= e;
            e *= e;
            e *= e;
            e *= e;
            e *= e;
            e *= e;
            e *= e;
            x[t] = e * e;
        }
    }

    /** 2^k for -1022 <= k <= 1023, exactly. */
    public static double powerOfTwo(int k) {
        return Double.longBitsToDouble((long) (k + Double.MAX_EXPONENT) << 52);
    }

    private static double far(double x) {
        if (Double.isNaN(x)) {
            return x;
        }
        if (x < UNDERFLOW) {
            return 0;
        }
        if (x > OVERFLOW) {
            return Double.POSITIVE_INFINITY;
        }
        double k = (x * PER_LN2 + ROUNDING) - ROUNDING;
        int half = (int) k / 2; // two factors, since 2^k itself may not be a normal double
        return reduced((x - k * LN2_HIGH) - k * LN2_LOW) * powerOfTwo(half) * powerOfTwo((int) k - half);
    }

    /** exp(r) for |r| <= ln 2 / 2; the even and the odd half of the series side by side, which halves the waiting. */
    private static double reduced(double r) {
        double s = r * r;
        double even = 1.0 / 2
                + s * (1.0 / 24 + s * (1.0 / 720 + s * (1.0 / 40320 + s * (1.0 / 3628800 + s * (1.0 / 479001600)))));
        double odd = 1.0 / 6
                + s * (1.0 / 120 + s * (1.0 / 5040 + s * (1.0 / 362880 + s * (1.0 / 39916800 + s / 6227020800.0))));
        return 1 + (r + s * (even + r * odd));
    }
}
