package sojourn.trade;

/**
 * Something that kept an order from filling as it was decided, on one bar.
 *
 * @param bar the bar on which it was due or waiting
 * @param decidedOn the bar of its decision
 * @param asset index in the price table of the first asset that was in the way
 */
public record Hindrance(int bar, int decidedOn, int asset, Kind kind) {
    /** Whether the whole order waits for it. */
    public boolean waits() {
        return switch (kind) {
            case NO_PRICE, NO_VOLUME, NO_VOLATILITY, NO_WEALTH -> true;
            case PARTICIPATION, LOT, LOT_BEYOND_PARTICIPATION, HELD_BACK -> false;
        };
    }

    /** What was in the way. */
    public enum Kind {
        /** The asset had no price to trade at: the whole order waits. */
        NO_PRICE("had no price to trade at, so the order waited"),
        /** Nothing was known to have traded lately, so what an order would lose by its size is unknown: the whole order waits. */
        NO_VOLUME("had no trailing volume to take market impact from, so the order waited"),
        /** Too few returns were known for a trailing volatility: the whole order waits. */
        NO_VOLATILITY("had too few bars for the trailing volatility that its costs need, so the order waited"),
        /** The most that may be traded on one bar was traded; the rest is carried to the next bar. */
        PARTICIPATION("was traded up to the participation allowed, and the rest was carried to the next bar"),
        /** One lot is worth more than what was to be held: nothing is. */
        LOT("was not bought, because one lot is worth more than what was to be held"),
        /** One lot is worth more than may be traded on one bar: the leg waits for a bar on which more is. */
        LOT_BEYOND_PARTICIPATION(
                "was not traded, because one lot is more than the participation allowed on one bar; it waits for a bar that allows it"),
        /** What is bought waits for what is still to be sold, so that both together stay within the order's weights. */
        HELD_BACK("was held back until what is still to be sold leaves room for it"),
        /** Nothing is left at the prices of the fill: the whole order waits, and the close decides whether it is ruin. */
        NO_WEALTH("could not be traded, because wealth was gone at the prices of the fill, so the order waited");

        private final String sentence;

        Kind(String sentence) {
            this.sentence = sentence;
        }

        /** What happened, to go behind the asset's name. */
        public String sentence() {
            return sentence;
        }
    }
}
