package sojourn.document;

import java.time.LocalDate;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** A shape in which every factory occurs once at least; the documents under test are read by it. */
record SampleStrategy(
        String strategy,
        Map<String, Prices> prices,
        List<String> states,
        Refit refit,
        Object allocate,
        Optional<LocalDate> from,
        long seed,
        boolean quiet,
        double band) {

    record Prices(String csv, String close) {
        private static final Field<String> CSV = Field.required("csv", Shapes.text(), "the price file");
        private static final Field<String> CLOSE =
                Field.defaulted("close", Shapes.text(), "close", "the column of the closing price");
        static final Shape<Prices> SHAPE =
                Shapes.object("prices", f -> new Prices(f.get(CSV), f.get(CLOSE)), CSV, CLOSE);
    }

    record Refit(String every, String window, int starts) {
        private static final Field<String> EVERY = Field.defaulted(
                "every",
                Shapes.<String>either(Shapes.integer().atLeast(1).as(String::valueOf), word("month", "quarter")),
                "21",
                "observations, or month, or quarter");
        private static final Field<Integer> ROLLING =
                Field.required("rolling", Shapes.integer().atLeast(10), "the last so many observations");
        private static final Field<String> WINDOW = Field.defaulted(
                "window",
                Shapes.either(word("expanding"), Shapes.object("window", f -> "rolling " + f.get(ROLLING), ROLLING)),
                "{rolling: 2000}",
                "what a fit sees");
        private static final Field<Integer> STARTS =
                Field.defaulted("starts", Shapes.integer().atLeast(1).atMost(100), "5", "starts of each fit");
        static final Shape<Refit> SHAPE = Shapes.object(
                "refit", f -> new Refit(f.get(EVERY), f.get(WINDOW), f.get(STARTS)), EVERY, WINDOW, STARTS);
    }

    record Switch(String regime, double leaveAbove, double reEnterBelow) {
        private static final Field<String> REGIME =
                Field.required("regime", Shapes.text(), "the regime to step aside from");
        private static final Field<Double> LEAVE_ABOVE =
                Field.required("leave-above", Shapes.number().atLeast(0).atMost(1), "the probability to leave at");
        private static final Field<Double> RE_ENTER_BELOW = Field.defaulted(
                "re-enter-below", Shapes.number().atLeast(0).atMost(1), "0", "the probability to come back at");
        static final Shape<Switch> SHAPE = Shapes.object(
                        "switch",
                        f -> new Switch(f.get(REGIME), f.get(LEAVE_ABOVE), f.get(RE_ENTER_BELOW)),
                        REGIME,
                        LEAVE_ABOVE,
                        RE_ENTER_BELOW)
                .refuse(s -> s.reEnterBelow() > s.leaveAbove()
                        ? Optional.of(new Refusal(
                                "re-enter-below",
                                "re-enter-below " + s.reEnterBelow() + " lies above leave-above " + s.leaveAbove(),
                                "give a value at or below it"))
                        : Optional.empty());
    }

    private static final Shape<String> NAME = Shapes.textLike(
            "[a-z][a-z0-9_]*", "a name of small letters, digits and underscores that starts with a letter");
    private static final Field<String> STRATEGY = Field.required("strategy", Shapes.text(), "the strategy's name");
    private static final Field<Map<String, Prices>> PRICES =
            Field.required("prices", Shapes.named(NAME, Prices.SHAPE), "the price files");
    private static final Field<List<String>> STATES = Field.required(
            "states",
            Shapes.list(NAME, 1, 3)
                    .refuse(names -> new HashSet<>(names).size() < names.size()
                            ? Optional.of(new Refusal("", "a state is named twice", "give each its own name"))
                            : Optional.empty()),
            "the regimes' names");
    private static final Field<Refit> REFIT = Field.defaulted("refit", Refit.SHAPE, "{every: month}", "when to refit");
    private static final Field<Object> ALLOCATE = Field.required("allocate", rule(), "the rule");
    private static final Field<Optional<LocalDate>> FROM = Field.maybe("from", Shapes.date(), "the first day used");
    private static final Field<Long> SEED =
            Field.defaulted("seed", Shapes.longInteger(), "20260101", "the master seed");
    private static final Field<Boolean> QUIET = Field.defaulted("quiet", Shapes.flag(), "false", "say less");
    private static final Field<Double> BAND =
            Field.defaulted("band", Shapes.number().above(0).below(0.5), "0.02", "the no-trade band");

    static final Shape<SampleStrategy> SHAPE = Shapes.object(
            "strategy",
            f -> new SampleStrategy(
                    f.get(STRATEGY),
                    f.get(PRICES),
                    f.get(STATES),
                    f.get(REFIT),
                    f.get(ALLOCATE),
                    f.get(FROM),
                    f.get(SEED),
                    f.get(QUIET),
                    f.get(BAND)),
            STRATEGY,
            PRICES,
            STATES,
            REFIT,
            ALLOCATE,
            FROM,
            SEED,
            QUIET,
            BAND);

    private static Shape<Object> rule() {
        Map<String, Shape<? extends Object>> rules = new LinkedHashMap<>();
        rules.put("switch", Switch.SHAPE);
        rules.put("hold", Shapes.named(NAME, Shapes.number().atLeast(-1).atMost(1)));
        return Shapes.oneKey(rules);
    }

    private static Shape<String> word(String... words) {
        return Shapes.word(List.of(words), w -> w);
    }
}
