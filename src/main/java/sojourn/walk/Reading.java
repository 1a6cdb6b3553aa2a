package sojourn.walk;

import java.util.Optional;
import sojourn.numeric.Check;
import sojourn.regime.WindowMoments;

/** What was known of the regimes at one close: probabilities, how they move on, and what each regime means for returns. */
public final class Reading {
    private final int fit;
    private final double[] filtered;
    private final double[] transition;
    private final WindowMoments moments;
    private final Optional<Reading> before;
    private final Optional<Reading> withoutRefit;

    private Reading(
            int fit,
            double[] filtered,
            double[] transition,
            WindowMoments moments,
            Optional<Reading> before,
            Optional<Reading> withoutRefit) {
        this.fit = fit;
        this.filtered = filtered;
        this.transition = transition;
        this.moments = moments;
        this.before = before;
        this.withoutRefit = withoutRefit;
    }

    /**
     * Copies its arrays. Neither modified.
     *
     * @param fit the number of the fit in force, from 1
     * @param filtered probability of each regime at this close, sums to 1
     * @param transition states × states, row-major: probability of the next regime (column) given this one (row)
     * @param moments of the fit in force
     */
    public static Reading of(int fit, double[] filtered, double[] transition, WindowMoments moments) {
        int states = filtered.length;
        Check.that(
                transition.length == states * states && moments.states() == states,
                states + " probabilities, " + transition.length + " transitions, moments of " + moments.states());
        return new Reading(fit, filtered.clone(), transition.clone(), moments, Optional.empty(), Optional.empty());
    }

    /** Shares its arrays, which nobody may modify afterwards. */
    static Reading sharing(int fit, double[] filtered, double[] transition, WindowMoments moments) {
        return new Reading(fit, filtered, transition, moments, Optional.empty(), Optional.empty());
    }

    /** The same, knowing what was read at the close before. */
    public Reading following(Reading closeBefore) {
        return new Reading(fit, filtered, transition, moments, Optional.of(closeBefore), withoutRefit);
    }

    /** The same, of a close at which a fit was accepted: {@code unmoved} is what the fit before it says of this close. */
    public Reading refitted(Reading unmoved) {
        return new Reading(fit, filtered, transition, moments, before, Optional.of(unmoved));
    }

    /** What was read at the close before; empty where nothing was. */
    public Optional<Reading> before() {
        return before;
    }

    /**
     * At a close at which a fit was accepted, what the fit in force before says of it, parameters frozen: the difference is the
     * refit's doing. Empty at other closes, and where no fit was in force before.
     */
    public Optional<Reading> withoutRefit() {
        return withoutRefit;
    }

    /** The fit in force, counted from 1. */
    public int fit() {
        return fit;
    }

    /** Number of regimes. */
    public int states() {
        return filtered.length;
    }

    /** Probability of regime {@code k} now, given all observations up to this close. */
    public double filtered(int k) {
        return filtered[k];
    }

    /** Probability of each regime now, a copy. */
    public double[] filtered() {
        return filtered.clone();
    }

    /** The regime of the highest filtered probability; ties go to the one of lower volatility. */
    public int mostLikely() {
        int best = 0;
        for (int k = 1; k < filtered.length; k++) {
            best = filtered[k] > filtered[best] ? k : best;
        }
        return best;
    }

    /** Probability of each regime {@code bars} bars ahead: p A^bars, by repeated steps. */
    public double[] predicted(int bars) {
        return ahead(filtered, bars);
    }

    private double[] ahead(double[] from, int bars) {
        Check.within(bars, 0, Integer.MAX_VALUE, "bars");
        int states = filtered.length;
        double[] now = from.clone();
        for (int step = 0; step < bars; step++) {
            double[] next = new double[states];
            for (int i = 0; i < states; i++) {
                for (int j = 0; j < states; j++) {
                    next[j] += now[i] * transition[i * states + j];
                }
            }
            now = next;
        }
        return now;
    }

    /** What each regime means for returns, by the fit in force. */
    public WindowMoments moments() {
        return moments;
    }

    /** What one bar, {@code barsAhead} bars from now, is expected to return. */
    public Forecast forecast(int barsAhead) {
        return forecast(filtered, barsAhead);
    }

    /** The same with regimes' means moved by {@code part} of the way to the window's overall mean, in [0, 1]. */
    public Reading shrinkingMeans(double part) {
        return new Reading(fit, filtered, transition, moments.shrinkingMeans(part), before, withoutRefit);
    }

    /** As {@link #forecast(int)} if the regimes now had the probabilities {@code from}, one a regime. Not modified. */
    public Forecast forecast(double[] from, int barsAhead) {
        Check.that(from.length == filtered.length, from.length + " probabilities of " + filtered.length + " regimes");
        return Forecast.mixing(ahead(from, barsAhead), moments);
    }
}
