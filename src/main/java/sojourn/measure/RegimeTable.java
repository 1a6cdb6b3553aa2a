package sojourn.measure;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import sojourn.inference.Moments;
import sojourn.numeric.Check;

/**
 * Returns by regime, where the label of a bar is the regime that was most likely at the close before it, so that every row could have
 * been lived. Cost: one pass a regime.
 */
public final class RegimeTable {
    /** The label of a bar before which no regime was known; such bars are counted in no row. */
    public static final int UNKNOWN = -1;

    private final List<Row> rows;

    /**
     * One regime: bars, their share of all labelled bars, mean and standard deviation (divisor n - 1) of the return per bar, and the compounded
     * return of these bars alone. The mean is undefined for no bars, the deviation for fewer than two, the share if no bar is labelled.
     */
    public record Row(int regime, int bars, Measured share, Measured mean, Measured deviation, double compounded) {}

    private RegimeTable(List<Row> rows) {
        this.rows = List.copyOf(rows);
    }

    /**
     * Of labels and returns of the same bars.
     *
     * @param labelAtPreviousClose 0..regimes-1, or {@link #UNKNOWN}. Not modified.
     * @param returns simple. Not modified.
     * @param regimes number of regimes, at least 1; one without bars has a row too
     */
    public static RegimeTable of(int[] labelAtPreviousClose, double[] returns, int regimes) {
        Check.that(
                labelAtPreviousClose.length == returns.length,
                labelAtPreviousClose.length + " labels for " + returns.length + " returns");
        Check.within(regimes, 1, Integer.MAX_VALUE, "regimes");
        int labelled = 0;
        for (int label : labelAtPreviousClose) {
            labelled += Check.within(label, UNKNOWN, regimes - 1, "a label") == UNKNOWN ? 0 : 1;
        }
        List<Row> rows = new ArrayList<>();
        for (int regime = 0; regime < regimes; regime++) {
            rows.add(row(regime, only(regime, labelAtPreviousClose, returns), labelled));
        }
        return new RegimeTable(rows);
    }

    /** A row a regime, in their order. */
    public List<Row> rows() {
        return rows;
    }

    private static Row row(int regime, double[] own, int labelled) {
        Measured share = labelled == 0 ? Measured.tooFew(0, 1) : Measured.of((double) own.length / labelled);
        if (own.length == 0) {
            return new Row(regime, 0, share, Measured.tooFew(0, 1), Measured.tooFew(0, 2), 0);
        }
        Moments moments = Moments.of(own);
        return new Row(
                regime,
                own.length,
                share,
                Measured.of(moments.mean()),
                Measured.from(moments.standardDeviation()),
                Growth.compounded(own));
    }

    private static double[] only(int regime, int[] labels, double[] returns) {
        double[] own = new double[returns.length];
        int size = 0;
        for (int i = 0; i < returns.length; i++) {
            if (labels[i] == regime) {
                own[size++] = returns[i];
            }
        }
        return Arrays.copyOf(own, size);
    }
}
