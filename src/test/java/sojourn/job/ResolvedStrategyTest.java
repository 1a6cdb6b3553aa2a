package sojourn.job;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.time.LocalDate;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The strategy file that stands in a result runs on its own and comes to the same. */
class ResolvedStrategyTest {
    @TempDir
    Path temp;

    @Test
    void eachWrittenStrategyRunsOnItsOwnToTheSameDigest() {
        JobFolder job = new JobFolder(temp)
                .with("data/stocks.csv", DrawnPrices.csv(81, 330, LocalDate.of(2003, 1, 1)))
                .with("data/bonds.csv", DrawnPrices.csv(82, 330, LocalDate.of(2003, 1, 1)))
                .with("data/bills.csv", "date,rate\n2003-01-01,3.5\n" + rates())
                .with(
                        "plans/plain.yaml",
                        StrategyText.named("'Plain: \"yes\", #1e3'")
                                .with("prices", stocks())
                                .with("refit", refit()))
                .with(
                        "plans/rich.yaml",
                        StrategyText.named("Rich")
                                .with(
                                        "prices",
                                        "{stocks: {csv: ../data/stocks.csv}, bonds: {csv: ../data/bonds.csv},"
                                                + " spare: {csv: ../data/bonds.csv}}")
                                .with("cash", "{csv: ../data/bills.csv, column: rate, day-count: actual/360}")
                                .with("refit", refit())
                                .with("allocate", "{blend: {weights: {calm: {stocks: 1.0}, stormy: {bonds: 0.5}}}}")
                                .with("trade", "{decide: first-of-week, delay: 1, no-trade-band: 0.01}")
                                .with(
                                        "judge",
                                        "{buy-and-hold: {stocks: 0.6, bonds: 0.4}, against: [same-exposure],"
                                                + " rank-by: sharpe, window: {from: 2003-10-01}}"))
                .with(
                        "plans/fixed.yaml",
                        StrategyText.named("Declared")
                                .with("prices", stocks())
                                .with("refit", refit())
                                .with(
                                        "regimes",
                                        "{observe: [{log-return: stocks}], states: [calm, stormy], parameters: {fixed:"
                                                + " {initial: [0.5, 0.5], transition: [[0.98, 0.02], [0.05, 0.95]],"
                                                + " mean: [0.0005, -0.001], sd: [0.006, 0.02]}}}"));
        JobFolder.Ran ran = job.compare("whole", "plans");
        assertThat(ran.code()).as(ran.err()).isZero();
        Map<String, String> digests = job.digests("whole");
        assertThat(digests).hasSize(3);
        for (String variant : List.copyOf(digests.keySet())) {
            String written = "results/whole/" + variant + "/strategy.yaml";
            JobFolder.Ran alone = job.compare("alone-" + variant, written);
            assertThat(alone.code()).as(alone.err()).isZero();
            assertThat(job.digests("alone-" + variant)).isEqualTo(Map.of(variant, digests.get(variant)));
            assertThat(job.text("results/alone-" + variant + "/" + variant + "/strategy.yaml"))
                    .isEqualTo(job.text(written));
        }
    }

    @Test
    void anAssetThatNothingUsesDoesNotTieTheDigestToAPlace() {
        StrategyText spare = StrategyText.alwaysFull("Spare")
                .with("prices", "{stocks: {csv: a/stocks.csv}, spare: {csv: a/bonds.csv}}");
        JobFolder job = new JobFolder(temp)
                .with("a/stocks.csv", DrawnPrices.csv(83, 330, LocalDate.of(2003, 1, 1)))
                .with("a/bonds.csv", DrawnPrices.csv(84, 330, LocalDate.of(2003, 1, 1)))
                .with("spare.yaml", spare);
        job.with("b/stocks.csv", job.text("a/stocks.csv"))
                .with("b/bonds.csv", job.text("a/bonds.csv"))
                .with(
                        "other/spare.yaml",
                        spare.with("prices", "{stocks: {csv: ../b/stocks.csv}, spare: {csv: ../b/bonds.csv}}"));
        job.compare("here", "spare.yaml");
        job.compare("there", "other/spare.yaml");
        assertThat(job.digests("there")).isEqualTo(job.digests("here"));
    }

    private static String stocks() {
        return "{stocks: {csv: ../data/stocks.csv}}";
    }

    private static String refit() {
        return "{first-fit-after: 120, every: 90, starts: 1, seed: 5}";
    }

    private static String rates() {
        StringBuilder rows = new StringBuilder();
        LocalDate date = LocalDate.of(2003, 1, 8);
        for (int week = 0; week < 80; week++) {
            rows.append(date.plusWeeks(week))
                    .append(',')
                    .append(week % 2 == 0 ? "3.25" : "3.4")
                    .append('\n');
        }
        return rows.toString();
    }
}
