package sojourn.job;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.time.LocalDate;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Gauges on prices that say nothing: each costs its own row a reason in plain words, and no file holds what is no number. */
class OddGaugesTest {
    private static final Map<String, String> GAUGES = Map.of(
            "threshold",
            "{model: volatility-threshold, observe: [{log-return: stocks}], states: [calm, stormy],"
                    + " threshold: {volatility: {rolling: 10}, storm-above: 0.8}}",
            "jump",
            "{model: jump, observe: [{absolute-return: stocks}], states: [calm, stormy], penalty: 5}",
            "choose",
            "{observe: [{log-return: stocks}], states: [all, calm, stormy],"
                    + " choose: {states: [[all], [calm, stormy]], by: predictive}}");

    private static final String REFIT = "{first-fit-after: 60, every: 40, starts: 2, seed: 1}";

    @TempDir
    private Path temp;

    @Test
    void constantPricesFailEveryGaugeWithItsReason() {
        JobFolder job = job(bar -> "100");
        JobFolder.Ran ran = job.compare("odd", "plans");
        assertThat(ran.code()).as(ran.err()).isZero();
        String table = job.text("results/odd/comparison.csv");
        assertThat(table)
                .contains("the volatility is the same throughout the window")
                .contains("all observations of the window are equal")
                .contains("no number of regimes was accepted; 1: all observations of the window are equal; 2: all");
        assertNoStrangeNumbers(job);
    }

    @Test
    void oneMoveOfFiftyDeviationsBreaksNoGauge() {
        JobFolder job = job(bar -> bar == 100 ? "160" : Integer.toString(100 + bar * 7 % 3));
        JobFolder.Ran ran = job.compare("odd", "plans");
        assertThat(ran.code()).as(ran.err()).isZero();
        assertThat(job.text("results/odd/comparison.csv"))
                .contains("stormy accounts for")
                .contains("observations, fewer than the 5 it needs");
        assertNoStrangeNumbers(job);
    }

    private interface Close {
        String at(int bar);
    }

    private JobFolder job(Close close) {
        StringBuilder csv = new StringBuilder("date,close\n");
        for (int bar = 0; bar < 200; bar++) {
            csv.append(LocalDate.of(2001, 1, 1).plusDays(bar))
                    .append(',')
                    .append(close.at(bar))
                    .append('\n');
        }
        JobFolder job = new JobFolder(temp)
                .with("data/stocks.csv", csv.toString())
                .with("data/sound.csv", DrawnPrices.csv(5, 200, LocalDate.of(2001, 1, 1)))
                .with(
                        "plans/sound.yaml",
                        StrategyText.alwaysFull("sound")
                                .with("prices", "{stocks: {csv: ../data/sound.csv}}")
                                .with("refit", REFIT));
        for (String name : List.of("choose", "jump", "threshold")) {
            job.with(
                    "plans/" + name + ".yaml",
                    StrategyText.named(name)
                            .with("prices", "{stocks: {csv: ../data/stocks.csv}}")
                            .with("regimes", GAUGES.getOrDefault(name, ""))
                            .with("refit", REFIT));
        }
        return job;
    }

    private static void assertNoStrangeNumbers(JobFolder job) {
        Map<String, String> files = job.files("results/odd");
        assertThat(files).hasSizeGreaterThan(3);
        files.forEach((name, text) -> assertThat(text).as(name).doesNotContain("NaN", "Infinity"));
    }
}
