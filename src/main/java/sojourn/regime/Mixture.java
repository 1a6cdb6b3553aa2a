package sojourn.regime;

import sojourn.numeric.Check;

/** An independent mixture: each bar draws its regime with the same weights, whatever came before. */
public final class Mixture implements RegimeModel {
    private final double[] weights;
    private final Emission emission;

    private Mixture(double[] weights, Emission emission) {
        this.weights = weights;
        this.emission = emission;
    }

    /** One weight a state, summing to 1. Copied; not modified. */
    public static Mixture of(double[] weights, Emission emission) {
        Check.that(
                weights.length == emission.states(), weights.length + " weights for " + emission.states() + " states");
        HiddenMarkov.checkDistribution(weights, 0, weights.length, "weights");
        return new Mixture(weights.clone(), emission);
    }

    @Override
    public int states() {
        return weights.length;
    }

    @Override
    public double initial(int k) {
        return weights[k];
    }

    @Override
    public double transition(int i, int j) {
        return weights[j];
    }

    @Override
    public Emission emission() {
        return emission;
    }

    @Override
    public int parameterCount() {
        return weights.length - 1 + emission.parameterCount();
    }

    @Override
    public Mixture ordered(int[] order) {
        return new Mixture(Order.apply(order, weights), emission.ordered(order));
    }
}
