package sojourn.measure;

import sojourn.numeric.CompensatedSum;

/**
 * The Sortino ratio per year, sqrt(P) (mean(r) - MAR) / downside deviation, downside deviation = sqrt((1/n) sum min(r - MAR, 0)^2) over all
 * n returns. Sortino and Price (1994), J. Investing 3(3), 59-64.
 */
public final class Sortino {
    private static final double NOTHING = 1e-12;

    private Sortino() {}

    /** sqrt((1/n) sum min(r - MAR, 0)^2), per period. Undefined for no returns. Not modified. */
    public static Measured downsideDeviation(double[] returns, double minimumAcceptableReturn) {
        if (returns.length == 0) {
            return Measured.tooFew(0, 1);
        }
        CompensatedSum squares = new CompensatedSum();
        for (double one : returns) {
            double shortfall = Math.min(one - minimumAcceptableReturn, 0);
            squares.add(shortfall * shortfall);
        }
        return Measured.of(Math.sqrt(squares.value() / returns.length));
    }

    /**
     * The ratio. Undefined for no returns and where the downside deviation is below 1e-12.
     *
     * @param returns per period, not over cash. Not modified.
     * @param minimumAcceptableReturn MAR, one constant per period
     */
    public static Measured perYear(double[] returns, double minimumAcceptableReturn, double periodsPerYear) {
        Measured downside = downsideDeviation(returns, minimumAcceptableReturn);
        if (!(downside instanceof Measured.Value deviation)) {
            return downside;
        }
        if (deviation.amount() < NOTHING) {
            return Measured.undefined(Measured.Reason.NO_DOWNSIDE, "no return fell short of the hurdle");
        }
        double mean = CompensatedSum.of(returns) / returns.length;
        return Measured.of(Math.sqrt(periodsPerYear) * (mean - minimumAcceptableReturn) / deviation.amount());
    }
}
