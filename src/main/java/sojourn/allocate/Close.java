package sojourn.allocate;

import java.util.Optional;

/** One close as the sentence about it sees it: after the fact, so that nothing of it is kept until a sentence is asked for. */
final class Close {
    private final Situation situation;
    private final double[] probabilities;
    private final Optional<double[]> earlier;
    private final Stance before;
    private final Stance lived;

    /**
     * Takes over its arrays.
     *
     * @param probabilities that the rule goes by
     * @param earlier the same at the close before, if it had any
     * @param before the stance at the close before
     * @param lived the stance after this close
     */
    Close(Situation situation, double[] probabilities, Optional<double[]> earlier, Stance before, Stance lived) {
        this.situation = situation;
        this.probabilities = probabilities;
        this.earlier = earlier;
        this.before = before;
        this.lived = lived;
    }

    Situation situation() {
        return situation;
    }

    /** One a regime; not to be modified. */
    double[] probabilities() {
        return probabilities;
    }

    /** Those of the close before; not to be modified. */
    Optional<double[]> earlier() {
        return earlier;
    }

    Stance before() {
        return before;
    }

    Stance lived() {
        return lived;
    }

    /** The same, the close before it forgotten. */
    Close alone() {
        return new Close(situation, probabilities, Optional.empty(), before, lived);
    }

    /** The close before as far as it can be told: with the weights that are held now. Present exactly if {@link #earlier} is. */
    Optional<Close> closeBefore() {
        if (earlier.isEmpty()) {
            return Optional.empty();
        }
        Situation then = new Situation(
                situation.known().at(situation.bar() - 1),
                situation.reading().orElseThrow().before(),
                situation.regimes(),
                situation.weights(),
                situation.barsAhead());
        return Optional.of(new Close(then, earlier.get(), Optional.empty(), before, before));
    }
}
