package sojourn.compare;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.GivenPrices;
import sojourn.document.Problems;
import sojourn.market.PriceTable;
import sojourn.measure.Measured;
import sojourn.regime.StartRunner;
import sojourn.strategy.Strategy;
import sojourn.strategy.StrategyFile;
import sojourn.strategy.StrategyReader;
import sojourn.trade.Simulation;
import sojourn.trade.Track;
import sojourn.walk.Walk;

/** A strategy told its own decisions again trades as it did, so that draws differ from it in nothing but the order. */
class RandomSwitcherTest {
    private static final String STRATEGY = """
            strategy: Replayed
            prices: {a: {csv: prices.csv, close: a}, b: {csv: prices.csv, close: b}}
            cash: {percent-per-year: 3}
            regimes:
              observe: [{log-return: a}]
              states: [calm, stormy]
              parameters:
                fixed: {initial: [0.5, 0.5], transition: [[0.9, 0.1], [0.1, 0.9]], mean: [0, 0], sd: [0.007, 0.014]}
            refit: {first-fit-after: 50, every: 50, starts: 1, seed: 11}
            allocate: RULE
            trade: TRADE
            judge: {against: [random-switcher], buy-and-hold: {a: 1}}
            """;
    private static final String SWITCH =
            "{switch: {regime: stormy, leave-above: 0.6, re-enter-below: 0.4, in: {a: 0.9}, out: {b: 0.3}}}";
    private static final String DAILY = "{costs: {commission-bps: 5, half-spread-bps: 5}}";

    @TempDir
    private static Path folder;

    @BeforeAll
    static void writePrices() throws IOException {
        GivenPrices prices = GivenPrices.random(12, 600, 2);
        StringBuilder text = new StringBuilder("date,a,b\n");
        for (int bar = 0; bar < prices.size(); bar++) {
            text.append(prices.dates().get(bar)).append(',').append(prices.close(0, bar));
            text.append(',').append(prices.close(1, bar)).append('\n');
        }
        Files.writeString(folder.resolve("prices.csv"), text);
    }

    /** A variant that traded, with the draws of its decisions. */
    private record Ran(Run.Traded run, RandomSwitcher switcher, Decided decided) {
        private Track track(Replay replay) {
            PriceTable table = run.ready().market().table();
            Strategy file = run.file().strategy();
            return Simulation.run(
                            table,
                            run.timeline(),
                            replay,
                            file.trade().terms(),
                            run.track().firstBar())
                    .orElseThrow();
        }
    }

    private static Ran ran(String rule, String trade) {
        return ran(rule, trade, "first-fit-after: 50");
    }

    private static Ran ran(String rule, String trade, String fits) {
        Problems problems = new Problems();
        String text = STRATEGY.replace("RULE", rule).replace("TRADE", trade).replace("first-fit-after: 50", fits);
        StrategyFile parsed =
                StrategyReader.parse(text, folder, "strategy.yaml", problems).orElseThrow();
        problems.throwIfAny();
        Prepared prepared = Prepared.of(parsed);
        Prepared.Ready ready = (Prepared.Ready) prepared;
        Strategy file = ready.file().strategy();
        PriceTable table = ready.market().table();
        Run run = VariantRunner.run(
                ready, Walk.forward(table, file.regimes(), file.refit(), StartRunner.sequential(), bar -> {}));
        Run.Traded traded = (Run.Traded) run;
        int base = traded.track().firstFill().orElse(traded.track().firstBar()) + 100;
        Window window = new Window(base, traded.track().lastBar() - 20);
        Decided decided = new Decided(table, traded.timeline(), file.trade(), traded.track(), window);
        return new Ran(traded, RandomSwitcher.of(file, table.assets(), decided, traded.track()), decided);
    }

    private static void assertSame(Track one, Track other, int upTo) {
        for (int bar = one.firstBar(); bar <= upTo; bar++) {
            assertThat(one.wealth(bar)).isEqualTo(other.wealth(bar));
            for (int asset = 0; asset < one.assets().size(); asset++) {
                assertThat(one.units(bar, asset)).isEqualTo(other.units(bar, asset));
            }
        }
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                SWITCH + " | " + DAILY,
                SWITCH + " | {decide: first-of-week, stay-at-least: 8, no-trade-band: 0.02, delay: 1}",
                "{switch: {regime: stormy, smooth: {half-life: 3}, confirm: 2, step-toward: 0.4, leave-above: 0.6, re-enter-below: 0.4,"
                        + " in: {a: 1}, out: {a: 0.1}}} | {no-trade-band: 0.05}",
                "{table: {weights: {calm: {a: 0.8}, stormy: {b: 0.5}}}} | {decide: first-of-month}",
                "{blend: {step-toward: 0.3, weights: {calm: {a: 1}, stormy: {b: 0.5}}}} | {no-trade-band: 0.1}",
                "{formula: {weights: {a: 'probability.stormy > 0.5 ? 1 / (most_likely.calm ? 1 : 0) : 0.5'}}} | "
                        + DAILY
            })
    void toldItsOwnDecisionsItTradesAsItDidToTheBit(String ruleAndTrade) {
        String[] parts = ruleAndTrade.split(" \\| ", -1);
        Ran ran = ran(parts[0], parts[1]);
        Track own = ran.run().track();
        assertThat(own.fills()).hasSizeGreaterThan(5);
        assertSame(ran.track(ran.switcher().replay()), own, own.lastBar());
    }

    @Test
    void beforeTheWindowADrawIsTheStrategyAndInsideItHoldsEachSideAsLong() {
        Ran ran = ran(SWITCH, DAILY);
        assertThat(ran.switcher().whyNot()).isEmpty();
        Track own = ran.run().track();
        int[] states = ran.decided().states();
        int first = ran.decided().first();
        int end = ran.decided().end();
        long out = Arrays.stream(states, first, end).sum();
        int different = 0;
        for (int i = 0; i < 20; i++) {
            Track drawn = ran.track(ran.switcher().draw(i));
            assertSame(drawn, own, ran.decided().bar(first));
            long drawnOut = 0;
            for (int j = first; j < end; j++) {
                drawnOut += drawn.target(ran.decided().bar(j), 1) > 0 ? 1 : 0;
            }
            assertThat(drawnOut).isEqualTo(out);
            assertThat(drawn.wealth(own.lastBar()))
                    .isEqualTo(ran.track(ran.switcher().draw(i)).wealth(own.lastBar()));
            different += drawn.wealth(own.lastBar()) == own.wealth(own.lastBar()) ? 0 : 1;
        }
        assertThat(different).isGreaterThan(15);
    }

    @Test
    void theDecisionsOfOtherRulesAreMovedRound() {
        Ran ran = ran("{table: {weights: {calm: {a: 0.8}, stormy: {b: 0.5}}}}", DAILY);
        Track own = ran.run().track();
        int first = ran.decided().first();
        int size = ran.decided().end() - first;
        Track drawn = ran.track(ran.switcher().draw(3));
        int matching = 0;
        for (int places = 1; places < size; places++) {
            boolean same = true;
            for (int j = 0; j < size && same; j++) {
                int from = ran.decided().bar(first + (j + places) % size);
                same = drawn.target(ran.decided().bar(first + j), 0) == own.target(from, 0);
            }
            matching += same ? 1 : 0;
        }
        assertThat(matching).isEqualTo(1);
    }

    @Test
    void whatNeverChangesHasNoOtherOrder() {
        Ran never = ran(SWITCH.replace("0.6", "1").replace("0.4", "0"), DAILY);
        assertThat(never.switcher().whyNot()).hasValueSatisfying(why -> {
            assertThat(why.reason()).isEqualTo(Measured.Reason.NO_CHANGE);
            assertThat(why.because()).contains("0 complete spells in and 0 out");
        });
        Ran still = ran("{table: {weights: {calm: {a: 0.8}, stormy: {a: 0.8}}}}", DAILY);
        assertThat(still.switcher().whyNot())
                .hasValueSatisfying(why -> assertThat(why.because()).contains("every decision"));
    }
}
