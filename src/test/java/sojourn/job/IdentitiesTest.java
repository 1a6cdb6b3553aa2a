package sojourn.job;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.file.Path;
import java.time.LocalDate;
import java.time.temporal.ChronoUnit;
import java.util.List;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** What must hold between the columns of the written files, worked out from the files and the prices alone. */
class IdentitiesTest {
    private static final double CAPITAL = 1_000_000;
    private static final double COST_ONE_WAY = 0.001;

    /** Sums of some hundred amounts near the capital: rounding only. */
    private static final double MONEY = 1e-9 * CAPITAL;

    private static final double FRACTION = 1e-12;

    @TempDir
    static Path temp;

    private static JobFolder job = new JobFolder(Path.of(""));

    @BeforeAll
    static void compare() {
        LocalDate start = LocalDate.of(2003, 1, 1);
        job = new JobFolder(temp)
                .with("stocks.csv", DrawnPrices.csv(11, 620, start))
                .with("bonds.csv", DrawnPrices.csv(12, 620, start))
                .with("switch.yaml", StrategyText.named("Waiting switch").with("trade", trade("delay: 2")))
                .with(
                        "blend.yaml",
                        StrategyText.named("Blend of two")
                                .with("prices", "{stocks: {csv: stocks.csv}, bonds: {csv: bonds.csv}}")
                                .with("refit", "{first-fit-after: 150, every: 60, window: {rolling: 150}, seed: 3}")
                                .with(
                                        "allocate",
                                        "{blend: {weights: {calm: {stocks: 1.4, bonds: -0.3}, stormy: {bonds: 0.9}}}}")
                                .with("limits", "{gross: 1.7, per-asset: [-0.5, 1.5]}")
                                .with("trade", trade("no-trade-band: 0.05")))
                .with("full.yaml", StrategyText.alwaysFull("Full and free").with("trade", "{delay: 0}"))
                .with("costly.yaml", StrategyText.alwaysFull("Full at a cost").with("trade", trade("delay: 1")));
        JobFolder.Ran ran = job.compare("identities", "switch.yaml", "blend.yaml", "full.yaml", "costly.yaml");
        assertThat(ran.code()).as(ran.err()).isZero();
    }

    private static String trade(String more) {
        return "{costs: {commission-bps: 7, half-spread-bps: 3}, " + more + "}";
    }

    @ParameterizedTest
    @ValueSource(strings = {"waiting-switch", "blend-of-two", "full-and-free", "full-at-a-cost"})
    void wealthChangesByPriceGainsAndCashEntriesOtherThanTrades(String variant) {
        Written one = new Written(variant);
        double[] wealth = one.path.numbers("wealth");
        for (int t = 1; t < one.path.size(); t++) {
            double gain = 0;
            for (String asset : one.assets()) {
                gain += one.units(t - 1, asset) * (one.close(t, asset) - one.close(t - 1, asset));
            }
            double entries = 0;
            for (int i = 0; i < one.ledger.size(); i++) {
                boolean counts = one.ledger.text(i, "date").equals(one.date(t))
                        && !one.ledger.text(i, "kind").equals("trade");
                entries += counts ? one.ledger.number(i, "amount") : 0;
            }
            assertThat(wealth[t] - wealth[t - 1]).as(one.date(t)).isCloseTo(gain + entries, within(MONEY));
        }
    }

    @ParameterizedTest
    @ValueSource(strings = {"waiting-switch", "blend-of-two", "full-and-free", "full-at-a-cost"})
    void theRunningSumOfTheLedgerIsCash(String variant) {
        Written one = new Written(variant);
        int entry = 0;
        double sum = 0;
        for (int t = 0; t < one.path.size(); t++) {
            for (; entry < one.ledger.size() && one.ledger.text(entry, "date").equals(one.date(t)); entry++) {
                sum += one.ledger.number(entry, "amount");
            }
            assertThat(one.path.number(t, "weight.cash") * one.path.number(t, "wealth"))
                    .as(one.date(t))
                    .isCloseTo(sum, within(MONEY));
        }
        assertThat(entry).as("entries in the order of the bars").isEqualTo(one.ledger.size());
    }

    @ParameterizedTest
    @ValueSource(strings = {"waiting-switch", "blend-of-two", "full-and-free", "full-at-a-cost"})
    void weightsAreUnitsAtTheCloseAndSumToOneWithCash(String variant) {
        Written one = new Written(variant);
        for (int t = 0; t < one.path.size(); t++) {
            double sum = one.path.number(t, "weight.cash");
            for (String asset : one.assets()) {
                double weight = one.path.number(t, "weight." + asset);
                assertThat(weight)
                        .isCloseTo(
                                one.units(t, asset) * one.close(t, asset) / one.path.number(t, "wealth"),
                                within(FRACTION));
                sum += weight;
            }
            assertThat(sum).as(one.date(t)).isCloseTo(1, within(FRACTION));
        }
    }

    @ParameterizedTest
    @ValueSource(strings = {"waiting-switch", "blend-of-two", "full-and-free", "full-at-a-cost"})
    void costTurnoverAndUnitsFollowFromTheTrades(String variant) {
        Written one = new Written(variant);
        assertThat(one.trades.size()).isPositive();
        for (int t = 0; t < one.path.size(); t++) {
            double traded = 0;
            double cost = 0;
            for (int i = 0; i < one.trades.size(); i++) {
                if (one.trades.text(i, "filled_on").equals(one.date(t))) {
                    traded += Math.abs(one.trades.number(i, "notional"));
                    cost += one.trades.number(i, "commission") + one.trades.number(i, "half_spread");
                }
            }
            double before = one.path.number(t, "wealth") + cost; // fills are at the close, nothing moves after them
            assertThat(one.path.number(t, "cost")).isCloseTo(cost, within(MONEY));
            assertThat(one.path.number(t, "turnover")).isCloseTo(traded / 2 / before, within(FRACTION));
            for (String asset : one.assets()) {
                assertThat(one.units(t, asset))
                        .as(asset + " on " + one.date(t))
                        .isCloseTo(one.boughtUpTo(t, asset), within(MONEY / one.close(t, asset)));
            }
        }
    }

    @ParameterizedTest
    @ValueSource(strings = {"waiting-switch", "blend-of-two", "full-and-free", "full-at-a-cost"})
    void interestIsTheRateOnTheCashOfTheCloseBefore(String variant) {
        Written one = new Written(variant);
        assertThat(one.path.number(0, "interest")).isZero();
        for (int t = 1; t < one.path.size(); t++) {
            long days = ChronoUnit.DAYS.between(LocalDate.parse(one.date(t - 1)), LocalDate.parse(one.date(t)));
            double cash = one.path.number(t - 1, "weight.cash") * one.path.number(t - 1, "wealth");
            assertThat(one.path.number(t, "interest")).isCloseTo(cash * 0.02 * days / 365, within(1e-12 * CAPITAL));
        }
    }

    @ParameterizedTest
    @CsvSource({"waiting-switch, 2", "blend-of-two, 0", "full-and-free, 0", "full-at-a-cost, 1"})
    void everyOrderFillsItsDelayAfterItsDecisionAtTheTargetOfThatDay(String variant, int delay) {
        Written one = new Written(variant);
        List<String> dates = one.path.texts("date");
        for (int i = 0; i < one.trades.size(); i++) {
            int decided = dates.indexOf(one.trades.text(i, "decided_on"));
            int filled = dates.indexOf(one.trades.text(i, "filled_on"));
            assertThat(filled - decided).isEqualTo(1 + delay);
            String asset = one.trades.text(i, "asset");
            assertThat(one.trades.number(i, "price")).isEqualTo(one.close(filled, asset));
            assertThat(one.trades.number(i, "weight_after"))
                    .isCloseTo(one.path.number(decided, "target." + asset), within(FRACTION));
            assertThat(one.trades.text(i, "because")).isNotBlank();
        }
    }

    @Test
    void theFirstRowIsStartingCapitalWithoutAPosition() {
        for (String variant : List.of("waiting-switch", "blend-of-two", "full-and-free", "full-at-a-cost")) {
            WrittenTable path = new Written(variant).path;
            assertThat(path.number(0, "wealth")).isEqualTo(CAPITAL);
            assertThat(path.number(0, "weight.cash")).isEqualTo(1);
            assertThat(path.number(0, "units.stocks")).isZero();
            assertThat(path.number(0, "buy_and_hold.wealth")).isEqualTo(CAPITAL);
        }
    }

    @Test
    void fullWeightWithoutCostsIsBuyAndHoldToTheBit() {
        WrittenTable path = new Written("full-and-free").path;
        assertThat(path.texts("wealth")).isEqualTo(path.texts("buy_and_hold.wealth"));
        assertThat(path.number(path.size() - 1, "wealth")).isNotEqualTo(CAPITAL);
    }

    @Test
    void fullWeightAtACostStartsWithCapitalByOnePlusTheCost() {
        Written one = new Written("full-at-a-cost");
        int filled = one.path.texts("date").indexOf(one.trades.text(0, "filled_on"));
        double interest = 0;
        for (int t = 0; t <= filled; t++) {
            interest += one.path.number(t, "interest");
        }
        assertThat(one.path.number(filled, "wealth"))
                .isCloseTo((CAPITAL + interest) / (1 + COST_ONE_WAY), within(1e-12 * CAPITAL));
        assertThat(interest).isPositive();
        assertThat(one.path.texts("wealth")).isEqualTo(one.path.texts("buy_and_hold.wealth"));
    }

    /** The files of one variant, and the closes of its price files by the dates of its path. */
    private static final class Written {
        private final WrittenTable path;
        private final WrittenTable trades;
        private final WrittenTable ledger;

        Written(String variant) {
            path = job.table("identities/" + variant + "/path.csv");
            trades = job.table("identities/" + variant + "/trades.csv");
            ledger = job.table("identities/" + variant + "/ledger.csv");
        }

        List<String> assets() {
            return path.header().contains("units.bonds") ? List.of("stocks", "bonds") : List.of("stocks");
        }

        String date(int row) {
            return path.text(row, "date");
        }

        double units(int row, String asset) {
            return path.number(row, "units." + asset);
        }

        double close(int row, String asset) {
            WrittenTable prices = asset.equals("stocks") ? STOCKS : BONDS;
            return prices.number(prices.size() - path.size() + row, "close"); // both end on the same day
        }

        double boughtUpTo(int row, String asset) {
            double units = 0;
            for (int i = 0; i < trades.size(); i++) {
                boolean counts = trades.text(i, "asset").equals(asset)
                        && trades.text(i, "filled_on").compareTo(date(row)) <= 0;
                units += counts ? trades.number(i, "units") : 0;
            }
            return units;
        }

        private static final WrittenTable STOCKS = WrittenTable.read(job.path("stocks.csv"));
        private static final WrittenTable BONDS = WrittenTable.read(job.path("bonds.csv"));
    }
}
