package sojourn.regime;

/** How regimes follow one another. */
public enum ModelKind {
    /** A Markov chain that is seen only through the observations. */
    HIDDEN_MARKOV("hidden-markov"),
    /** Every bar draws its regime afresh, whatever came before. */
    MIXTURE("mixture"),
    /** There is a single regime. */
    ONE_REGIME("one-regime");

    private final String word;

    ModelKind(String word) {
        this.word = word;
    }

    /** The word of the strategy file. */
    public String word() {
        return word;
    }
}
