package sojourn.numeric;

/**
 * The natural logarithm in plain IEEE arithmetic: the same bits on every machine, unlike {@code Math.log}, and fast enough for
 * inner loops. x = 2^k m with m between sqrt(1/2) and sqrt(2), ln x = k ln 2 + ln m and ln m = 2 artanh((m - 1) / (m + 1)) by its
 * Taylor series, ln 2 split into two parts (Cody and Waite 1980, Software Manual for the Elementary Functions, ch. 5). Within 4
 * units in the last place of {@code StrictMath.log} or 4e-16, whichever is larger.
 */
@SuppressWarnings("FloatingPointLiteralPrecision") // ln 2 in two parts, printed as usual
public final class Log {
    private static final double LN2_HIGH = 6.93147180369123816490e-01;
    private static final double LN2_LOW = 1.90821492927058770002e-10;
    private static final long SIGNIFICAND = 0x000fffffffffffffL;
    private static final long ONE = 0x3ff0000000000000L;
    private static final double ROOT_TWO = 1.4142135623730951;

    private Log() {}

    /** ln x for a normal, positive, finite {@code x}; what lies outside is left to {@code StrictMath.log}. */
    public static double of(double x) {
        if (!(x >= Double.MIN_NORMAL && x <= Double.MAX_VALUE)) {
            return StrictMath.log(x);
        }
        long bits = Double.doubleToRawLongBits(x);
        int k = (int) (bits >>> 52) - Double.MAX_EXPONENT;
        double m = Double.longBitsToDouble((bits & SIGNIFICAND) | ONE);
        if (m > ROOT_TWO) {
            m *= 0.5;
            k++;
        }
        double f = m - 1;
        double s = f / (2 + f);
        double z = s * s;
        double series =
                1.0 / 3 + z * (1.0 / 5 + z * (1.0 / 7 + z * (1.0 / 9 + z * (1.0 / 11 + z * (1.0 / 13 + z * tail(z))))));
        return k * LN2_HIGH + (2 * s + (2 * s * z * series + k * LN2_LOW));
    }

    private static double tail(double z) {
        return 1.0 / 15 + z * (1.0 / 17 + z * (1.0 / 19 + z / 21));
    }
}
