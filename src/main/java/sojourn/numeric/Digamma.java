package sojourn.numeric;

/**
 * The digamma function psi(x) = d ln Gamma(x) / dx for x > 0: psi(x) = psi(x + 1) - 1/x up to x of at least 10, then the asymptotic
 * series ln x - 1/(2x) - sum_n B_2n / (2n x^2n) to n = 7 (Abramowitz and Stegun 1964, 6.3.5 and 6.3.18). Plain arithmetic and {@code
 * StrictMath.log}; absolute error below 1e-14 for x above 0.1.
 */
public final class Digamma {
    private static final double LARGE = 10;

    private Digamma() {}

    /** psi(x); refuses x that is not positive and finite. */
    public static double of(double x) {
        Check.above(x, 0, "argument of digamma");
        double shift = 0;
        double y = x;
        while (y < LARGE) {
            shift += 1 / y;
            y += 1;
        }
        double z = 1 / (y * y);
        double series = z
                * (1.0 / 12
                        - z
                                * (1.0 / 120
                                        - z
                                                * (1.0 / 252
                                                        - z
                                                                * (1.0 / 240
                                                                        - z
                                                                                * (1.0 / 132
                                                                                        - z
                                                                                                * (691.0 / 32760
                                                                                                        - z / 12))))));
        return StrictMath.log(y) - 0.5 / y - series - shift;
    }
}
