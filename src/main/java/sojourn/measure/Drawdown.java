package sojourn.measure;

import java.time.LocalDate;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import sojourn.numeric.Check;
import sojourn.numeric.CompensatedSum;

/**
 * How far wealth stood below its running peak: depth_t = W_t / max_{s <= t} W_s - 1, a number in [-1, 0], at all n + 1 points. The peak is the first
 * point at the running maximum, the trough the earliest of equal depths. Ulcer index: Martin and McCann (1989), The Investor's Guide to Fidelity
 * Funds. Cost: one pass.
 */
public final class Drawdown {
    private final double[] depths;
    private final double worst;
    private final int longestUnderwaterBars;
    private final double ulcer;
    private final Optional<Episode> episode;

    /**
     * The worst fall: points (0-based, the base point is 0) and dates of its peak, its trough and, if it came, its recovery, the first later point
     * with wealth at least the peak's.
     */
    public record Episode(
            int peak,
            int trough,
            OptionalInt recovery,
            LocalDate peakDate,
            LocalDate troughDate,
            Optional<LocalDate> recoveryDate) {
        /** Bars from the peak to the trough. */
        public int barsDown() {
            return trough - peak;
        }

        /** Bars from the trough to the recovery, if it came. */
        public OptionalInt barsUp() {
            return recovery.isPresent() ? OptionalInt.of(recovery.getAsInt() - trough) : OptionalInt.empty();
        }
    }

    private Drawdown(
            double[] depths, double worst, int longestUnderwaterBars, double ulcer, Optional<Episode> episode) {
        this.depths = depths;
        this.worst = worst;
        this.longestUnderwaterBars = longestUnderwaterBars;
        this.ulcer = ulcer;
        this.episode = episode;
    }

    /** Of the wealth of a path. */
    public static Drawdown of(EvaluatedPath path) {
        return of(path.dates(), path.wealth());
    }

    /**
     * Of a series of wealth.
     *
     * @param dates one a point
     * @param wealth at least one point, the first above 0, none below 0. Not modified.
     */
    public static Drawdown of(List<LocalDate> dates, double[] wealth) {
        Check.that(wealth.length > 0, "there is no wealth, a drawdown needs at least one point");
        Check.that(dates.size() == wealth.length, dates.size() + " dates for " + wealth.length + " amounts of wealth");
        Check.above(wealth[0], 0, "wealth 0");
        double[] depths = new double[wealth.length];
        int runningPeak = 0;
        int peak = 0;
        int trough = 0;
        int underwater = 0;
        int longest = 0;
        CompensatedSum squares = new CompensatedSum();
        for (int t = 0; t < wealth.length; t++) {
            Check.atLeast(wealth[t], 0, "wealth", t);
            if (wealth[t] > wealth[runningPeak]) {
                runningPeak = t;
            }
            depths[t] = wealth[t] / wealth[runningPeak] - 1;
            squares.add(depths[t] * depths[t]);
            underwater = depths[t] < 0 ? underwater + 1 : 0;
            longest = Math.max(longest, underwater);
            if (depths[t] < depths[trough]) {
                trough = t;
                peak = runningPeak;
            }
        }
        Optional<Episode> episode =
                depths[trough] < 0 ? Optional.of(episode(dates, wealth, peak, trough)) : Optional.empty();
        return new Drawdown(depths, depths[trough], longest, Math.sqrt(squares.value() / wealth.length), episode);
    }

    /** The lowest depth, in [-1, 0]; 0 if wealth never fell. */
    public double worst() {
        return worst;
    }

    /** The longest run of points below an earlier peak, in bars; one that has not ended counts as far as it goes. */
    public int longestUnderwaterBars() {
        return longestUnderwaterBars;
    }

    /** sqrt(mean depth^2) over all n + 1 points, a fraction. */
    public double ulcer() {
        return ulcer;
    }

    /** Where the worst fall lies; empty if wealth never fell. */
    public Optional<Episode> episode() {
        return episode;
    }

    /** The depth at each of the n + 1 points. A copy. */
    public double[] depths() {
        return depths.clone();
    }

    private static Episode episode(List<LocalDate> dates, double[] wealth, int peak, int trough) {
        int recovery = trough + 1;
        while (recovery < wealth.length && wealth[recovery] < wealth[peak]) {
            recovery++;
        }
        boolean came = recovery < wealth.length;
        return new Episode(
                peak,
                trough,
                came ? OptionalInt.of(recovery) : OptionalInt.empty(),
                dates.get(peak),
                dates.get(trough),
                came ? Optional.of(dates.get(recovery)) : Optional.empty());
    }
}
