package sojourn.trade;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import java.util.function.Function;
import org.junit.jupiter.api.Test;
import sojourn.GivenPrices;
import sojourn.allocate.Because;
import sojourn.allocate.Decision;
import sojourn.allocate.Policy;
import sojourn.allocate.Weights;
import sojourn.market.FillPrices;
import sojourn.market.PriceTable;

/** What a track says of a bar is the same to the bit whether or not later bars exist. */
class PrefixTest {
    private static final long SEED = 77;
    private static final int BARS = 150;
    private static final GivenPrices PRICES = GivenPrices.random(SEED, BARS, 2);

    @Test
    void cuttingTheFutureChangesNothingBeforeTheCut() {
        for (int delay : new int[] {0, 2}) {
            assertThat(cutsThatDiffer(table -> Policies.stepAside(table.assets()), delay))
                    .isEmpty();
            assertThat(cutsThatDiffer(table -> Policies.mixed(table.assets()), delay))
                    .isEmpty();
            assertThat(cutsThatDiffer(table -> Policies.random(SEED, BARS, 2, 1.3), delay))
                    .isEmpty();
        }
    }

    @Test
    void aPolicyThatLooksOneBarAheadIsCaught() {
        assertThat(cutsThatDiffer(PrefixTest::peeking, 0)).isNotEmpty();
    }

    /** All in if the next close is higher, which only someone with the fill prices can know. */
    private static Policy peeking(PriceTable table) {
        FillPrices prices = table.fillPrices();
        return (situation, stance) -> {
            int next = Math.min(situation.bar() + 1, table.size() - 1);
            boolean rises = prices.close(0, next) > prices.close(0, situation.bar());
            Weights target = Weights.of(rises ? 1 : 0, 0);
            return Decision.order(target, stance, Because.of("it knows"), Decision.Change.SAME);
        };
    }

    private static List<Integer> cutsThatDiffer(Function<PriceTable, Policy> policy, int delay) {
        Track whole = run(PRICES, policy, delay);
        List<Integer> differing = new ArrayList<>();
        for (int bars = whole.firstBar() + 1; bars < BARS; bars++) {
            if (!facts(run(PRICES.first(bars), policy, delay), bars).equals(facts(whole, bars))) {
                differing.add(bars);
            }
        }
        return differing;
    }

    private static Track run(GivenPrices prices, Function<PriceTable, Policy> policy, int delay) {
        PriceTable table = prices.table();
        Terms terms = new Terms(new NextClose(delay), new Costs(5, 5), 1_000_000);
        return Simulation.run(table, Policies.signal(SEED, BARS), policy.apply(table), terms, 0)
                .orElseThrow();
    }

    /** Everything a track says of the bars before {@code bars}; doubles are boxed, which compares their bits. */
    private static List<Object> facts(Track track, int bars) {
        List<Object> facts = new ArrayList<>();
        for (int bar = track.firstBar(); bar < bars; bar++) {
            facts.addAll(List.of(
                    track.wealth(bar),
                    track.cash(bar),
                    track.interest(bar),
                    track.cost(bar),
                    track.turnover(bar),
                    track.switched(bar)));
            for (int i = 0; i < track.assets().size(); i++) {
                facts.addAll(List.of(track.units(bar, i), track.weight(bar, i), track.target(bar, i)));
            }
        }
        track.fills().stream()
                .filter(fill -> fill.filledOn() < bars)
                .forEach(fill -> facts.addAll(List.of(fill, fill.because().sentence())));
        track.ledger().stream().filter(entry -> entry.bar() < bars).forEach(facts::add);
        return facts;
    }
}
