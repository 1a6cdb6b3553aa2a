package sojourn.regime;

import sojourn.numeric.Check;

/** A single regime: independent observations from one distribution. */
public final class OneRegime implements RegimeModel {
    private final Emission emission;

    private OneRegime(Emission emission) {
        this.emission = emission;
    }

    /** The model of an emission with one state. */
    public static OneRegime of(Emission emission) {
        Check.within(emission.states(), 1, 1, "states of a single regime");
        return new OneRegime(emission);
    }

    @Override
    public int states() {
        return 1;
    }

    @Override
    public double initial(int k) {
        Check.within(k, 0, 0, "state");
        return 1;
    }

    @Override
    public double transition(int i, int j) {
        Check.that(i == 0 && j == 0, "states " + i + " and " + j + " of a single regime");
        return 1;
    }

    @Override
    public Emission emission() {
        return emission;
    }

    @Override
    public int parameterCount() {
        return emission.parameterCount();
    }

    @Override
    public OneRegime ordered(int[] order) {
        return new OneRegime(emission.ordered(order));
    }
}
