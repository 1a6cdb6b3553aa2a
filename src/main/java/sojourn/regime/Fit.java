package sojourn.regime;

import java.util.List;
import java.util.Optional;

/**
 * One fit of a gauge to a window: how it ended, the gauge with its states in role order (ascending volatility of the
 * order-by series; as given for given parameters), and what the window says about each state. Immutable.
 */
public final class Fit {
    private final Outcome outcome;
    private final String explanation;
    private final Search search;
    private final int observations;
    private final Optional<Described> described;
    private final List<String> events;

    private Fit(
            Outcome outcome,
            String explanation,
            Search search,
            int observations,
            Optional<Described> described,
            List<String> events) {
        this.outcome = outcome;
        this.explanation = explanation;
        this.search = search;
        this.observations = observations;
        this.described = described;
        this.events = List.copyOf(events);
    }

    /** What the search for the maximum took. */
    record Search(int iterations, int starts, int agreeing, Optional<RunnerUp> runnerUp) {
        static final Search NONE = new Search(0, 0, 0, Optional.empty());
        static final Search CLOSED_FORM = new Search(0, 1, 1, Optional.empty());
    }

    /** A fit without a gauge, and why. */
    static Fit failed(String explanation, Search search, int observations) {
        return new Fit(Outcome.FAILED, explanation, search, observations, Optional.empty(), List.of());
    }

    /** A fit with a gauge. */
    static Fit of(
            Outcome outcome,
            String explanation,
            Search search,
            int observations,
            Described described,
            List<String> events) {
        return new Fit(outcome, explanation, search, observations, Optional.of(described), events);
    }

    /** How the fit ended. */
    public Outcome outcome() {
        return outcome;
    }

    /**
     * Why the outcome is not {@link Outcome#CONVERGED}, in plain words; empty when it is. A state is written {@code {k}}, as in
     * {@link #events()}; a series of several observed is written {@code [j]}, its column.
     */
    public String explanation() {
        return explanation;
    }

    /** What was fitted, states in role order; empty when the fit failed. A degenerate fit shows it, not to be used. */
    public Optional<Gauge> gauge() {
        return described.map(Described::gauge);
    }

    /** The gauge, if it has a likelihood: states in role order, empty when the fit failed. */
    public Optional<RegimeModel> model() {
        return described.flatMap(Described::model);
    }

    /**
     * Natural log of the likelihood of the window by the plain filter; minus infinity when there is no model, so ask
     * {@link #model()} first.
     */
    public double logLikelihood() {
        return described.map(Described::logLikelihood).orElse(Double.NEGATIVE_INFINITY);
    }

    /** Evaluations of the likelihood from the start that won; 0 for a closed form or given parameters. */
    public int iterations() {
        return search.iterations();
    }

    /** Number of starts tried, the previous fit included; 1 for a closed form, 0 for given parameters. */
    public int starts() {
        return search.starts();
    }

    /** Starts that ended within 1e-4 nats of the one that won, itself included. */
    public int startsAgreeing() {
        return search.agreeing();
    }

    /** The second best place where starts ended, degenerate ones aside; empty where all agree. */
    public Optional<RunnerUp> runnerUp() {
        return search.runnerUp();
    }

    /** Observations in the window, missing rows not counted. */
    public int observations() {
        return observations;
    }

    /** Posterior-weighted standard deviation of the order-by returns in each state; empty without a gauge. A copy. */
    public double[] orderBy() {
        return described.map(d -> d.orderBy().deviations()).orElse(new double[0]);
    }

    /** Share of the window's observations that each state accounts for, sums to 1; empty without a gauge. A copy. */
    public double[] occupancy() {
        return described.map(d -> d.orderBy().occupancy()).orElse(new double[0]);
    }

    /**
     * What is worth telling about this fit, one line each: a fixed word, then details. A state is written {@code {k}}, its index
     * in role order, so that names can be filled in: {@code near-tie {0}/{1}}.
     */
    public List<String> events() {
        return events;
    }

    /** Moments of all assets in each state; present exactly when the gauge is. */
    public Optional<WindowMoments> moments() {
        return described.map(Described::moments);
    }
}
