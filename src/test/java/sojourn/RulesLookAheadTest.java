package sojourn;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import sojourn.PrefixCheck.Difference;
import sojourn.PrefixCheck.Rows;
import sojourn.allocate.Rule;
import sojourn.market.Known;
import sojourn.regime.WindowMoments;
import sojourn.walk.Reading;
import sojourn.walk.RegimeTimeline;
import sojourn.walk.Signal;

/**
 * Every rule through the whole job on real prices of three assets: cut short, it says the same of every bar before. And what only
 * these rules go by, the meaning of regimes for returns, is caught when it comes from later fits.
 */
class RulesLookAheadTest {
    private static final PriceHistory STOCKS = PriceHistory.stocks();
    private static final PriceHistory METALS = PriceHistory.of("gold_silver/gold_silver_1977_2012.csv");
    private static final int ROWS = 900;
    /** Before and at the first fit, between fits, on fit bars and just after. */
    private static final int[] CUTS = {250, 301, 302, 340, 401, 402, 555, 701, ROWS - 1};

    private static final String STRATEGY = """
            strategy: Rules
            prices: {stocks: {csv: stocks.csv}, gold: {csv: metals.csv, close: gold}, silver: {csv: metals.csv, close: silver}}
            cash: {percent-per-year: 4}
            regimes:
              observe: [{log-return: stocks}]
              states: [calm, stormy]
              parameters:
                fixed: {initial: [0.75, 0.25], transition: [[0.99, 0.01], [0.03, 0.97]], mean: [5.0e-4, -0.001], sd: [0.006, 0.012]}
            refit: {first-fit-after: 300, every: 100, seed: 7}
            allocate: RULE
            limits: {gross: 1.5, per-asset: [-0.5, 1]}
            trade: {no-trade-band: 0.01, costs: {commission-bps: 5, half-spread-bps: 5}}
            judge: {against: [buy-and-hold], buy-and-hold: {stocks: 0.4, gold: 0.3, silver: 0.3}, rank-by: sharpe}
            """;

    private static final String VOLATILITY =
            "{volatility-target: {of: {stocks: 0.5, gold: 0.25, silver: 0.25}, percent-per-year: 9, at-most: 1.5}}";

    static List<String> rules() {
        return List.of(
                "{switch: {regime: stormy, smooth: {half-life: 3}, leave-above: 0.6, re-enter-below: 0.4, in: {stocks: 1},"
                        + " out: {gold: 0.5}}}",
                "{table: {smooth: {half-life: 5}, weights: {calm: {stocks: 0.8, silver: 0.1}, stormy: {gold: 0.5}}}}",
                "{blend: {smooth: {half-life: 2}, confirm: 2, weights: {calm: {stocks: 1}, stormy: {gold: 0.5}}}}",
                VOLATILITY,
                "{formula: {smooth: {half-life: 2}, weights: {stocks: '1 - probability.stormy', gold: 'most_likely.stormy ? min(0.5,"
                        + " 0.003 / forecast.volatility.gold) : 0.1 * weight.stocks'}}}",
                "{minimum-variance: {among: [stocks, gold, silver], invested: 1.2}}",
                "{mean-variance: {among: [stocks, gold, silver], risk-aversion: 6, shrink-means: 0.5, step-toward: 0.2}}",
                "{volatility-target: {each: {stocks: 0.5, silver: -0.2}, percent-per-year: 9, smooth: {half-life: 4},"
                        + " step-toward: 0.5}}");
    }

    @TempDir
    private Path folder;

    @Test
    void everyKindOfRuleIsAmongThem() {
        Set<Class<?>> kinds = new LinkedHashSet<>();
        for (String rule : rules()) {
            kinds.add(job(rule).strategy().rule().getClass());
        }
        assertThat(kinds).containsAll(leaves(Rule.class));
    }

    @ParameterizedTest
    @MethodSource("rules")
    void aRuleSaysTheSameOfEveryBarUpToTheCut(String rule) {
        WholeJob job = job(rule);
        PrefixCheck check = PrefixCheck.of(rows -> run(job, rows), ROWS);
        assertThat(check.whole().rows().stream().filter(row -> row.table().equals("trades")))
                .hasSizeGreaterThan(8);
        for (int cut : CUTS) {
            assertThat(check.difference(cut)).isEmpty();
        }
    }

    @Test
    void momentsOfLaterFitsAreCaughtEvenIfProbabilitiesAreHonest() {
        WholeJob leaky = job(VOLATILITY).signalling((table, timeline) -> lastMoments(timeline));
        PrefixCheck check = PrefixCheck.of(rows -> run(leaky, rows), ROWS);
        List<Difference> caught = new ArrayList<>();
        for (int cut : new int[] {340, 401, 402, 555}) {
            check.difference(cut).ifPresent(caught::add);
        }
        assertThat(caught).hasSize(4);
        assertThat(caught)
                .allSatisfy(difference -> assertThat(difference.column()).startsWith("target."));
    }

    /** Honest probabilities with what regimes mean for returns taken from the last fit of all. */
    private static Signal lastMoments(RegimeTimeline timeline) {
        return new Signal() {
            @Override
            public List<String> regimes() {
                return timeline.regimes();
            }

            @Override
            public Optional<Reading> at(Known known) {
                int last = timeline.fits().size() - 1;
                WindowMoments moments =
                        timeline.fits().get(last).fit().moments().orElseThrow();
                double[] transition = {0.99, 0.01, 0.03, 0.97};
                return timeline.at(known)
                        .map(honest -> Reading.of(honest.fit(), honest.filtered(), transition, moments));
            }
        };
    }

    private WholeJob job(String rule) {
        return WholeJob.of(STRATEGY.replace("RULE", rule), folder);
    }

    private Rows run(WholeJob job, int rows) {
        STOCKS.write(folder.resolve("stocks.csv"), rows);
        METALS.write(folder.resolve("metals.csv"), STOCKS.date(rows - 1));
        return job.run(job.read());
    }

    private static List<Class<?>> leaves(Class<?> sealed) {
        List<Class<?>> leaves = new ArrayList<>();
        for (Class<?> one : sealed.getPermittedSubclasses()) {
            leaves.addAll(one.isSealed() ? leaves(one) : List.of(one));
        }
        return leaves;
    }
}
