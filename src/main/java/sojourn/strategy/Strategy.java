package sojourn.strategy;

import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import sojourn.allocate.Limits;
import sojourn.allocate.MeanVariance;
import sojourn.allocate.Rule;
import sojourn.allocate.Rules;
import sojourn.document.Field;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.market.Calendar;
import sojourn.market.CashSource;
import sojourn.market.PriceSource;
import sojourn.measure.JudgeSettings;
import sojourn.regime.EmissionFamily;
import sojourn.trade.TradeSettings;
import sojourn.walk.Observation;
import sojourn.walk.RefitSettings;
import sojourn.walk.RegimeSettings;

/**
 * One strategy, as its file says.
 *
 * @param name the strategy's name
 * @param hypothesis why it should work
 * @param calendar what a bar is
 * @param prices price files by asset, in the order of the file
 * @param cash what cash earns
 * @param regimes the regime model and what it sees
 * @param refit when and how it is fitted
 * @param rule what to hold
 * @param limits what a target may not exceed
 * @param trade when decisions are made and what trading costs
 * @param judge what the result is held against
 */
public record Strategy(
        String name,
        Optional<String> hypothesis,
        Calendar calendar,
        Map<String, PriceSource> prices,
        CashSource cash,
        RegimeSettings regimes,
        RefitSettings refit,
        Rule rule,
        Limits limits,
        TradeSettings trade,
        JudgeSettings judge) {
    private static final Field<String> NAME = Field.required(
            "strategy",
            Shapes.textLike(
                    "[^\\x00-\\x1f\\x7f-\\x9f]*[A-Za-z0-9][^\\x00-\\x1f\\x7f-\\x9f]*",
                    "a name on one line, with a letter or digit in it and no tabs or other control characters"),
            "the strategy's name");
    private static final Field<Optional<String>> HYPOTHESIS =
            Field.maybe("hypothesis", Shapes.text(), "why it should work, written before it is run");
    private static final Field<Calendar> CALENDAR = Field.defaulted("calendar", Calendar.SHAPE, "{}", "what a bar is");
    private static final Field<Map<String, PriceSource>> PRICES =
            Field.required("prices", PriceSource.SECTION, "price files by asset");
    private static final Field<CashSource> CASH =
            Field.defaulted("cash", CashSource.SHAPE, "{percent-per-year: 0}", "what cash earns");
    private static final Field<RegimeSettings> REGIMES =
            Field.required("regimes", RegimeSettings.SHAPE, "the regime model and what it sees");
    private static final Field<RefitSettings> REFIT =
            Field.required("refit", RefitSettings.SHAPE, "when and how the model is fitted");
    private static final Field<Rule> ALLOCATE =
            Field.required("allocate", Rules.SHAPE, "what to hold: exactly one rule");
    private static final Field<Limits> LIMITS =
            Field.defaulted("limits", Limits.SHAPE, "{}", "what a target may not exceed");
    private static final Field<TradeSettings> TRADE =
            Field.defaulted("trade", TradeSettings.SHAPE, "{}", "when to decide and what trading costs");
    private static final Field<JudgeSettings> JUDGE =
            Field.required("judge", JudgeSettings.SHAPE, "what the result is held against");

    /** The shape of the whole file. */
    public static final Shape<Strategy> SHAPE = Shapes.object(
            "strategy file",
            f -> new Strategy(
                    f.get(NAME),
                    f.get(HYPOTHESIS),
                    f.get(CALENDAR),
                    f.get(PRICES),
                    f.get(CASH),
                    f.get(REGIMES),
                    f.get(REFIT),
                    f.get(ALLOCATE),
                    f.get(LIMITS),
                    f.get(TRADE),
                    f.get(JUDGE)),
            NAME,
            HYPOTHESIS,
            CALENDAR,
            PRICES,
            CASH,
            REGIMES,
            REFIT,
            ALLOCATE,
            LIMITS,
            TRADE,
            JUDGE);

    /** Copies the price sources, in order. */
    public Strategy {
        prices = Collections.unmodifiableMap(new LinkedHashMap<>(prices));
    }

    /** The assets that are observed, held or compared with, in the order of {@code prices}; they define the common bars. */
    public List<String> usedAssets() {
        Set<String> named = assetsWithReturns();
        for (Observation observation : regimes.observe()) {
            named.add(observation.asset());
        }
        List<String> used = new ArrayList<>();
        for (String asset : prices.keySet()) {
            if (named.contains(asset)) {
                used.add(asset);
            }
        }
        return List.copyOf(used);
    }

    /** The assets that the rule or buy-and-hold may trade, in the order of {@code prices}. */
    public List<String> tradedAssets() {
        return prices.keySet().stream()
                .filter(asset ->
                        rule.namedAssets().contains(asset) || judge.buyAndHold().containsKey(asset))
                .toList();
    }

    /** Used series of which nobody takes a return, such as rates: they are no assets, and may be at or below 0. */
    public Set<String> levels() {
        Set<String> levels = new TreeSet<>(usedAssets());
        levels.removeAll(assetsWithReturns());
        return levels;
    }

    /** Why the rule can never hold anything, a sentence; empty where it can. */
    public Optional<String> neverHolds() {
        return rule instanceof MeanVariance && regimes.emission().equals(EmissionFamily.NORMAL_ZERO_MEAN)
                ? Optional.of("the rule will hold nothing: mean-variance weighs expected returns over cash, and with"
                        + " normal-zero-mean every regime's mean is taken to be what cash earns; set emission: normal, or choose"
                        + " another rule")
                : Optional.empty();
    }

    /** Said if every drift of a weight will be traded, however small, at a fee that does not get smaller with it. */
    public Optional<String> paysForEveryDrift() {
        boolean fee = trade.costs().fixedFee() > 0 || trade.costs().minimumFee() > 0;
        return fee && trade.noTradeBand() == 0
                ? Optional.of(
                        "every weight that has drifted from its target is traded, however little, and pays its fee each time:"
                                + " costs have a fixed or a minimum fee and no-trade-band is 0; set a no-trade-band")
                : Optional.empty();
    }

    private Set<String> assetsWithReturns() {
        Set<String> named = new LinkedHashSet<>();
        for (Observation observation : regimes.observe()) {
            if (observation.takesReturns()) {
                named.add(observation.asset());
            }
        }
        named.add(regimes.orderedBy());
        named.addAll(rule.namedAssets());
        named.addAll(judge.buyAndHold().keySet());
        return named;
    }
}
