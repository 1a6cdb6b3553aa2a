package sojourn.trade;

import static org.assertj.core.api.Assertions.assertThat;

import com.fasterxml.jackson.databind.JsonNode;
import java.time.LocalDate;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.TreeMap;
import org.junit.jupiter.api.Test;
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

    /** Up to the third day; from the fourth on the case has a dividend, a minimum ticket that may bind and a borrowing rate. */
    @Test
    void anOpenFillWithCostsAndInterestAgreesWithTheWorkedCase() {
        CheckValues check = CheckValues.byId("ledger_one_asset_open");
        double bps = 10_000;
        Track track = worked(
                check,
                new Costs(
                        bps * check.input("commission").asDouble(),
                        bps * check.input("half_spread").get(0).asDouble()));
        for (int day = 0; day < 3; day++) {
            JsonNode row = check.expected("rows").get(day);
            check.assertClose("interest", track.interest(day), row.get("interest"));
            check.assertClose("cash", track.cash(day), row.get("cash"));
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
        LocalDate[] dates = new LocalDate[bars];
        Map<Integer, Weights> orders = new TreeMap<>();
        for (int day = 0; day < bars; day++) {
            JsonNode row = days.get(day);
            dates[day] = LocalDate.parse(row.get("date").asText());
            opens[day] = row.get("open").get(0).asDouble();
            closes[day] = row.get("close").get(0).asDouble();
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
        return run(
                prices,
                orders,
                new NextOpen(),
                costs,
                check.input("initial_cash").asDouble());
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
        return Simulation.run(
                        prices.table(),
                        GivenProbabilities.stormy(new double[prices.size()]),
                        Policies.at(orders),
                        new Terms(fill, costs, capital),
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
