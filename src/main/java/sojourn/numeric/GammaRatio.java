package sojourn.numeric;

/**
 * ln(Gamma(a + 1/2) / Gamma(a)), taken as one function: the difference of two log-gamma values would lose all digits for large a.
 * Up to a of at least 16 by Gamma(a + 1) = a Gamma(a), then the asymptotic series ln(a)/2 - 1/(8a) + 1/(192 a^3) - 1/(640 a^5) +
 * 17/(14336 a^7) - 31/(18432 a^9) (from Stirling's series, Abramowitz and Stegun 1964, 6.1.40). Plain arithmetic and {@code
 * StrictMath.log}; absolute error below 1e-14.
 */
public final class GammaRatio {
    private static final double LARGE = 16;

    private GammaRatio() {}

    /** ln(Gamma(a + 1/2) / Gamma(a)); refuses {@code a} that is not positive and finite. */
    public static double ofHalfStep(double a) {
        Check.above(a, 0, "argument of the gamma ratio");
        double factor = 1;
        double y = a;
        while (y < LARGE) {
            factor *= y / (y + 0.5);
            y += 1;
        }
        double z = 1 / (y * y);
        double series = (-1.0 / 8 + z * (1.0 / 192 - z * (1.0 / 640 - z * (17.0 / 14336 - z * 31.0 / 18432)))) / y;
        return 0.5 * StrictMath.log(y) + series + StrictMath.log(factor);
    }
}
