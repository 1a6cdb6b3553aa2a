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
            Knowledge.CAUSAL);

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
