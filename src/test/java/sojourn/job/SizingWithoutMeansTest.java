package sojourn.job;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.time.LocalDate;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A rule that weighs means, on regimes that have none: it runs, and everybody is told that it holds nothing. */
class SizingWithoutMeansTest {
    @TempDir
    private Path temp;

    private static StrategyText sizing(String emission) {
        return StrategyText.named("sizing")
                .with(
                        "regimes",
                        "{observe: [{log-return: stocks}], states: [calm, stormy], emission: " + emission + "}")
                .with("allocate", "{mean-variance: {among: [stocks], risk-aversion: 3}}");
    }

    @Test
    void checkAndCompareWarnThatNothingWillBeHeld() {
        JobFolder job = new JobFolder(temp)
                .with("stocks.csv", DrawnPrices.csv(3, 400, LocalDate.of(2010, 1, 4)))
                .with("without.yaml", sizing("normal-zero-mean"))
                .with("with.yaml", sizing("normal"));
        JobFolder.Ran ran = job.compare("without", "without.yaml");
        assertThat(ran.code()).as(ran.err()).isZero();
        assertThat(job.record("without").get("warnings").toString()).contains("the rule will hold nothing");
        job.compare("with", "with.yaml");
        assertThat(job.record("with").get("warnings").toString()).doesNotContain("hold nothing");
        assertThat(JobFolder.shell("check", job.path("without.yaml").toString()).out())
                .contains("the rule will hold nothing");
    }
}
