package sojourn.regime;

/** The kinds of gauge. */
public enum ModelKind {
    /** A Markov chain that is seen only through the observations. */
    HIDDEN_MARKOV("hidden-markov"),
    /** Every bar draws its regime afresh, whatever came before. */
    MIXTURE("mixture"),
    /** There is a single regime. */
    ONE_REGIME("one-regime"),
    /** Recent volatility lies above or below a line. */
    VOLATILITY_THRESHOLD("volatility-threshold"),
    /** The nearest of a few centres, every change costing a penalty. */
    JUMP("jump"),
    /** Probabilities that were computed elsewhere; nothing is fitted but what they say of returns. */
    GIVEN("given");

    private final String word;

    ModelKind(String word) {
        this.word = word;
    }

    /** Whether observations have a density in each regime, so that a fit maximises their likelihood. */
    public boolean hasLikelihood() {
        return this == HIDDEN_MARKOV || this == MIXTURE || this == ONE_REGIME;
    }

    /** Whether it is fitted, so that a strategy file may name it as its model. */
    public boolean fitted() {
        return this != GIVEN;
    }

    /** The word of the strategy file. */
    public String word() {
        return word;
    }
}
