package sojourn;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.function.BiFunction;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import sojourn.PrefixCheck.Row;
import sojourn.PrefixCheck.Rows;
import sojourn.allocate.Decision;
import sojourn.allocate.Policy;
import sojourn.allocate.RulePolicy;
import sojourn.allocate.Weights;
import sojourn.latest.Asked;
import sojourn.latest.Standing;
import sojourn.market.AnotherEnd;
import sojourn.market.FillPrices;
import sojourn.market.PriceTable;
import sojourn.strategy.Strategy;
import sojourn.walk.RegimeTimeline;

/** What is said of an evening is the same whether or not later prices exist, and a policy that peeks is caught. */
class LatestLookAheadTest {
    private static final PriceHistory STOCKS = PriceHistory.stocks();
    private static final int ROWS = 420;
    private static final int FROM = 290;
    private static final int[] CUTS = {300, 301, 302, 340, 351, 352, 401, ROWS - 1};
    private static final String STRATEGY = """
            strategy: Step aside
            prices: {stocks: {csv: stocks.csv}}
            cash: {percent-per-year: 4}
            regimes: {observe: [{log-return: stocks}], states: [calm, stormy]}
            refit: {first-fit-after: 300, every: 50, starts: 2, seed: 7}
            allocate: {switch: {regime: stormy, leave-above: 0.6, re-enter-below: 0.4, in: {stocks: 1}, out: {stocks: 0}}}
            judge: {against: [buy-and-hold], buy-and-hold: {stocks: 1}, rank-by: sharpe}
            """;

    @TempDir
    private Path folder;

    @Test
    void anEveningSaysTheSameWhateverComesAfterIt() {
        PrefixCheck check = PrefixCheck.of(rows -> evenings(rows, (table, honest) -> honest), ROWS);
        assertThat(check.whole().rows()).hasSizeGreaterThan(100);
        assertThat(check.differences(CUTS)).isEmpty();
    }

    @Test
    void aPolicyThatKnowsTheNextCloseIsCaught() {
        PrefixCheck check = PrefixCheck.of(rows -> evenings(rows, (table, honest) -> peeking(table, honest)), ROWS);
        assertThat(check.differences(CUTS)).isNotEmpty();
    }

    /** Out before a fall, which only someone with the whole table can know. */
    private static Policy peeking(PriceTable table, Policy honest) {
        FillPrices prices = table.fillPrices();
        return (situation, stance) -> {
            Decision decision = honest.at(situation, stance);
            int next = Math.min(situation.bar() + 1, table.size() - 1);
            boolean falls = prices.close(0, next) < prices.close(0, situation.bar());
            return decision.target().isPresent() && falls
                    ? Decision.order(Weights.none(1), decision.next(), decision.because(), decision.change())
                    : decision;
        };
    }

    /** One row an evening: what stands after the table is cut there, by the timeline of all of it. */
    private Rows evenings(int rows, BiFunction<PriceTable, Policy, Policy> policy) {
        STOCKS.write(folder.resolve("stocks.csv"), rows);
        WholeJob job = WholeJob.of(STRATEGY, folder);
        PriceTable table = job.read().table();
        RegimeTimeline timeline = job.walk(job.read());
        Policy asked = policy.apply(table, honest(job.strategy(), table));
        List<Row> said = new ArrayList<>();
        for (int bars = FROM; bars <= table.size(); bars++) {
            Standing standing = Standing.of(job.strategy(), asked, AnotherEnd.cut(table, bars), timeline);
            Asked last = standing.asked().orElseThrow();
            said.add(new Row(
                    "evening",
                    standing.asOf(),
                    List.of("kind", "target", "because", "held", "pending"),
                    List.of(
                            last.decision().kind().name(),
                            last.decision().target().toString(),
                            last.decision().because().sentence(),
                            last.situation().weights().toString(),
                            Integer.toString(standing.pending().size()))));
        }
        return new Rows(table.knownAt(table.size() - 1).date(), said);
    }

    private static Policy honest(Strategy strategy, PriceTable table) {
        return RulePolicy.of(
                strategy.rule(),
                strategy.limits(),
                strategy.trade().decide(),
                strategy.trade().stayAtLeast(),
                strategy.trade().noTradeBand(),
                strategy.regimes().states(),
                table.assets());
    }
}
