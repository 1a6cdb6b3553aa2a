package sojourn.market;

/** The length of a bar, with the periods per year that it is declared to have. */
public enum BarLength {
    /** A trading day. */
    DAILY("daily", 252),
    /** A week. */
    WEEKLY("weekly", 52),
    /** A calendar month. */
    MONTHLY("monthly", 12);

    private final String word;
    private final double periodsPerYear;

    BarLength(String word, double periodsPerYear) {
        this.word = word;
        this.periodsPerYear = periodsPerYear;
    }

    /** The word of the strategy file. */
    public String word() {
        return word;
    }

    /** Periods per year, declared, never estimated. */
    public double periodsPerYear() {
        return periodsPerYear;
    }
}
