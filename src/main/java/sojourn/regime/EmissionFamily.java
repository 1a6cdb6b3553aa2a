package sojourn.regime;

/** The family of distributions that a regime's observations come from. */
public enum EmissionFamily {
    /** Normal, each regime with its own mean and standard deviation. */
    NORMAL("normal"),
    /** Normal with mean zero in every regime: only the volatility changes. */
    NORMAL_ZERO_MEAN("normal-zero-mean");

    private final String word;

    EmissionFamily(String word) {
        this.word = word;
    }

    /** The word of the strategy file. */
    public String word() {
        return word;
    }

    /** Whether the means are estimated. */
    boolean estimatesMeans() {
        return this == NORMAL;
    }
}
