package sojourn.job;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import sojourn.cli.Shell;

/** Misuse is told before any work is done, and prints no table wider than a terminal. */
class FaultsTest {
    @TempDir
    private Path folder;

    private final StringWriter out = new StringWriter();
    private final StringWriter err = new StringWriter();

    private int run(String... args) {
        return Shell.unwatched(new PrintWriter(out, true), new PrintWriter(err, true))
                .run(args);
    }

    @Test
    void aFileInThePlaceOfResultsIsRefusedBeforeTheRun() throws Exception {
        Path file = Files.writeString(folder.resolve("afile"), "mine");
        assertThat(run("compare", "strategies/step-aside-in-storms.yaml", "--results", file.toString()))
                .isEqualTo(2);
        assertThat(err.toString()).contains("is a file, results need a folder");
        assertThat(out.toString()).isEmpty();
        assertThat(file).hasContent("mine");
    }

    @Test
    void anEmptyNameIsNotTheCurrentFolder() {
        assertThat(run("compare", "")).isEqualTo(2);
        assertThat(err.toString()).contains("an empty name");
    }

    @Test
    void whichPathsIsOneOfThreeWords() {
        for (String wrong : List.of("best", "best:0", "some")) {
            assertThat(run("compare", "strategies", "--paths", wrong)).isEqualTo(2);
        }
        assertThat(err.toString()).contains("'best:0' is none of all, best:N (N from 1), none");
    }

    @Test
    void everyCommandTakesTheCommonOptionsItCanUse() {
        assertThat(run("check", "strategies/steady-mix.yaml", "--json", "--quiet", "--threads", "1"))
                .isZero();
        assertThat(out.toString()).contains("\"fit_dates\"");
    }

    @Test
    void noLineOfAPlanIsWiderThanATerminal() {
        assertThat(run("check", "strategies")).isZero();
        assertThat(out.toString().lines()).allMatch(line -> line.length() <= 100);
    }
}
