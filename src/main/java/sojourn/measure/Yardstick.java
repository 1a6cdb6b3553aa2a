package sojourn.measure;

import java.util.LinkedHashMap;
import java.util.Locale;
import java.util.Map;

/** What a strategy is measured against. */
public enum Yardstick {
    /** Buys the stated weights with the strategy's first decision, pays the same costs, and holds. */
    BUY_AND_HOLD(
            "Buys once with the strategy's first decision, by the same fills and costs, then drifts.",
            Knowledge.CAUSAL),
    /** A constant mix at the strategy's average weights over the evaluation window. */
    SAME_EXPOSURE(
            "A constant mix at the strategy's average weights over the whole window, rebalanced at every bar;"
                    + " known only after the fact.",
            Knowledge.AFTER_THE_FACT),
    /** A mix at the running mean of the strategy's weights. */
    SAME_EXPOSURE_SO_FAR(
            "A mix at the mean of the strategy's weights from its first fill to the close in question.",
            Knowledge.CAUSAL),
    /** Buy-and-hold scaled to the strategy's volatility. */
    SAME_VOLATILITY(
            "What buy-and-hold held, times the strategy's standard deviation of returns over the window by that of buy-and-hold,"
                    + " renewed at every bar, free of cost and of limits; known only after the fact.",
            Knowledge.AFTER_THE_FACT),
    /** The strategy's rule, told its regimes by recent volatility. */
    VOLATILITY_GATE(
            "The strategy's own rule, costs and fills, told its regimes by the standard deviation of the last 21 returns of the asset that"
                    + " orders them, against the quantiles of that inside the fit's window that give each regime the share the fit gave it.",
            Knowledge.CAUSAL),
    /** Buy-and-hold's mix scaled to a steady volatility. */
    VOLATILITY_TARGET(
            "Buy-and-hold's mix, scaled within the limits so that its standard deviation of the last 21 bars comes to that of all bars so"
                    + " far, with the strategy's decision bars, band, costs and fills.",
            Knowledge.CAUSAL),
    /** The strategy's changes at random times. */
    RANDOM_SWITCHER(
            "999 draws that do what the strategy did at other times, at its costs and fills: of a switch, complete spells in and complete"
                    + " spells out are each put in a random order and take turns, the first and the last spell stay; of any other rule,"
                    + " the decisions are moved round by a random number of places. Known only after the fact.",
            Knowledge.AFTER_THE_FACT);

    /** Whether a yardstick could have been traded. */
    public enum Knowledge {
        /** It uses nothing later than each close. */
        CAUSAL,
        /** It needs the whole sample. */
        AFTER_THE_FACT
    }

    private final String definition;
    private final Knowledge knowledge;

    Yardstick(String definition, Knowledge knowledge) {
        this.definition = definition;
        this.knowledge = knowledge;
    }

    /** The word of the strategy file, such as {@code buy-and-hold}. */
    public String word() {
        return name().toLowerCase(Locale.ROOT).replace('_', '-');
    }

    /** The prefix of its columns, such as {@code buy_and_hold}. */
    public String column() {
        return name().toLowerCase(Locale.ROOT);
    }

    /** One sentence. */
    public String definition() {
        return definition;
    }

    /** Whether it could have been traded. */
    public Knowledge knowledge() {
        return knowledge;
    }

    static Map<String, Yardstick> words() {
        Map<String, Yardstick> words = new LinkedHashMap<>();
        for (Yardstick one : values()) {
            words.put(one.word(), one);
        }
        return words;
    }
}
