package sojourn.trade;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.GivenPrices;
import sojourn.GivenProbabilities;
import sojourn.allocate.Decision;
import sojourn.allocate.HoldFromStart;
import sojourn.allocate.Policy;
import sojourn.allocate.Situation;
import sojourn.allocate.Weights;

class SimulationTest {
    private static final double CAPITAL = 1_000_000;
    private static final int BARS = 400;

    @Test
    void fullWeightWithoutCostsIsBuyAndHoldToTheBit() {
        GivenPrices prices = GivenPrices.random(1, BARS, 1);
        GivenProbabilities calm = GivenProbabilities.stormy(new double[BARS]);
        Terms terms = new Terms(new NextClose(0), Costs.none(), CAPITAL);
        Track held = Simulation.run(prices.table(), calm, new HoldFromStart(Weights.of(1)), terms, 0)
                .orElseThrow();
        Track rule = Simulation.run(prices.table(), calm, Policies.stepAside(List.of("a")), terms, 0)
                .orElseThrow();
        Track daily = Simulation.run(prices.table(), calm, Policies.always(1), terms, 0)
                .orElseThrow();
        double units = (CAPITAL + CAPITAL * prices.table().fillPrices().cashReturn(1)) / prices.close(0, 1);
        for (int bar = 1; bar < BARS; bar++) {
            assertThat(held.wealth(bar)).as("bar %d", bar).isEqualTo(units * prices.close(0, bar));
            assertThat(rule.wealth(bar)).as("bar %d", bar).isEqualTo(held.wealth(bar));
            assertThat(daily.wealth(bar)).as("bar %d", bar).isEqualTo(held.wealth(bar));
            assertThat(held.cash(bar)).as("bar %d", bar).isZero();
        }
        assertThat(daily.fills())
                .as("a daily order for what is held trades nothing")
                .hasSize(1);
    }

    @Test
    void fullWeightAtCostCBeginsWithCapitalOverOnePlusC() {
        Terms terms = new Terms(new NextClose(0), new Costs(5, 7.5), CAPITAL);
        GivenPrices prices = GivenPrices.random(2, BARS, 1).withCash(new double[BARS]);
        Track track = run(prices, new HoldFromStart(Weights.of(1)), terms);
        assertThat(track.wealth(0)).isEqualTo(CAPITAL);
        assertThat(track.wealth(1)).isCloseTo(CAPITAL / 1.00125, within(1e-15 * CAPITAL));
        assertThat(track.cash(1)).isZero();
        assertThat(track.weight(1, 0)).isEqualTo(1);
    }

    @Test
    void weightNothingIsACashAccount() {
        GivenPrices prices = GivenPrices.random(3, BARS, 2);
        Track track = run(prices, Policies.always(0, 0), new Terms(new NextClose(0), new Costs(5, 5), CAPITAL));
        double cash = CAPITAL;
        for (int bar = 1; bar < BARS; bar++) {
            cash += cash * prices.table().fillPrices().cashReturn(bar);
            assertThat(track.wealth(bar)).as("bar %d", bar).isEqualTo(cash);
        }
        assertThat(track.fills()).isEmpty();
    }

    @Test
    void cashIsNeverNegativeWhenTheTargetBorrowsNothing() {
        GivenPrices prices = GivenPrices.random(4, BARS, 3);
        for (Costs costs : List.of(Costs.none(), new Costs(5, 5), new Costs(123.4, 0.7))) {
            Track track = run(prices, Policies.always(0.7, 0.2, 0.1), new Terms(new NextClose(0), costs, CAPITAL));
            for (int bar = 0; bar < BARS; bar++) {
                assertThat(track.cash(bar)).as("bar %d, %s", bar, costs).isNotNegative();
            }
        }
    }

    @ParameterizedTest
    @ValueSource(ints = {0, 1, 2, 3, 4, 5})
    void anOrderFillsOnePlusDelayBarsLaterAndEarnsFromTheBarAfter(int delay) {
        GivenPrices prices = GivenPrices.random(5, 40, 1).withCash(new double[40]);
        Track track = run(
                prices,
                Policies.at(Map.of(7, Weights.of(1), 9, Weights.of(0.25))),
                new Terms(new NextClose(delay), Costs.none(), CAPITAL));
        assertThat(track.firstBar()).isEqualTo(7);
        assertThat(track.fills()).extracting(Fill::decidedOn).containsExactly(7, 9);
        assertThat(track.fills()).extracting(Fill::filledOn).containsExactly(8 + delay, 10 + delay);
        assertThat(track.wealth(8 + delay)).as("no return before the fill").isCloseTo(CAPITAL, within(1e-9));
        double firstEarned = prices.close(0, 9 + delay) / prices.close(0, 8 + delay) - 1;
        assertThat(track.simpleReturn(9 + delay)).isCloseTo(firstEarned, within(1e-14));
        assertThat(track.target(7, 0)).isEqualTo(1);
        assertThat(track.target(8, 0)).as("carried").isEqualTo(1);
        assertThat(track.target(9, 0)).isEqualTo(0.25);
    }

    @Test
    void dailyOrdersQueueAndEachFillsOnItsOwnBar() {
        int delay = 3;
        GivenPrices prices = GivenPrices.random(6, 60, 2);
        Track track = run(prices, Policies.always(0.5, 0.4), new Terms(new NextClose(delay), new Costs(1, 1), CAPITAL));
        assertThat(track.firstFill()).hasValue(1 + delay);
        for (Fill fill : track.fills()) {
            assertThat(fill.filledOn() - fill.decidedOn()).isEqualTo(1 + delay);
        }
        for (int bar = 1 + delay; bar < 60; bar++) {
            assertThat(track.weight(bar, 0)).as("bar %d", bar).isCloseTo(0.5, within(1e-9));
            assertThat(track.weight(bar, 1)).as("bar %d", bar).isCloseTo(0.4, within(1e-9));
        }
        assertThat(track.unfilled()).extracting(Order::dueOn).containsExactly(60, 61, 62, 63);
        assertThat(track.unfilled()).extracting(Order::decidedOn).containsExactly(56, 57, 58, 59);
    }

    @Test
    void whoeverDecidesSeesWeightsAsIfPendingOrdersHadFilled() {
        GivenPrices prices = GivenPrices.random(7, 12, 1);
        List<Situation> seen = new ArrayList<>();
        Policy orders = Policies.at(Map.of(1, Weights.of(0.5), 3, Weights.of(0.8)));
        Policy watching = (situation, stance) -> {
            seen.add(situation);
            return orders.at(situation, stance);
        };
        Track track = run(prices, watching, new Terms(new NextClose(2), Costs.none(), CAPITAL));
        assertThat(seen.get(1).weights()).isEqualTo(Weights.of(0.0));
        assertThat(seen.get(2).weights()).as("ordered, not filled").isEqualTo(Weights.of(0.5));
        assertThat(seen.get(3).weights()).isEqualTo(Weights.of(0.5));
        assertThat(seen.get(4).weights()).as("filled, but a later order waits").isEqualTo(Weights.of(0.8));
        assertThat(seen.get(7).weights()).as("drifting").isEqualTo(Weights.of(track.weight(7, 0)));
        assertThat(seen).extracting(Situation::barsAhead).containsOnly(4);
        assertThat(seen).extracting(situation -> situation.known().bar()).isSorted();
    }

    @Test
    void doublingCapitalLeavesEveryReturnAsItWas() {
        GivenPrices prices = GivenPrices.random(8, BARS, 2);
        Policy policy = Policies.random(8, BARS, 2, 1.2);
        Track one = run(prices, policy, new Terms(new NextClose(1), new Costs(5, 5), CAPITAL));
        Track two = run(prices, policy, new Terms(new NextClose(1), new Costs(5, 5), 2 * CAPITAL));
        assertThat(two.simpleReturns(3, BARS - 1)).containsExactly(one.simpleReturns(3, BARS - 1));
    }

    @Test
    void aTrackBeginsWithTheFirstDecisionThatAReadingAllows() {
        GivenPrices prices = GivenPrices.random(9, 30, 1);
        Terms terms = new Terms(new NextClose(0), Costs.none(), CAPITAL);
        GivenProbabilities late = GivenProbabilities.stormy(new double[30]).startingAt(11);
        Track track = Simulation.run(prices.table(), late, Policies.stepAside(List.of("a")), terms, 0)
                .orElseThrow();
        assertThat(track.firstBar()).isEqualTo(11);
        assertThat(track.wealth(11)).isEqualTo(CAPITAL);
        assertThat(track.units(11, 0)).isZero();
        assertThat(track.interest(11)).isZero();
        assertThat(track.size()).isEqualTo(19);
        GivenProbabilities never = late.startingAt(30);
        assertThat(Simulation.run(prices.table(), never, Policies.stepAside(List.of("a")), terms, 0))
                .isEmpty();
    }

    @Test
    void switchesAreMarkedOnTheBarOfTheDecision() {
        GivenPrices prices = GivenPrices.random(10, 6, 1);
        Track track = Simulation.run(
                        prices.table(),
                        GivenProbabilities.stormy(0.9, 0.9, 0.1, 0.1, 0.8, 0.8),
                        Policies.stepAside(List.of("a")),
                        new Terms(new NextClose(0), Costs.none(), CAPITAL),
                        0)
                .orElseThrow();
        List<Integer> switches = new ArrayList<>();
        for (int bar = 0; bar < 6; bar++) {
            if (track.switched(bar)) {
                switches.add(bar);
            }
        }
        assertThat(switches).containsExactly(2, 4);
        assertThat(track.fills().get(0).because().sentence())
                .isEqualTo("stormy 0.10 fell below 0.30; it was 0.90 the bar before");
    }

    @Test
    void turnoverIsHalfTheTradedValueByWealthBeforeTrading() {
        GivenPrices prices = GivenPrices.flat(8, 2);
        Track track = run(
                prices,
                Policies.at(Map.of(0, Weights.of(0.5, 0.5), 2, Weights.of(0.2, 0.7), 4, Weights.of(0, 0))),
                new Terms(new NextClose(0), Costs.none(), CAPITAL));
        assertThat(track.turnover(1)).isCloseTo(0.5, within(1e-15));
        assertThat(track.turnover(2)).isZero();
        assertThat(track.turnover(3)).isCloseTo((0.3 + 0.2) / 2, within(1e-15));
        assertThat(track.turnover(5)).isCloseTo(0.45, within(1e-15));
        assertThat(track.units(5, 0)).as("given up to the last unit").isZero();
    }

    @Test
    void barsOutsideTheTrackAreRefused() {
        Track track = run(
                GivenPrices.random(11, 10, 1),
                Policies.at(Map.of(4, Weights.of(1))),
                new Terms(new NextClose(0), Costs.none(), CAPITAL));
        assertThatThrownBy(() -> track.wealth(3))
                .hasMessageContaining("bar is 3")
                .hasMessageContaining("[4, 9]");
        assertThatThrownBy(() -> track.simpleReturn(4)).hasMessageContaining("bar is 3");
        assertThatThrownBy(() -> track.weight(5, 1)).hasMessageContaining("asset is 1");
    }

    @Test
    void aYardstickStartsWhereItIsTold() {
        GivenPrices prices = GivenPrices.random(12, 20, 1);
        Optional<Track> track = Simulation.run(
                prices.table(),
                GivenProbabilities.stormy(new double[20]),
                new HoldFromStart(Weights.of(0.6)),
                new Terms(new NextClose(0), Costs.none(), CAPITAL),
                13);
        assertThat(track.orElseThrow().firstBar()).isEqualTo(13);
        assertThat(track.orElseThrow().fills()).extracting(Fill::filledOn).containsExactly(14);
        assertThat(track.orElseThrow().stance().wanted()).contains(Weights.of(0.6));
    }

    @Test
    void aDecisionInsideTheBandIsRecordedAsTargetButNotTraded() {
        GivenPrices prices = GivenPrices.flat(6, 1);
        Policy policy = (situation, stance) -> situation.bar() == 2
                ? Decision.keep(Weights.of(0.51), stance, Policies.WHY, Decision.Change.SAME)
                : Policies.at(Map.of(0, Weights.of(0.5))).at(situation, stance);
        Track track = run(prices, policy, new Terms(new NextClose(0), Costs.none(), CAPITAL));
        assertThat(track.target(5, 0)).isEqualTo(0.51);
        assertThat(track.weight(5, 0)).isEqualTo(0.5);
    }

    private static Track run(GivenPrices prices, Policy policy, Terms terms) {
        return Simulation.run(prices.table(), GivenProbabilities.stormy(new double[prices.size()]), policy, terms, 0)
                .orElseThrow();
    }
}
