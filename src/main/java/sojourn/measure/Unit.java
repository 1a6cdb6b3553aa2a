package sojourn.measure;

/** What a measure's number counts. */
public enum Unit {
    /** A fraction: 0.01 is one percent. */
    FRACTION("fraction", false),
    /** A fraction per year. */
    FRACTION_PER_YEAR("fraction per year", true),
    /** Times per year. */
    TIMES_PER_YEAR("times per year", true),
    /** A ratio whose size depends on its being annualised. */
    RATIO_PER_YEAR("annualised ratio", true),
    /** Bars. */
    BARS("bars", false),
    /** A number without a unit. */
    NUMBER("number", false);

    private final String word;
    private final boolean annualised;

    Unit(String word, boolean annualised) {
        this.word = word;
        this.annualised = annualised;
    }

    /** The unit in words. */
    public String word() {
        return word;
    }

    /** Whether a number of this unit is scaled to a year, which a window under one year does not allow. */
    public boolean annualised() {
        return annualised;
    }
}
