package sojourn.trade;

/** What a movement of cash is. */
public enum LedgerKind {
    /** The capital to begin with. */
    CAPITAL("capital"),
    /** Earned on cash, or paid if cash is negative, at the cash rate. */
    INTEREST("interest"),
    /** What negative cash pays above the cash rate. */
    MARGIN_INTEREST("margin-interest"),
    /** Paid for borrowing what is held short. */
    BORROW_FEE("borrow-fee"),
    /** Paid by an asset to its holders, and by those who are short of it. */
    DIVIDEND("dividend"),
    /** The value of units bought (negative) or sold (positive), without costs. */
    TRADE("trade"),
    /** Paid to whoever trades for us. */
    COMMISSION("commission"),
    /** Paid for each leg, whatever its size. */
    FIXED_FEE("fixed-fee"),
    /** Lost between the middle and the bid or ask. */
    HALF_SPREAD("half-spread"),
    /** Tax on what is bought. */
    STAMP_DUTY("stamp-duty"),
    /** Lost because the order's own size moved the price. */
    IMPACT("impact"),
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
