package sojourn.trade;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
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
    private static final double CAPITAL = 1_000_000;
    private static final GivenPrices ADJUSTED =
            GivenPrices.random(SEED, BARS, 2).withRandomVolumes(SEED, 20_000);
    private static final GivenPrices PRICES = ADJUSTED.givingAtRandom(SEED);
    private static final Costs PLAIN = new Costs(5, 5);
    private static final Costs BY_PAST_TRADING = new Costs(5, 2)
            .withSpreadOf(new SpreadOfVolatility(0.1, 5))
            .withImpact(new Impact(1, 4, 6, Optional.of(10.0)));

    @Test
    void cuttingTheFutureChangesNothingBeforeTheCut() {
        for (int delay : new int[] {0, 2}) {
            for (Costs costs : List.of(PLAIN, BY_PAST_TRADING)) {
                for (FillTime fill : FillTime.values()) {
                    for (SizeAt size : SizeAt.values()) {
                        Lots lots = size == SizeAt.FILL ? Lots.FRACTIONS : new Lots(10, Map.of());
                        sameUpToEveryCut(new Terms(fill.delayed(delay), costs, CAPITAL, size, lots));
                    }
                }
            }
        }
    }

    private static void sameUpToEveryCut(Terms terms) {
        assertThat(cutsThatDiffer(table -> Policies.stepAside(table.assets()), terms))
                .isEmpty();
        assertThat(cutsThatDiffer(table -> Policies.mixed(table.assets()), terms))
                .isEmpty();
        assertThat(cutsThatDiffer(table -> Policies.random(SEED, BARS, 2, 1.3), terms))
                .isEmpty();
    }

    @Test
    void costsFromLaterTradingAreCaught() {
        Function<PriceTable, Policy> policy = table -> Policies.random(SEED, BARS, 2, 1.3);
        Function<PriceTable, Terms> leaky =
                table -> new Terms(new CostsKnownLate(table.size()), BY_PAST_TRADING, CAPITAL);
        assertThat(cutsThatDiffer(policy, leaky)).isNotEmpty();
    }

    /** What a fill costs comes from bars up to the one before: the volume of its own bar, and its close at an open, have no part. */
    @Test
    void theVolumeOfTheBarOfAFillHasNoPartInItsCost() {
        Terms terms = new Terms(new NextClose(0), BY_PAST_TRADING, CAPITAL);
        Function<PriceTable, Policy> policy = table -> Policies.random(SEED, BARS, 2, 1.3);
        Track track = run(ADJUSTED, policy, terms);
        int bar = track.fills().get(track.fills().size() / 2).filledOn();
        double[][] volumes = new double[2][];
        PriceTable table = ADJUSTED.table();
        for (int asset = 0; asset < 2; asset++) {
            volumes[asset] = new double[BARS];
            for (int each = 0; each < BARS; each++) {
                volumes[asset][each] = table.knownAt(each).volume(asset, each).orElseThrow();
            }
            volumes[asset][bar] *= 7;
        }
        Track other = run(ADJUSTED.withVolumes(volumes), policy, terms);
        assertThat(facts(other, bar + 1)).isEqualTo(facts(track, bar + 1));
        assertThat(facts(other, BARS)).isNotEqualTo(facts(track, BARS));
    }

    /** Takes impact and half-spread from three bars after the fill, as far as there are any. */
    private record CostsKnownLate(int bars) implements FillRule {
        @Override
        public int dueOn(int decidedOn) {
            return decidedOn + 1;
        }

        @Override
        public OptionalDouble price(FillPrices prices, int asset, int bar) {
            return OptionalDouble.of(prices.close(asset, bar));
        }

        @Override
        public int costsKnownOn(int bar) {
            return Math.min(bar + 3, bars - 1);
        }

        @Override
        public int barsToFirstReturn() {
            return 2;
        }
    }

    @Test
    void aPolicyThatLooksOneBarAheadIsCaught() {
        assertThat(cutsThatDiffer(PrefixTest::peeking, new Terms(new NextClose(0), PLAIN, CAPITAL)))
                .isNotEmpty();
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

    private static List<Integer> cutsThatDiffer(Function<PriceTable, Policy> policy, Terms terms) {
        return cutsThatDiffer(policy, table -> terms);
    }

    private static List<Integer> cutsThatDiffer(
            Function<PriceTable, Policy> policy, Function<PriceTable, Terms> terms) {
        Track whole = run(PRICES, policy, terms.apply(PRICES.table()));
        List<Integer> differing = new ArrayList<>();
        for (int bars = whole.firstBar() + 1; bars < BARS; bars++) {
            if (!facts(
                            run(
                                    PRICES.first(bars),
                                    policy,
                                    terms.apply(PRICES.first(bars).table())),
                            bars)
                    .equals(facts(whole, bars))) {
                differing.add(bars);
            }
        }
        return differing;
    }

    private static Track run(GivenPrices prices, Function<PriceTable, Policy> policy, Terms terms) {
        PriceTable table = prices.table();
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
                    track.marginInterest(bar),
                    track.borrowFee(bar),
                    track.dividend(bar),
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
        track.hindrances().stream().filter(one -> one.bar() < bars).forEach(facts::add);
        track.ledger().stream().filter(entry -> entry.bar() < bars).forEach(facts::add);
        return facts;
    }
}
