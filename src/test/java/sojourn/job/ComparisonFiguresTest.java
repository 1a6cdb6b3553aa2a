package sojourn.job;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.file.Path;
import java.time.LocalDate;
import java.time.temporal.ChronoUnit;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** The figures of {@code comparison.csv} and the yardsticks, worked out again from {@code path.csv} by their definitions. */
class ComparisonFiguresTest {
    private static final double AGREES = 1e-9;
    private static final double CAPITAL = 1_000_000;
    private static final double COST_ONE_WAY = 0.001;

    @TempDir
    static Path temp;

    private static JobFolder job = new JobFolder(Path.of(""));

    @BeforeAll
    static void compare() {
        job = new JobFolder(temp)
                .with("stocks.csv", DrawnPrices.csv(31, 700, LocalDate.of(2003, 1, 1)))
                .with("a.yaml", StrategyText.named("Early"))
                .with("b.yaml", StrategyText.named("Late").with("refit", "{first-fit-after: 320, every: 90, seed: 2}"))
                .with("c.yaml", StrategyText.alwaysFull("Full"));
        JobFolder.Ran ran = job.compare("figures", "a.yaml", "b.yaml", "c.yaml");
        assertThat(ran.code()).as(ran.err()).isZero();
    }

    @ParameterizedTest
    @ValueSource(strings = {"early", "late", "full"})
    void riskAndReturnFollowFromWealth(String variant) {
        Judged one = Judged.of(variant, "wealth");
        assertThat(one.figure("growth_per_year")).isCloseTo(one.growth(), within(AGREES));
        assertThat(one.figure("total_return")).isCloseTo(one.wealth[one.bars()] / one.wealth[0] - 1, within(AGREES));
        assertThat(one.figure("volatility_per_year"))
                .isCloseTo(Math.sqrt(252) * deviation(one.returns()), within(AGREES));
        double[] excess = one.returns();
        for (int i = 0; i < excess.length; i++) {
            excess[i] -= one.cash(i);
        }
        assertThat(one.figure("sharpe")).isCloseTo(Math.sqrt(252) * mean(excess) / deviation(excess), within(AGREES));
        assertThat(one.figure("sharpe_low")).isLessThan(one.figure("sharpe"));
        assertThat(one.figure("sharpe_high")).isGreaterThan(one.figure("sharpe"));
        assertThat(one.figure("worst_drawdown")).isCloseTo(one.worstDrawdown(), within(AGREES));
        assertThat(one.figure("growth_minus_buy_and_hold"))
                .isCloseTo(
                        one.growth() - Judged.of(variant, "buy_and_hold.wealth").growth(), within(AGREES));
    }

    @ParameterizedTest
    @ValueSource(strings = {"early", "late", "full"})
    void tradingFollowsFromTurnoverCostWeightsAndTargets(String variant) {
        Judged one = Judged.of(variant, "wealth");
        double turnover = 0;
        double cost = 0;
        double exposure = 0;
        int switches = 0;
        for (int i = 0; i < one.bars(); i++) {
            int row = one.base + 1 + i;
            turnover += one.path.number(row, "turnover");
            cost += one.path.number(row, "cost");
            exposure += one.path.number(row - 1, "weight.stocks");
            // without a step, a target of this rule moves exactly when its state does
            boolean moved = !one.path.text(row, "target.stocks").equals(one.path.text(row - 1, "target.stocks"));
            switches += moved ? 1 : 0;
        }
        assertThat(one.figure("turnover_per_year")).isCloseTo(252 * turnover / one.bars(), within(AGREES));
        assertThat(one.figure("cost_per_year")).isCloseTo(cost / mean(one.wealth) / one.years(), within(AGREES));
        assertThat(one.figure("average_exposure")).isCloseTo(exposure / one.bars(), within(AGREES));
        assertThat(one.figure("switches_per_year")).isCloseTo(switches / one.years(), within(AGREES));
    }

    @Test
    void aSwitchingVariantDoesSwitchInsideTheWindow() {
        assertThat(Judged.of("early", "wealth").figure("switches_per_year")).isPositive();
        assertThat(Judged.of("full", "wealth").figure("switches_per_year")).isZero();
    }

    @Test
    void buyAndHoldBuysOnceAtTheFirstFillAndPaysTheSameCosts() {
        WrittenTable path = job.table("figures/early/path.csv");
        double[] closes = closesOf(path);
        double afterOneBar = CAPITAL * (1 + cashReturn(path, 1));
        double units = afterOneBar / (1 + COST_ONE_WAY) / closes[1];
        for (int row = 1; row < path.size(); row++) {
            assertThat(path.number(row, "buy_and_hold.wealth"))
                    .isCloseTo(units * closes[row], within(AGREES * CAPITAL));
        }
    }

    @Test
    void sameExposureFreeEarnsTheMeanWeightsShareOfEachReturnAndCashForTheRest() {
        Judged one = Judged.of("early", "wealth");
        WrittenTable yardsticks = job.table("figures/early/yardsticks.csv");
        double[] closes = closesOf(one.path);
        double weight = one.figure("average_exposure");
        for (int row = one.base + 1; row < one.path.size(); row++) {
            double before = yardsticks.number(row - 1, "after_the_fact.same_exposure_free.wealth");
            double after = yardsticks.number(row, "after_the_fact.same_exposure_free.wealth");
            double earned = weight * (closes[row] / closes[row - 1] - 1) + (1 - weight) * cashReturn(one.path, row);
            assertThat(after / before - 1).isCloseTo(earned, within(AGREES));
        }
    }

    @Test
    void sameExposureWithCostsRebalancesAtEveryClose() {
        Judged one = Judged.of("early", "wealth");
        double[] targets = new double[one.path.size()];
        Arrays.fill(targets, one.figure("average_exposure"));
        double[] wealth = rebalanced(one.path, targets);
        WrittenTable yardsticks = job.table("figures/early/yardsticks.csv");
        for (int row = 0; row < wealth.length; row++) {
            assertThat(yardsticks.number(row, "after_the_fact.same_exposure.wealth"))
                    .isCloseTo(wealth[row], within(AGREES * CAPITAL));
        }
    }

    @Test
    void sameExposureSoFarHoldsTheMeanOfTheWeightsUpToEachClose() {
        WrittenTable path = job.table("figures/early/path.csv");
        double[] targets = new double[path.size()];
        double sum = 0;
        for (int row = 1; row < targets.length; row++) { // the first fill is on row 1
            sum += path.number(row, "weight.stocks");
            targets[row] = sum / row;
        }
        double[] wealth = rebalanced(path, targets);
        for (int row = 0; row < wealth.length; row++) {
            assertThat(path.number(row, "same_exposure_so_far.wealth"))
                    .isCloseTo(wealth[row], within(AGREES * CAPITAL));
        }
    }

    @Test
    void yardsticksAreRowsWithTheirKnowledgeAndTheWindowOfTheirVariant() {
        WrittenTable table = job.table("figures/comparison.csv");
        String buyAndHold = table.texts("variant").stream()
                .filter(name -> name.startsWith("buy_and_hold"))
                .findFirst()
                .orElseThrow();
        List<String> kinds = new ArrayList<>();
        for (String name : List.of(
                buyAndHold, "same_exposure_so_far of early", "same_exposure of early", "same_exposure_free of early")) {
            int row = table.row("variant", name);
            kinds.add(table.text(row, "kind"));
            assertThat(table.text(row, "from")).isEqualTo(table.text(table.row("variant", "early"), "from"));
        }
        assertThat(kinds)
                .containsExactly("yardstick", "yardstick", "yardstick-after-the-fact", "yardstick-after-the-fact");
        assertThat(table.number(table.row("variant", buyAndHold), "growth_per_year"))
                .isCloseTo(Judged.of("early", "buy_and_hold.wealth").growth(), within(AGREES));
        assertThat(table.number(table.row("variant", "same_exposure_free of early"), "cost_per_year"))
                .isZero();
    }

    @Test
    void variantsStandInTheOrderOfTheDeclaredMeasure() {
        WrittenTable table = job.table("figures/comparison.csv");
        double[] sharpe = new double[3];
        for (int row = 0; row < 3; row++) {
            assertThat(table.text(row, "kind")).isEqualTo("strategy");
            sharpe[row] = table.number(row, "sharpe");
        }
        assertThat(sharpe[0]).isGreaterThanOrEqualTo(sharpe[1]);
        assertThat(sharpe[1]).isGreaterThanOrEqualTo(sharpe[2]);
    }

    /**
     * Wealth of one asset brought back at every close to the target of the close before, at the cost one way: bought
     * V+ = (V + c h) / (1 + c w), sold V+ = (V - c h) / (1 - c w), h the value held before.
     */
    private static double[] rebalanced(WrittenTable path, double[] targets) {
        double[] closes = closesOf(path);
        double[] wealth = new double[closes.length];
        wealth[0] = CAPITAL;
        double held = 0;
        for (int row = 1; row < closes.length; row++) {
            double cash = (wealth[row - 1] - held) * (1 + cashReturn(path, row));
            double value = held * closes[row] / closes[row - 1];
            double total = cash + value;
            double weight = targets[row - 1];
            boolean buys = weight * total > value;
            wealth[row] = buys
                    ? (total + COST_ONE_WAY * value) / (1 + COST_ONE_WAY * weight)
                    : (total - COST_ONE_WAY * value) / (1 - COST_ONE_WAY * weight);
            held = weight * wealth[row];
        }
        return wealth;
    }

    private static double[] closesOf(WrittenTable path) {
        WrittenTable prices = WrittenTable.read(job.path("stocks.csv"));
        double[] closes = new double[path.size()];
        for (int row = 0; row < closes.length; row++) {
            closes[row] = prices.number(prices.row("date", path.text(row, "date")), "close");
        }
        return closes;
    }

    private static double cashReturn(WrittenTable path, int row) {
        LocalDate before = LocalDate.parse(path.text(row - 1, "date"));
        return 0.02 * ChronoUnit.DAYS.between(before, LocalDate.parse(path.text(row, "date"))) / 365;
    }

    private static double mean(double[] values) {
        double sum = 0;
        for (double value : values) {
            sum += value;
        }
        return sum / values.length;
    }

    private static double deviation(double[] values) {
        double mean = mean(values);
        double squares = 0;
        for (double value : values) {
            squares += (value - mean) * (value - mean);
        }
        return Math.sqrt(squares / (values.length - 1));
    }

    /** One column of wealth over the window that the comparison states for a variant. */
    private static final class Judged {
        private final String variant;
        private final WrittenTable path;
        private final int base;
        private final double[] wealth;

        private Judged(String variant, WrittenTable path, int base, double[] wealth) {
            this.variant = variant;
            this.path = path;
            this.base = base;
            this.wealth = wealth;
        }

        static Judged of(String variant, String column) {
            WrittenTable path = job.table("figures/" + variant + "/path.csv");
            WrittenTable table = job.table("figures/comparison.csv");
            int row = table.row("variant", variant);
            int base = path.row("date", table.text(row, "from"));
            int last = path.row("date", table.text(row, "to"));
            assertThat(table.text(row, "bars")).isEqualTo(Integer.toString(last - base));
            double[] wealth = new double[last - base + 1];
            for (int i = 0; i < wealth.length; i++) {
                wealth[i] = path.number(base + i, column);
            }
            return new Judged(variant, path, base, wealth);
        }

        int bars() {
            return wealth.length - 1;
        }

        double figure(String column) {
            WrittenTable table = job.table("figures/comparison.csv");
            return table.number(table.row("variant", variant), column);
        }

        double[] returns() {
            double[] returns = new double[bars()];
            for (int i = 0; i < returns.length; i++) {
                returns[i] = wealth[i + 1] / wealth[i] - 1;
            }
            return returns;
        }

        double cash(int i) {
            return cashReturn(path, base + 1 + i);
        }

        double years() {
            LocalDate from = LocalDate.parse(path.text(base, "date"));
            LocalDate to = LocalDate.parse(path.text(base + bars(), "date"));
            return ChronoUnit.DAYS.between(from, to) / 365.25;
        }

        double growth() {
            return StrictMath.pow(wealth[bars()] / wealth[0], 1 / years()) - 1;
        }

        double worstDrawdown() {
            double worst = 0;
            for (int t = 0; t < wealth.length; t++) {
                for (int s = 0; s <= t; s++) {
                    worst = Math.min(worst, wealth[t] / wealth[s] - 1);
                }
            }
            return worst;
        }
    }
}
