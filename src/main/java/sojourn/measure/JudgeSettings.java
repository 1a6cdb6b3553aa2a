package sojourn.measure;

import java.math.BigDecimal;
import java.time.LocalDate;
import java.util.Collections;
import java.util.EnumSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import sojourn.document.Field;
import sojourn.document.Refusal;
import sojourn.document.Shape;
import sojourn.document.Shapes;

/**
 * The section {@code judge} of a strategy file: what the result is held against, and by what it is ranked.
 *
 * @param against yardsticks to run; buy-and-hold runs in any case
 * @param buyAndHold what doing nothing means: weights by asset, the rest is cash
 * @param rankBy the measure that variants are ranked by, declared before the run
 * @param window the evaluation window, if it is not to be found from the first fills
 */
public record JudgeSettings(
        List<Yardstick> against, Map<String, Double> buyAndHold, Measure rankBy, Optional<Window> window) {

    /**
     * A stated evaluation window.
     *
     * @param from the base date; the first return is that of the bar after it
     * @param to the last date
     */
    public record Window(Optional<LocalDate> from, Optional<LocalDate> to) {
        private static final Field<Optional<LocalDate>> FROM =
                Field.maybe("from", Shapes.date(), "base date: the first return judged is that of the bar after it");
        private static final Field<Optional<LocalDate>> TO =
                Field.maybe("to", Shapes.date(), "last date that is judged");

        static final Shape<Window> SHAPE = Shapes.object("window", f -> new Window(f.get(FROM), f.get(TO)), FROM, TO)
                .refuse(Window::fault);

        private Optional<Refusal> fault() {
            if (from.isPresent() && to.isPresent() && !to.get().isAfter(from.get())) {
                return Optional.of(new Refusal(
                        "to", "'to' " + to.get() + " does not come after 'from' " + from.get(), "swap or change them"));
            }
            return Optional.empty();
        }
    }

    private static final double SUM_SLACK = 1e-12;

    private static final Field<List<Yardstick>> AGAINST = Field.defaulted(
            "against",
            Shapes.list(Shapes.word(Yardstick.words()), 1, Yardstick.values().length)
                    .refuse(JudgeSettings::namedTwice),
            "[buy-and-hold, same-exposure, same-exposure-so-far]",
            "what the strategy is measured against");
    private static final Field<Map<String, Double>> BUY_AND_HOLD = Field.required(
            "buy-and-hold",
            Shapes.named(Shapes.text(), Shapes.number().atLeast(0).atMost(1)).refuse(JudgeSettings::moreThanAll),
            "what doing nothing means: weights by asset, e.g. {stocks: 1.0}; the rest is cash");
    private static final Field<Measure> RANK_BY = Field.defaulted(
            "rank-by",
            Shapes.word(rankable()),
            "sharpe",
            "the measure variants are ranked by, declared before the run");
    private static final Field<Optional<Window>> WINDOW = Field.maybe(
            "window", Window.SHAPE, "the evaluation window; if left out, from the latest first fill to the last bar");

    /** The section's shape. */
    public static final Shape<JudgeSettings> SHAPE = Shapes.object(
            "judge",
            f -> new JudgeSettings(f.get(AGAINST), f.get(BUY_AND_HOLD), f.get(RANK_BY), f.get(WINDOW)),
            AGAINST,
            BUY_AND_HOLD,
            RANK_BY,
            WINDOW);

    /** Copies its collections, in order. */
    public JudgeSettings {
        against = List.copyOf(against);
        buyAndHold = Collections.unmodifiableMap(new LinkedHashMap<>(buyAndHold));
    }

    private static Optional<Refusal> namedTwice(List<Yardstick> against) {
        Set<Yardstick> seen = EnumSet.noneOf(Yardstick.class);
        return against.stream()
                .filter(one -> !seen.add(one))
                .findFirst()
                .map(one -> new Refusal("", one.word() + " is named twice", "name each yardstick once"));
    }

    private static Optional<Refusal> moreThanAll(Map<String, Double> weights) {
        BigDecimal sum = BigDecimal.ZERO; // of the decimals as written, so that 0.7 and 0.4 make 1.1
        for (double weight : weights.values()) {
            sum = sum.add(BigDecimal.valueOf(weight));
        }
        return sum.doubleValue() > 1 + SUM_SLACK
                ? Optional.of(new Refusal(
                        "", "the weights of buy-and-hold add up to " + sum, "make them add up to at most 1"))
                : Optional.empty();
    }

    private static Map<String, Measure> rankable() {
        Map<String, Measure> words = new LinkedHashMap<>();
        for (Measure measure : Measure.values()) {
            if (measure.direction() != Direction.NEITHER) {
                words.put(measure.key().replace('_', '-'), measure);
            }
        }
        return words;
    }
}
