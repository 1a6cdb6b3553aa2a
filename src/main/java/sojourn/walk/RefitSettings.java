package sojourn.walk;

import java.util.LinkedHashMap;
import java.util.Map;
import java.util.OptionalInt;
import sojourn.document.Field;
import sojourn.document.Shape;
import sojourn.document.Shapes;

/**
 * The section {@code refit} of a strategy file.
 *
 * @param firstFitAfter observations before the first fit
 * @param schedule when fits follow
 * @param rolling observations of a rolling window; empty for an expanding one
 * @param starts starts of each fit besides the previous accepted fit
 * @param seed master seed of the random starts
 * @param onFailure what happens when a fit is refused
 */
public record RefitSettings(
        int firstFitAfter, RefitSchedule schedule, OptionalInt rolling, int starts, long seed, OnFailure onFailure) {

    /** What a refused fit leads to, once there is an accepted one. */
    public enum OnFailure {
        /** The last accepted fit stays in force. */
        KEEP_PREVIOUS,
        /** The strategy goes to cash until a fit is accepted. */
        STAND_ASIDE
    }

    private static final Field<Integer> FIRST_FIT_AFTER = Field.required(
            "first-fit-after", Shapes.integer().atLeast(20).atMost(1_000_000), "observations before the first fit");
    private static final Field<RefitSchedule> EVERY = Field.required(
            "every",
            Shapes.<RefitSchedule>either(
                    Shapes.integer().atLeast(1).atMost(1_000_000).as(RefitSchedule.EveryObservations::new),
                    Shapes.word(periods())),
            "observations from one fit to the next, or the first bar of each week, month or quarter");
    private static final Field<Integer> ROLLING =
            Field.required("rolling", Shapes.integer().atLeast(20).atMost(1_000_000), "observations of the window");
    private static final Field<OptionalInt> WINDOW = Field.defaulted(
            "window",
            Shapes.<OptionalInt>either(
                    Shapes.word(Map.of("expanding", OptionalInt.empty())),
                    Shapes.object("window", f -> OptionalInt.of(f.get(ROLLING)), ROLLING)),
            "expanding",
            "which observations a fit uses: all so far, or the last so many");
    private static final Field<Integer> STARTS = Field.defaulted(
            "starts",
            Shapes.integer().atLeast(1).atMost(100),
            "5",
            "starts of each fit: one deterministic, the others random; the previous fit is always one more");
    private static final Field<Long> SEED =
            Field.required("seed", Shapes.longInteger(), "master seed of the random starts");
    private static final Field<OnFailure> ON_FAILURE = Field.defaulted(
            "on-failure",
            Shapes.word(failureWords()),
            "keep-previous",
            "when a fit is refused: keep the previous one, or go to cash until one is accepted");

    /** The section's shape. */
    public static final Shape<RefitSettings> SHAPE = Shapes.object(
            "refit",
            f -> new RefitSettings(
                    f.get(FIRST_FIT_AFTER), f.get(EVERY), f.get(WINDOW), f.get(STARTS), f.get(SEED), f.get(ON_FAILURE)),
            FIRST_FIT_AFTER,
            EVERY,
            WINDOW,
            STARTS,
            SEED,
            ON_FAILURE);

    private static Map<String, RefitSchedule> periods() {
        Map<String, RefitSchedule> words = new LinkedHashMap<>();
        words.put("week", RefitSchedule.FirstBarOf.WEEK);
        words.put("month", RefitSchedule.FirstBarOf.MONTH);
        words.put("quarter", RefitSchedule.FirstBarOf.QUARTER);
        return words;
    }

    private static Map<String, OnFailure> failureWords() {
        Map<String, OnFailure> words = new LinkedHashMap<>();
        words.put("keep-previous", OnFailure.KEEP_PREVIOUS);
        words.put("stand-aside", OnFailure.STAND_ASIDE);
        return words;
    }
}
