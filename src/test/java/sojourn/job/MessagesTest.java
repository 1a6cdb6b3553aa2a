package sojourn.job;

import static org.assertj.core.api.Assertions.assertThat;

import com.fasterxml.jackson.databind.JsonNode;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDate;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** What the shell says to wrong command lines, and its answer for machines. */
class MessagesTest {
    @TempDir
    Path temp;

    @Test
    void anUnknownCommandNamesTheNearest() {
        JobFolder.Ran ran = JobFolder.shell("comparr", "x");
        assertThat(ran.code()).isEqualTo(2);
        assertThat(ran.err())
                .contains("comparr")
                .contains("Did you mean 'compare'?")
                .contains("--help");
        assertThat(ran.out()).isEmpty();
    }

    @Test
    void anUnknownOptionIsNamed() {
        JobFolder.Ran ran = JobFolder.shell("compare", "--resluts", "x", "y.yaml");
        assertThat(ran.code()).isEqualTo(2);
        assertThat(ran.err()).contains("--resluts").contains("sojourn compare --help");
    }

    @Test
    void noCommandListsTheKnownOnes() {
        JobFolder.Ran ran = JobFolder.shell();
        assertThat(ran.code()).isEqualTo(2);
        assertThat(ran.err()).contains("compare").contains("check");
    }

    @Test
    void compareWithoutFilesAsksForThem() {
        JobFolder.Ran ran = JobFolder.shell("compare");
        assertThat(ran.code()).isEqualTo(2);
        assertThat(ran.err()).contains("FILES-OR-FOLDERS");
    }

    @Test
    void threadsOutOfRangeAreRefused() {
        JobFolder.Ran ran = JobFolder.shell("compare", "--threads", "-1", "y.yaml");
        assertThat(ran.code()).isEqualTo(2);
        assertThat(ran.err()).contains("--threads").contains("0 to 1024");
    }

    @Test
    void aNameThatIsAPathIsRefused() {
        JobFolder.Ran ran = JobFolder.shell("compare", "--name", "../up", "y.yaml");
        assertThat(ran.code()).isEqualTo(2);
        assertThat(ran.err()).contains("../up");
    }

    @Test
    void aFolderWithoutStrategiesAndAFileThatIsNotThereAreToldTogether() throws IOException {
        Path empty = Files.createDirectory(temp.resolve("empty"));
        Path none = temp.resolve("none.yaml");
        JobFolder.Ran ran = JobFolder.shell("compare", empty.toString(), none.toString());
        assertThat(ran.code()).isEqualTo(2);
        assertThat(ran.err()).contains(empty + ": ").contains("holds no .yaml file");
        assertThat(ran.err()).contains(none + ": ");
        assertThat(ran.out()).isEmpty();
    }

    @Test
    void twoStrategiesOfOneNameAreRefusedBeforeAnythingRuns() {
        JobFolder job = new JobFolder(temp)
                .with("a.yaml", StrategyText.named("Twice, really"))
                .with("b.yaml", StrategyText.named("twice really"))
                .with("c.yaml", StrategyText.named("Timelines"));
        JobFolder.Ran ran = job.compare("twice", "a.yaml", "b.yaml", "c.yaml");
        assertThat(ran.code()).isEqualTo(2);
        assertThat(ran.err()).contains("b.yaml: ").contains("a.yaml").contains("twice-really");
        assertThat(ran.err()).contains("c.yaml: ").contains("'timelines'");
        assertThat(Files.exists(job.path("results"))).isFalse();
    }

    @Test
    void differentMeasuresToRankByAreRefused() {
        JobFolder job = new JobFolder(temp)
                .with("a.yaml", StrategyText.named("A"))
                .with("b.yaml", StrategyText.named("B").with("judge", "{buy-and-hold: {stocks: 1}, rank-by: calmar}"));
        JobFolder.Ran ran = job.compare("ranks", "a.yaml", "b.yaml");
        assertThat(ran.code()).isEqualTo(2);
        assertThat(ran.err()).contains("calmar").contains("sharpe").contains("judge.rank-by");
    }

    @Test
    void theAnswerForMachinesHoldsTheNumbersOfTheTable() {
        JobFolder job = new JobFolder(temp)
                .with("stocks.csv", DrawnPrices.csv(91, 420, LocalDate.of(2003, 1, 1)))
                .with("a.yaml", StrategyText.alwaysFull("A"))
                .with("gone.yaml", StrategyText.named("Gone").with("prices", "{stocks: {csv: nowhere.csv}}"));
        JobFolder.Ran ran = JobFolder.shell(
                "compare",
                "--json",
                "--quiet",
                "--results",
                job.path("results").toString(),
                "--name",
                "json",
                job.path("a.yaml").toString(),
                job.path("gone.yaml").toString());
        assertThat(ran.code()).as(ran.err()).isZero();
        assertThat(ran.err()).isEmpty();
        JsonNode answer = JobFolder.parsed(ran.out());
        assertThat(answer.get("digest")).isEqualTo(job.record("json").get("digest"));
        WrittenTable table = job.table("json/comparison.csv");
        assertThat(answer.get("rows").size()).isEqualTo(table.size());
        for (int row = 0; row < table.size(); row++) {
            JsonNode node = answer.get("rows").get(row);
            for (String column : table.header()) {
                String cell = table.text(row, column);
                if (!node.has(column) || node.get(column).isNull()) {
                    assertThat(cell.isEmpty() || column.startsWith("drawdown_"))
                            .as(column + " of row " + row + " is '" + cell + "'")
                            .isTrue();
                } else if (node.get(column).isNumber()) {
                    assertThat(node.get(column).doubleValue()).as(column).isEqualTo(table.number(row, column));
                } else {
                    assertThat(node.get(column).asText()).as(column).isEqualTo(cell);
                }
            }
        }
    }
}
