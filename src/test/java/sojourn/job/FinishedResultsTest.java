package sojourn.job;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.time.LocalDate;
import java.util.Map;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A finished result is never overwritten. */
class FinishedResultsTest {
    @TempDir
    Path temp;

    private JobFolder job = new JobFolder(Path.of(""));

    @BeforeEach
    void writePrices() {
        job = new JobFolder(temp)
                .with("stocks.csv", DrawnPrices.csv(61, 220, LocalDate.of(2003, 1, 1)))
                .with("one.yaml", full("One"))
                .with("two.yaml", full("Two"));
    }

    private static StrategyText full(String name) {
        return StrategyText.alwaysFull(name).with("refit", "{first-fit-after: 100, every: 100, starts: 1, seed: 7}");
    }

    @Test
    void theSameContentIsLeftAlone() {
        job.compare("mine", "one.yaml");
        Map<String, String> first = job.files("results");
        JobFolder.Ran again = job.compare("mine", "one.yaml");
        assertThat(again.code()).isZero();
        assertThat(again.err()).contains("left alone");
        assertThat(job.files("results")).isEqualTo(first);
    }

    @Test
    void otherContentUnderTheSameNameGetsItsDigestBehindTheName() {
        job.compare("mine", "one.yaml");
        Map<String, String> first = job.files("results/mine");
        assertThat(job.compare("mine", "two.yaml").code()).isZero();
        assertThat(job.files("results/mine")).isEqualTo(first);
        assertThat(job.names("results")).hasSize(2);
        String other = job.names("results").get(1);
        assertThat(other)
                .isEqualTo("mine-" + job.record(other).get("digest").asText().substring(0, 8));
        assertThat(job.compare("mine", "two.yaml").err()).contains(other).contains("left alone");
        assertThat(job.names("results")).hasSize(2);
    }

    @Test
    void aFolderWithoutARecordIsNotTakenForAResultAndNotTouched() {
        job.with("results/mine/notes.txt", "by hand");
        assertThat(job.compare("mine", "one.yaml").code()).isZero();
        assertThat(job.files("results/mine")).isEqualTo(Map.of("notes.txt", "by hand"));
        assertThat(job.names("results")).hasSize(2).anyMatch(name -> name.matches("mine-[0-9a-f]{8}"));
    }

    @Test
    void aFileOfTheResultsNameIsNotTouchedEither() {
        job.with("results/mine", "a file");
        assertThat(job.compare("mine", "one.yaml").code()).isZero();
        assertThat(job.text("results/mine")).isEqualTo("a file");
        assertThat(job.names("results")).hasSize(2);
    }

    @Test
    void ifBothNamesAreTakenNothingIsWrittenAndAnotherNameIsAskedFor() {
        job.compare("probe", "one.yaml");
        String digest = job.record("probe").get("digest").asText();
        String taken = "mine-" + digest.substring(0, 8);
        job.with("results/mine/notes.txt", "by hand").with("results/" + taken + "/notes.txt", "by hand");
        JobFolder.Ran ran = job.compare("mine", "one.yaml");
        assertThat(ran.code()).isEqualTo(2);
        assertThat(ran.err()).contains("mine").contains("--name");
        assertThat(job.names("results")).containsExactly("mine", taken, "probe");
    }

    @Test
    void aResultsFolderThatCannotBeMadeIsTheUsersInput() {
        job.with("results", "a file where a folder is expected");
        JobFolder.Ran ran = job.compare("mine", "one.yaml");
        assertThat(ran.code()).isEqualTo(2);
        assertThat(ran.err())
                .contains(job.path("results").toString() + ": is a file, results need a folder")
                .doesNotContain("\tat ");
        assertThat(job.text("results")).isEqualTo("a file where a folder is expected");
    }

    @Test
    void nothingHalfWrittenIsLeftBehind() {
        job.compare("mine", "one.yaml");
        assertThat(job.names("results")).containsExactly("mine");
        assertThat(job.names("results/mine")).containsExactly("comparison.csv", "one", "record.json", "timelines");
        assertThat(job.names("results/mine/one"))
                .containsExactly(
                        "ledger.csv", "measures.json", "path.csv", "strategy.yaml", "trades.csv", "yardsticks.csv");
    }
}
