package sojourn.trade;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.EnumSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import sojourn.GivenPrices;
import sojourn.GivenProbabilities;
import sojourn.allocate.Policy;
import sojourn.market.FillPrices;
import sojourn.market.PriceTable;

/**
 * The books hold together on every bar, over random prices, policies, costs, fills, lots, dividends and splits; the name of a case
 * holds its seed.
 */
class BooksTest {
    private static final double CAPITAL = 1_000_000;
    private static final int BARS = 300;

    /** Sums over a whole path of numbers of the size of wealth, each rounded at about 1e-16 of it. */
    private static final double ROUNDING = 1e-12 * CAPITAL;

    private static final Costs EVERY = new Costs(5, 2)
            .withFees(3, 1)
            .withSpreadOf(new SpreadOfVolatility(0.1, 5))
            .withStampDuty(10)
            .withImpact(new Impact(1, 4, 6, Optional.of(30.0)))
            .withFinancing(1, 2);

    private record Case(
            long seed,
            int assets,
            String policy,
            Costs costs,
            int delay,
            FillTime fill,
            SizeAt size,
            int lot,
            boolean giving) {
        GivenPrices prices() {
            GivenPrices prices = GivenPrices.random(seed, BARS, assets).withRandomVolumes(seed, 40_000);
            return giving ? prices.givingAtRandom(seed) : prices;
        }

        /** Whether orders meet their targets to rounding. */
        boolean exact() {
            return size == SizeAt.FILL && fill == FillTime.NEXT_CLOSE && lot == 0 && !costs.equals(EVERY);
        }

        Track track() {
            PriceTable table = prices().table();
            GivenProbabilities signal = Policies.signal(seed, BARS);
            return Simulation.run(table, signal, rule(table.assets()), terms(), 0)
                    .orElseThrow();
        }

        private Terms terms() {
            return new Terms(fill.delayed(delay), costs, CAPITAL, size, new Lots(lot, Map.of()));
        }

        private Policy rule(List<String> names) {
            return switch (policy) {
                case "switch" -> Policies.stepAside(names);
                case "blend" -> Policies.mixed(names);
                default -> Policies.random(seed, BARS, assets, 1.5);
            };
        }
    }

    static List<Case> cases() {
        List<Case> cases = new ArrayList<>();
        long seed = 100;
        for (String policy : List.of("switch", "blend", "random")) {
            for (int assets = 1; assets <= 3; assets++) {
                for (Costs costs : List.of(Costs.none(), new Costs(5, 5), new Costs(0, 150))) {
                    for (int delay : new int[] {0, 3}) {
                        cases.add(new Case(
                                seed++, assets, policy, costs, delay, FillTime.NEXT_CLOSE, SizeAt.FILL, 0, false));
                    }
                }
            }
        }
        for (String policy : List.of("switch", "random")) {
            for (FillTime fill : FillTime.values()) {
                for (SizeAt size : SizeAt.values()) {
                    for (int lot : new int[] {0, 10}) {
                        for (Costs costs : List.of(new Costs(5, 5), EVERY)) {
                            cases.add(new Case(seed, 2, policy, costs, (int) (seed++ % 3), fill, size, lot, true));
                        }
                    }
                }
            }
        }
        return cases;
    }

    static List<Case> exactCases() {
        return cases().stream().filter(Case::exact).toList();
    }

    static List<Case> roundedCases() {
        return cases().stream()
                .filter(given -> !given.exact() && given.size() == SizeAt.FILL)
                .toList();
    }

    static List<Case> plainCases() {
        return cases().stream().filter(given -> !given.giving()).toList();
    }

    @ParameterizedTest
    @MethodSource("cases")
    void wealthChangesByPriceGainsAndEveryMovementOfCashOtherThanTrades(Case given) {
        Track track = given.track();
        double[] moved = new double[BARS];
        for (LedgerEntry entry : track.ledger()) {
            moved[entry.bar()] += entry.kind() == LedgerKind.TRADE ? 0 : entry.amount();
        }
        FillPrices prices = given.prices().table().fillPrices();
        for (int bar = track.firstBar() + 1; bar < BARS; bar++) {
            double gains = 0;
            for (int i = 0; i < given.assets(); i++) {
                double split = track.units(bar - 1, i) * prices.split(i, bar);
                gains += split * prices.close(i, bar) - track.units(bar - 1, i) * prices.close(i, bar - 1);
                gains += intraday(track, prices, bar, i);
            }
            assertThat(track.wealth(bar) - track.wealth(bar - 1))
                    .as("%s, bar %d", given, bar)
                    .isCloseTo(gains + moved[bar], within(ROUNDING));
        }
    }

    /** What units bought at another price than the close gained by the close. */
    private static double intraday(Track track, FillPrices prices, int bar, int asset) {
        return track.fills().stream()
                .filter(fill -> fill.filledOn() == bar && fill.asset() == asset)
                .mapToDouble(fill -> fill.units() * (prices.close(asset, bar) - fill.price()))
                .sum();
    }

    @ParameterizedTest
    @MethodSource("cases")
    void theLedgerAddsUpToCashAndTheFillsToUnits(Case given) {
        Track track = given.track();
        List<LedgerEntry> ledger = track.ledger();
        FillPrices prices = given.prices().table().fillPrices();
        double cash = 0;
        double[] units = new double[given.assets()];
        int entry = 0;
        int fill = 0;
        for (int bar = track.firstBar(); bar < BARS; bar++) {
            for (; entry < ledger.size() && ledger.get(entry).bar() == bar; entry++) {
                cash += ledger.get(entry).amount();
            }
            for (int i = 0; i < units.length && bar > track.firstBar(); i++) {
                units[i] *= prices.split(i, bar);
            }
            for (; fill < track.fills().size() && track.fills().get(fill).filledOn() == bar; fill++) {
                units[track.fills().get(fill).asset()] +=
                        track.fills().get(fill).units();
            }
            assertThat(cash).as("%s, bar %d", given, bar).isCloseTo(track.cash(bar), within(ROUNDING));
            for (int i = 0; i < units.length; i++) {
                assertThat(units[i]).as("%s, bar %d", given, bar).isEqualTo(track.units(bar, i));
            }
        }
        assertThat(fill).as("%s trades", given).isEqualTo(track.fills().size()).isPositive();
    }

    @ParameterizedTest
    @MethodSource("exactCases")
    void weightsAfterAFillAreTheTarget(Case given) {
        Track track = given.track();
        assertThat(track.fills()).isNotEmpty();
        for (Fill fill : track.fills()) {
            double target = track.target(fill.decidedOn(), fill.asset());
            assertThat(fill.weightAfter()).as("%s, %s", given, fill).isCloseTo(target, within(1e-9));
            assertThat(track.weight(fill.filledOn(), fill.asset()))
                    .as("%s", given)
                    .isCloseTo(target, within(1e-8));
        }
    }

    /** Lots and limits of participation take positions towards their targets and never beyond them, but for costs of a lot. */
    @ParameterizedTest
    @MethodSource("roundedCases")
    void noFillTakesAPositionBeyondItsTarget(Case given) {
        Track track = given.track();
        assertThat(track.fills()).isNotEmpty();
        for (Fill fill : track.fills()) {
            double target = Math.abs(track.target(fill.decidedOn(), fill.asset()));
            if (Math.abs(fill.weightAfter()) > Math.abs(fill.weightBefore())) {
                assertThat(Math.abs(fill.weightAfter()))
                        .as("%s, %s", given, fill)
                        .isLessThan(target + 1e-4);
            }
        }
    }

    @ParameterizedTest
    @MethodSource("cases")
    void everyRowAddsUp(Case given) {
        Track track = given.track();
        for (int bar = track.firstBar(); bar < BARS; bar++) {
            assertThat(track.netWeight(bar) + track.cashWeight(bar))
                    .as("%s", given)
                    .isCloseTo(track.wealth(bar) > 0 ? 1 : 0, within(1e-12));
        }
    }

    /** The unit path is the track's own; the plain account below knows nothing of targets and solving. */
    @ParameterizedTest
    @MethodSource("plainCases")
    void aPlainAccountOfTheSameUnitsAgreesAndHigherCostsNeverHelpIt(Case given) {
        Track track = given.track();
        double rate = given.costs().oneWayRate();
        assertThat(plainWealth(given, track, rate)).as("%s", given).isCloseTo(track.wealth(BARS - 1), within(ROUNDING));
        double last = Double.POSITIVE_INFINITY;
        for (double each : new double[] {0, 0.0001, 0.001, 0.01}) {
            double wealth = plainWealth(given, track, each);
            assertThat(wealth).as("%s at %s", given, each).isLessThan(last);
            last = wealth;
        }
    }

    private static double plainWealth(Case given, Track track, double rate) {
        FillPrices prices = given.prices().table().fillPrices();
        double cash = CAPITAL;
        double[] units = new double[given.assets()];
        for (int bar = track.firstBar() + 1; bar < BARS; bar++) {
            cash *= 1 + prices.cashReturn(bar);
            for (Fill fill : track.fills()) {
                if (fill.filledOn() == bar) {
                    double value = fill.units() * prices.close(fill.asset(), bar);
                    cash -= value + rate * Math.abs(value);
                    units[fill.asset()] += fill.units();
                }
            }
        }
        double wealth = cash;
        for (int i = 0; i < units.length; i++) {
            wealth += units[i] * prices.close(i, BARS - 1);
        }
        return wealth;
    }

    @Test
    void everyKindOfMovementIsAmongTheCases() {
        Set<LedgerKind> met = EnumSet.noneOf(LedgerKind.class);
        Set<Hindrance.Kind> hindered = EnumSet.noneOf(Hindrance.Kind.class);
        for (Case given : cases()) {
            given.track().ledger().forEach(entry -> met.add(entry.kind()));
            given.track().hindrances().forEach(one -> hindered.add(one.kind()));
        }
        assertThat(met).containsAll(EnumSet.complementOf(EnumSet.of(LedgerKind.RUIN)));
        assertThat(hindered).contains(Hindrance.Kind.PARTICIPATION, Hindrance.Kind.NO_VOLATILITY);
    }

    @Test
    void theFirstEntryIsTheCapital() {
        LedgerEntry first = cases().get(0).track().ledger().get(0);
        assertThat(first.kind()).isEqualTo(LedgerKind.CAPITAL);
        assertThat(first.amount()).isEqualTo(CAPITAL);
        assertThat(first.asset()).isEmpty();
    }
}
