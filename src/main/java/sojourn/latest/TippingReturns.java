package sojourn.latest;

import java.util.List;

/**
 * Which returns of the next bar of one asset leave the decision as it is, every other asset at its forecast. A return tips the
 * decision if the close that it leads to orders weights that the rule does not want now; an order that only brings drifted
 * weights back does not count.
 *
 * @param asset its name
 * @param calm the intervals that leave it, in order; none if every return tips it
 * @param borders where one kind of return meets the other, in order
 * @param chance the forecast probability that the return tips it, in [0, 1]
 */
public record TippingReturns(String asset, List<Interval> calm, List<Border> borders, double chance) {
    /** The largest return looked at, either way: a fraction. */
    public static final double REACH = 0.25;

    /** Copies the lists. */
    public TippingReturns {
        calm = List.copyOf(calm);
        borders = List.copyOf(borders);
    }

    /**
     * Returns from {@code low} to {@code high}; one that ends at {@link #REACH} was not followed further.
     *
     * @param low a fraction
     * @param high a fraction
     */
    public record Interval(double low, double high) {
        /** Whether it goes on below what was looked at. */
        public boolean openBelow() {
            return low <= -REACH;
        }

        /** Whether it goes on above what was looked at. */
        public boolean openAbove() {
            return high >= REACH;
        }
    }

    /**
     * A tipping return, exact to {@value #EXACT}.
     *
     * @param at the return, a fraction
     * @param tips the side of it that tips the decision
     * @param because the reason that the decision has there
     * @param target the weights ordered there, in words
     */
    public record Border(double at, Side tips, String because, String target) {
        /** How far a border may be from where it truly is. */
        static final double EXACT = 1e-9;
    }

    /** One side of a return. */
    public enum Side {
        /** Lower returns. */
        BELOW("below"),
        /** Higher returns. */
        ABOVE("above");

        private final String word;

        Side(String word) {
            this.word = word;
        }

        /** The word in files. */
        public String word() {
            return word;
        }
    }
}
