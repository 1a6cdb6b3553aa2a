package sojourn.trade;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import java.time.LocalDate;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.TreeMap;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.CheckValues;
import sojourn.GivenPrices;
import sojourn.GivenProbabilities;
import sojourn.allocate.Weights;
import sojourn.market.FillPrices;

/** The simulation takes any fill rule: opens, closes that have no price, and dishonest ones. */
class FillRulesTest {
    @Test
    void dailyOrdersForFullWeightAtOpensAgreeWithTheWorkedCase() {
        CheckValues check = CheckValues.byId("ledger_identity_full_weight");
        Track track = worked(check, Costs.none());
        check.assertExpected("equity", track.wealth(0, track.lastBar()));
    }

    @ParameterizedTest
    @ValueSource(strings = {"ledger_one_asset_open", "ledger_one_asset_close_lots"})
    void everyRowOfAWorkedLedgerAgrees(String id) {
        CheckValues check = CheckValues.byId(id);
        double bps = 10_000;
        Costs costs = new Costs(
                        bps * check.input("commission").asDouble(),
                        bps * check.input("half_spread").get(0).asDouble())
                .withFees(check.input("min_ticket").asDouble(), 0)
                .withFinancing(
                        100 * check.input("borrow_fee").asDouble(),
                        100 * check.input("financing_spread").asDouble());
        Track track = worked(check, costs);
        for (int day = 0; day < track.size(); day++) {
            JsonNode row = check.expected("rows").get(day);
            check.assertClose("interest", track.interest(day) - track.marginInterest(day), row.get("interest"));
            check.assertClose("borrow", track.borrowFee(day), row.get("borrow"));
            check.assertClose("dividends", track.dividend(day), row.get("dividends"));
            assertThat(track.cash(day)).as("cash").isCloseTo(row.get("cash").asDouble(), within(1e-7));
            check.assertClose("costs", track.cost(day), row.get("costs").get(0));
            check.assertClose("units", track.units(day, 0), row.get("units").get(0));
            check.assertClose(
                    "weights", track.weight(day, 0), row.get("weights").get(0));
            check.assertClose("equity", track.wealth(day), row.get("equity"));
        }
    }

    private static Track worked(CheckValues check, Costs costs) {
        JsonNode days = check.input("days");
        int bars = days.size();
        double[] opens = new double[bars];
        double[] closes = new double[bars];
        double[] cash = new double[bars];
        double[] money = new double[bars];
        double[] ratios = new double[bars];
        Arrays.fill(ratios, 1);
        LocalDate[] dates = new LocalDate[bars];
        Map<Integer, Weights> orders = new TreeMap<>();
        for (int day = 0; day < bars; day++) {
            JsonNode row = days.get(day);
            dates[day] = LocalDate.parse(row.get("date").asText());
            opens[day] = row.get("open").get(0).asDouble();
            closes[day] = row.get("close").get(0).asDouble();
            money[day] = row.has("dividend") ? row.get("dividend").get(0).asDouble() : 0;
            if (row.has("target")) {
                orders.put(day, Weights.of(row.get("target").get(0).asDouble()));
            }
            if (day > 0) {
                double days365 = (dates[day].toEpochDay() - dates[day - 1].toEpochDay())
                        / check.input("day_count").asDouble();
                cash[day] = check.input("cash_rate").asDouble() * days365;
            }
        }
        GivenPrices prices =
                GivenPrices.closes(closes).withOpens(opens).withCash(cash).on(dates);
        boolean opening = check.input("fill").asText().equals("next_open");
        Terms terms = new Terms(
                opening ? new NextOpen(0) : new NextClose(0),
                costs,
                check.input("initial_cash").asDouble(),
                SizeAt.FILL,
                check.hasInput("lot") ? new Lots(check.input("lot").asInt(), Map.of()) : Lots.FRACTIONS);
        return run(prices.giving(new double[][] {money}, new double[][] {ratios}), orders, terms);
    }

    /** Opens stand 37 % above closes: what a unit cost says which of the two filled it. */
    @ParameterizedTest
    @ValueSource(ints = {0, 1, 2, 3, 4, 5})
    void delayedOrdersFillExactlySoManyBarsLaterAtTheirOwnPrice(int delay) {
        GivenPrices walk = GivenPrices.random(31, 40, 1);
        double[] opens = new double[40];
        Arrays.setAll(opens, bar -> 1.37 * walk.close(0, bar));
        GivenPrices prices = walk.withOpens(opens);
        Map<Integer, Weights> daily = new TreeMap<>();
        for (int bar = 0; bar < 40; bar++) {
            daily.put(bar, Weights.of(0.3 + 0.01 * bar));
        }
        for (FillRule rule : List.of(new NextOpen(delay), new NextClose(delay))) {
            Track track = run(prices, daily, rule, Costs.none(), 1_000);
            assertThat(track.fills()).hasSize(39 - delay);
            for (Fill fill : track.fills()) {
                double close = prices.close(0, fill.filledOn());
                assertThat(fill.filledOn()).as("%s", rule).isEqualTo(fill.decidedOn() + 1 + delay);
                assertThat(fill.price()).as("%s", rule).isEqualTo(rule instanceof NextOpen ? 1.37 * close : close);
            }
            assertThat(rule.barsToFirstReturn()).isEqualTo(rule instanceof NextOpen ? 1 + delay : 2 + delay);
        }
    }

    @Test
    void aMissingOpenBlocksTheWholeBasketForThatBar() {
        double[] missing = {100, 100, Double.NaN, 100, 100};
        double[] there = {100, 100, 100, 100, 100};
        GivenPrices prices = GivenPrices.flat(5, 2).withOpens(missing, there);
        Track track = run(prices, Map.of(1, Weights.of(0.3, 0.3)), new NextOpen(0), Costs.none(), 1_000);
        assertThat(track.fills()).extracting(Fill::filledOn).containsExactly(3, 3);
        assertThat(track.hindrances()).containsExactly(new Hindrance(2, 1, 0, Hindrance.Kind.NO_PRICE));
    }

    /** Where quantities are settled, a leg that stays as it is needs no price; what it is worth is its close before. */
    @Test
    void aLegThatIsNotTradedNeedsNoPrice() {
        double[] missing = {100, 100, Double.NaN, 100, 100};
        double[] there = {100, 100, 100, 100, 100};
        GivenPrices prices = GivenPrices.flat(5, 2).withOpens(missing, there);
        Terms terms = new Terms(new NextOpen(0), Costs.none(), 1_000, SizeAt.DECISION, new Lots(0, Map.of("a", 1_000)));
        Track track = Simulation.run(
                        prices.table(),
                        GivenProbabilities.stormy(new double[prices.size()]),
                        Policies.at(Map.of(1, Weights.of(0.3, 0.3))),
                        terms,
                        0)
                .orElseThrow();
        assertThat(track.fills()).extracting(Fill::filledOn).containsExactly(2);
        assertThat(track.units(2, 1)).isEqualTo(3);
        Track held = Simulation.run(
                        GivenPrices.flat(5, 2)
                                .withOpens(new double[] {100, 100, 100, Double.NaN, 100}, there)
                                .table(),
                        GivenProbabilities.stormy(new double[prices.size()]),
                        Policies.at(Map.of(1, Weights.of(0.5, 0), 2, Weights.of(0.5, 0.5))),
                        new Terms(new NextOpen(0), Costs.none(), 1_000, SizeAt.DECISION, Lots.FRACTIONS),
                        0)
                .orElseThrow();
        assertThat(held.fills()).extracting(Fill::filledOn).containsExactly(2, 3);
        assertThat(held.turnover(3)).as("500 of 1000, half of it").isEqualTo(0.25);
    }

    @Test
    void quantitiesSettledAtTheDecisionAreThoseOfItsCloseWhateverTheFillCosts() {
        GivenPrices prices = GivenPrices.closes(new double[] {100, 125, 80, 80, 80});
        Map<Integer, Weights> orders = Map.of(0, Weights.of(0.5), 2, Weights.of(1));
        Terms terms = new Terms(new NextClose(0), new Costs(10, 0), 1_000, SizeAt.DECISION, Lots.FRACTIONS);
        Track track = run(prices, orders, terms);
        // V = 1000 - 0.001 × 0.5 V at the decision; half of it in units of 100
        double units = 0.5 * (1_000 / 1.0005) / 100;
        assertThat(track.fills().get(0).units()).isCloseTo(units, within(1e-12));
        assertThat(track.fills().get(0).price()).isEqualTo(125);
        assertThat(track.cash(1)).isCloseTo(1_000 - units * 125 * 1.001, within(1e-9));
        // at bar 2: V = cash + units × 80, all of it at 80 after costs of the rest
        double worth = track.wealth(2);
        double more = (worth - 80 * units) / (80 * 1.001);
        assertThat(track.fills().get(1).units()).isCloseTo(more, within(1e-9));
    }

    @Test
    void queuedQuantitiesAreSettledAsIfTheOrdersBeforeHadFilled() {
        GivenPrices prices = GivenPrices.flat(12, 1);
        Map<Integer, Weights> orders = Map.of(0, Weights.of(0.5), 1, Weights.of(0.7), 2, Weights.of(0.2));
        Track track =
                run(prices, orders, new Terms(new NextClose(3), Costs.none(), 1_000, SizeAt.DECISION, Lots.FRACTIONS));
        assertThat(track.fills()).extracting(Fill::filledOn).containsExactly(4, 5, 6);
        double[] steps = {5, 2, -5};
        for (int i = 0; i < 3; i++) {
            assertThat(track.fills().get(i).units()).isCloseTo(steps[i], within(1e-12));
        }
    }

    @Test
    void wholeLotsLeaveTheRestInCashAndRoundSalesUp() {
        GivenPrices prices = GivenPrices.closes(new double[] {30, 30, 30, 30, 30});
        Terms terms = new Terms(new NextClose(0), Costs.none(), 1_000, SizeAt.FILL, new Lots(10, Map.of()));
        Track track = run(prices, Map.of(0, Weights.of(1), 2, Weights.of(0.5)), terms);
        // 33.3 units are 30 in lots of ten; half of 1000 is 16.7 units, 10 in lots of ten
        assertThat(track.fills()).extracting(Fill::units).containsExactly(30.0, -20.0);
        assertThat(track.cash(1)).isEqualTo(100);
        assertThat(track.cash(4)).isEqualTo(700);
    }

    @Test
    void aLotLargerThanCapitalIsNotBoughtAndSaidSo() {
        GivenPrices prices = GivenPrices.flat(6, 2);
        for (SizeAt size : SizeAt.values()) {
            Terms terms = new Terms(
                    new NextClose(0), new Costs(0, 5).withFees(3, 1), 1_000, size, new Lots(0, Map.of("b", 11)));
            Track track = run(prices, Map.of(1, Weights.of(0.25, 0.75)), terms);
            assertThat(track.fills()).extracting(Fill::asset).containsExactly(0);
            assertThat(track.hindrances()).extracting(Hindrance::asset).containsExactly(1);
            assertThat(track.hindrances()).extracting(Hindrance::kind).containsExactly(Hindrance.Kind.LOT);
        }
    }

    @Test
    void aWholeNumberOfLotsIsNotLostToRounding() {
        for (int lots = 1; lots < 2_000; lots++) {
            assertThat(Lots.whole(0.1, 0.1 * lots) / 0.1).isCloseTo(lots, within(1e-9));
            assertThat(Lots.whole(7, -7 * lots - 6.9)).isEqualTo(-7 * lots);
        }
    }

    @Test
    void anOrderWithoutAPriceWaitsAndTheNextOneDueReplacesIt() {
        GivenPrices prices = GivenPrices.random(21, 12, 1);
        FillRule closedOn = new ClosedOn(Set.of(1, 2, 6, 7));
        Track track = run(
                prices,
                Map.of(0, Weights.of(0.2), 5, Weights.of(0.4), 6, Weights.of(0.6), 11, Weights.of(1)),
                closedOn,
                Costs.none(),
                1_000);
        assertThat(track.fills()).extracting(Fill::decidedOn).containsExactly(0, 6);
        assertThat(track.fills()).extracting(Fill::filledOn).containsExactly(3, 8);
        assertThat(track.unfilled()).extracting(Order::decidedOn).containsExactly(5, 11);
    }

    @Test
    void aRuleThatFillsAtTheVeryCloseOfTheDecisionHoldsItsPositionAtOnce() {
        GivenPrices prices = GivenPrices.closes(new double[] {100, 110, 121, 133.1});
        Track track = run(prices, Map.of(1, Weights.of(1)), new SameClose(), Costs.none(), 1_000);
        assertThat(track.units(1, 0)).isEqualTo(1_000 / 110.0);
        assertThat(track.wealth(2)).isEqualTo(1_000 / 110.0 * 121);
    }

    private static Track run(
            GivenPrices prices, Map<Integer, Weights> orders, FillRule fill, Costs costs, double capital) {
        return run(prices, orders, new Terms(fill, costs, capital));
    }

    private static Track run(GivenPrices prices, Map<Integer, Weights> orders, Terms terms) {
        return Simulation.run(
                        prices.table(),
                        GivenProbabilities.stormy(new double[prices.size()]),
                        Policies.at(orders),
                        terms,
                        0)
                .orElseThrow();
    }

    private record ClosedOn(Set<Integer> bars) implements FillRule {
        @Override
        public int dueOn(int decidedOn) {
            return decidedOn + 1;
        }

        @Override
        public OptionalDouble price(FillPrices prices, int asset, int bar) {
            return bars.contains(bar) ? OptionalDouble.empty() : OptionalDouble.of(prices.close(asset, bar));
        }

        @Override
        public int barsToFirstReturn() {
            return 2;
        }
    }

    private record SameClose() implements FillRule {
        @Override
        public int dueOn(int decidedOn) {
            return decidedOn;
        }

        @Override
        public OptionalDouble price(FillPrices prices, int asset, int bar) {
            return OptionalDouble.of(prices.close(asset, bar));
        }

        @Override
        public int barsToFirstReturn() {
            return 1;
        }
    }
}
