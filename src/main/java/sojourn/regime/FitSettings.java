package sojourn.regime;

import java.util.Optional;
import sojourn.numeric.Check;

/**
 * What to fit.
 *
 * @param kind how regimes follow one another; one that has a likelihood
 * @param states number of regimes, 1 to 6; 1 for a single regime
 * @param emission the family of the observations
 * @param initial where a chain starts; of no concern to other kinds
 * @param starts how often the search starts, at least 1: one deterministic start, the others random
 * @param prior what is believed beforehand, of a chain of several regimes seen through one series with normal emissions; a single
 *     regime has no use for it and is fitted without
 */
public record FitSettings(
        ModelKind kind,
        int states,
        EmissionFamily emission,
        InitialDistribution initial,
        int starts,
        Optional<Prior> prior)
        implements GaugeSettings {
    /** The most series that a model may see. */
    public static final int MOST_SERIES = 6;

    /** The most states that a model may have. */
    public static final int MOST_STATES = 6;

    public FitSettings {
        Check.within(states, 1, MOST_STATES, "states");
        Check.within(starts, 1, Integer.MAX_VALUE, "starts");
        Check.that(kind.hasLikelihood(), kind.word() + " has no likelihood");
        Check.that(kind != ModelKind.ONE_REGIME || states == 1, "a one-regime model with " + states + " states");
        Check.that(
                prior.isEmpty() || (kind == ModelKind.HIDDEN_MARKOV && emission.takesPrior()),
                "a prior for " + kind.word() + " with " + emission.word() + " emissions");
    }

    /** The same without a prior. */
    public FitSettings(ModelKind kind, int states, EmissionFamily emission, InitialDistribution initial, int starts) {
        this(kind, states, emission, initial, starts, Optional.empty());
    }

    /** The same with a free initial distribution. */
    public FitSettings(ModelKind kind, int states, EmissionFamily emission, int starts) {
        this(kind, states, emission, InitialDistribution.FREE, starts);
    }

    /** The fewest observations of one series that such a fit needs: some for each state, and more than there are parameters. */
    @Override
    public int leastObservations() {
        return leastObservations(1);
    }

    @Override
    public int leastObservations(int series) {
        return StrictMath.max(Soundness.leastCount(series) * states, parameterCount(series) + 1);
    }

    @Override
    public Fit fit(FitRequest request, StartRunner runner) {
        return Fitter.fit(this, request, runner);
    }

    /** Number of free parameters of such a model of one series. */
    public int parameterCount() {
        return parameterCount(1);
    }

    /** The same for so many series. */
    public int parameterCount(int dimension) {
        int first = initial == InitialDistribution.FREE ? states - 1 : 0;
        int chain = switch (kind) {
            case HIDDEN_MARKOV -> states * (states - 1) + first;
            case MIXTURE -> states - 1;
            default -> 0;
        };
        return chain + emission.parameterCount(states, dimension);
    }
}
