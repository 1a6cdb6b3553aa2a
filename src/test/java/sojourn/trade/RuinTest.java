package sojourn.trade;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Map;
import org.junit.jupiter.api.Test;
import sojourn.GivenPrices;
import sojourn.GivenProbabilities;
import sojourn.allocate.Weights;

class RuinTest {
    private static final double CAPITAL = 1_000;

    @Test
    void wealthGoneAtACloseEndsEverything() {
        // three times 100 bought at bar 1; at 60 the loss is 1.2 times the capital
        Track track = run(
                new double[] {100, 100, 90, 60, 200, 300}, Map.of(0, Weights.of(3), 4, Weights.of(1)), Costs.none());
        assertThat(track.ruinedOn()).hasValue(3);
        assertThat(track.wealth(2)).isCloseTo(700, within(1e-9));
        assertThat(track.wealth(0, 5)[3]).isZero();
        assertThat(track.wealth(5)).isZero();
        assertThat(track.units(3, 0)).isZero();
        assertThat(track.cashWeight(4)).isZero();
        assertThat(track.simpleReturns(1, 5)).satisfies(returns -> {
            assertThat(returns[2]).isEqualTo(-1);
            assertThat(returns[3]).isZero();
            assertThat(returns[4]).isZero();
        });
        assertThat(track.fills()).hasSize(2);
        assertThat(track.fills().get(1).because().sentence()).startsWith("ruin");
        assertThat(track.fills().get(0).units() + track.fills().get(1).units()).isZero();
        LedgerEntry last = track.ledger().get(track.ledger().size() - 1);
        assertThat(last.kind()).isEqualTo(LedgerKind.RUIN);
        assertThat(last.amount()).as("the debt nobody pays").isCloseTo(200, within(1e-9));
        double cash = track.ledger().stream().mapToDouble(LedgerEntry::amount).sum();
        assertThat(cash).isCloseTo(0, within(1e-9));
    }

    @Test
    void ordersOvertakenByRuinAreListed() {
        Track track =
                run(new double[] {100, 100, 100, 20, 20}, Map.of(0, Weights.of(3), 2, Weights.of(0.5)), Costs.none());
        assertThat(track.ruinedOn()).hasValue(3);
        assertThat(track.fills()).hasSize(2);
        assertThat(track.unfilled()).extracting(Order::decidedOn).containsExactly(2);
    }

    @Test
    void costsThatWouldEatMoreThanThereIsAreRuin() {
        // three times wealth held at bar 1, worth 2.02 at 67.33 with wealth left 0.0199: giving it up at 1 % costs more
        // than that
        Track track = run(
                new double[] {100, 100, 67.2, 67.2, 67.2},
                Map.of(0, Weights.of(3), 1, Weights.of(0)),
                new Costs(100, 0));
        assertThat(track.ruinedOn()).hasValue(2);
        assertThat(track.wealth(2)).isZero();
        LedgerEntry last = track.ledger().get(track.ledger().size() - 1);
        assertThat(last.kind()).isEqualTo(LedgerKind.RUIN);
        double cash = track.ledger().stream().mapToDouble(LedgerEntry::amount).sum();
        assertThat(cash).isCloseTo(0, within(1e-9));
    }

    /** Twice 100 bought at the open of bar 1; the open of bar 3 at 40 leaves -200, the close at 90 leaves 800: no ruin. */
    @Test
    void anOpenAtWhichWealthIsGoneIsNoRuinIfTheCloseHasSome() {
        GivenPrices prices = GivenPrices.closes(new double[] {100, 100, 100, 90, 90, 90})
                .withOpens(new double[] {100, 100, 100, 40, 90, 90});
        Track track = Simulation.run(
                        prices.table(),
                        GivenProbabilities.stormy(new double[6]),
                        Policies.at(Map.of(0, Weights.of(2), 2, Weights.of(0))),
                        new Terms(new NextOpen(0), Costs.none(), CAPITAL),
                        0)
                .orElseThrow();
        assertThat(track.ruinedOn()).isEmpty();
        assertThat(track.wealth(3)).isEqualTo(800);
        assertThat(track.hindrances()).containsExactly(new Hindrance(3, 2, 0, Hindrance.Kind.NO_WEALTH));
        assertThat(track.fills()).extracting(Fill::filledOn).containsExactly(1, 4);
        assertThat(track.wealth(5)).isEqualTo(800);
    }

    @Test
    void theRuinBarKeepsTheBooksToo() {
        double[] closes = {100, 100, 90, 60, 200};
        Track track = run(closes, Map.of(0, Weights.of(3)), new Costs(10, 10));
        for (int bar = 1; bar < closes.length; bar++) {
            int now = bar;
            double moved = track.ledger().stream()
                    .filter(entry -> entry.bar() == now && entry.kind() != LedgerKind.TRADE)
                    .mapToDouble(LedgerEntry::amount)
                    .sum();
            double gains = track.units(bar - 1, 0) * (closes[bar] - closes[bar - 1]);
            assertThat(track.wealth(bar) - track.wealth(bar - 1))
                    .as("bar %d", bar)
                    .isCloseTo(gains + moved, within(1e-9));
        }
    }

    private static Track run(double[] closes, Map<Integer, Weights> orders, Costs costs) {
        GivenPrices prices = GivenPrices.closes(closes);
        return Simulation.run(
                        prices.table(),
                        GivenProbabilities.stormy(new double[closes.length]),
                        Policies.at(orders),
                        new Terms(new NextClose(0), costs, CAPITAL),
                        0)
                .orElseThrow();
    }
}
