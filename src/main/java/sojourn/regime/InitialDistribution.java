package sojourn.regime;

/** Where a chain of regimes starts. */
public enum InitialDistribution {
    /** Anywhere: estimated, K - 1 more parameters. */
    FREE("free"),
    /** In its long run: the stationary distribution of the transition matrix, no further parameter. */
    STATIONARY("stationary");

    private final String word;

    InitialDistribution(String word) {
        this.word = word;
    }

    /** The word of the strategy file. */
    public String word() {
        return word;
    }
}
