package sojourn.world;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import sojourn.document.Field;
import sojourn.document.Refusal;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.numeric.Check;

/**
 * One state of an invented market: how long it lasts, what follows it, and how prices move meanwhile. Within a state the
 * log returns of one bar are independent of other bars and follow a multivariate Student-t distribution with the stated
 * standard deviations and correlations: all assets share one chi-square draw a bar, so that they have wild days together.
 *
 * @param stay how many bars the state lasts
 * @param then the probability of each state that may follow; sums to 1
 * @param degreesOfFreedom of the Student-t distribution, at least 3; fewer means wilder days
 * @param moves drift and volatility of each asset
 * @param correlations between the assets
 */
public record HiddenState(
        Stay stay, Map<String, Double> then, int degreesOfFreedom, Map<String, Move> moves, Correlations correlations) {
    private static final int FEWEST_DEGREES = 3;
    private static final int MOST_DEGREES = 200;

    /** How far the probabilities of what follows may sum from 1: for decimals such as 0.1 + 0.2 + 0.7. */
    private static final double SUM_TOLERANCE = 1e-9;

    private static final Field<Stay> STAY = Field.required("stay", Stay.SHAPE, "how many bars the state lasts");
    private static final Field<Map<String, Double>> THEN = Field.required(
            "then",
            Shapes.named(Listing.NAME, Shapes.number().atLeast(0).atMost(1)),
            "probability of each state that may follow when the stay ends; sums to 1");
    private static final Field<Integer> DEGREES = Field.required(
            "degrees-of-freedom",
            Shapes.integer().atLeast(FEWEST_DEGREES).atMost(MOST_DEGREES),
            "of the Student-t distribution of returns; fewer means wilder days");
    private static final Field<Map<String, Move>> MOVES = Field.required(
            "moves", Shapes.named(Listing.NAME, Move.SHAPE), "drift and volatility of each asset in this state");
    private static final Field<Optional<Correlations>> CORRELATIONS = Field.maybe(
            "correlations", Correlations.SHAPE, "correlation of each pair of assets in this state, each pair once");

    /** Reads a state; names of other states are checked by {@link World}. */
    public static final Shape<HiddenState> SHAPE = Shapes.object(
                    "state",
                    f -> new HiddenState(
                            f.get(STAY),
                            f.get(THEN),
                            f.get(DEGREES),
                            f.get(MOVES),
                            f.get(CORRELATIONS).orElse(Correlations.none())),
                    STAY,
                    THEN,
                    DEGREES,
                    MOVES,
                    CORRELATIONS)
            .refuse(HiddenState::thenFault)
            .refuse(state ->
                    state.correlations().fault(List.copyOf(state.moves().keySet())));

    /** Copies the maps. */
    public HiddenState {
        Check.within(degreesOfFreedom, FEWEST_DEGREES, MOST_DEGREES, "degreesOfFreedom");
        then = Collections.unmodifiableMap(new LinkedHashMap<>(then));
        moves = Collections.unmodifiableMap(new LinkedHashMap<>(moves));
    }

    /** Refuses probabilities of what follows that do not sum to 1. */
    Optional<Refusal> thenFault() {
        double sum = 0;
        for (double probability : then.values()) {
            sum += probability;
        }
        return Math.abs(sum - 1) <= SUM_TOLERANCE
                ? Optional.empty()
                : Optional.of(new Refusal(
                        "then",
                        "the probabilities of what follows sum to " + Decimals.round(sum, 9),
                        "make them sum to 1"));
    }

    /** The move of {@code asset}. */
    Move move(String asset) {
        return Optional.ofNullable(moves.get(asset))
                .orElseThrow(() -> new IllegalArgumentException("no move of " + asset));
    }
}
