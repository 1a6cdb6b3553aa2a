package sojourn.trade;

/** What a movement of cash is. */
public enum LedgerKind {
    /** The capital to begin with. */
    CAPITAL("capital"),
    /** Earned on cash, or paid if cash is negative. */
    INTEREST("interest"),
    /** The value of units bought (negative) or sold (positive), without costs. */
    TRADE("trade"),
    /** Paid to whoever trades for us. */
    COMMISSION("commission"),
    /** Lost between the close and the bid or ask. */
    HALF_SPREAD("half-spread"),
    /** What brings wealth to nothing at ruin: a debt that is not paid, or a rest that costs would exceed. */
    RUIN("ruin");

    private final String word;

    LedgerKind(String word) {
        this.word = word;
    }

    /** The word in files. */
    public String word() {
        return word;
    }
}
