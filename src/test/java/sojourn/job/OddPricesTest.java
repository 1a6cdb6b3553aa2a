package sojourn.job;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.Locale;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import sojourn.cli.Shell;

/** A price file of absurd numbers costs its own variant a row with a reason, never the batch. */
class OddPricesTest {
    @TempDir
    private Path folder;

    private final StringWriter out = new StringWriter();
    private final StringWriter err = new StringWriter();

    @BeforeEach
    void aSoundVariant() throws IOException {
        write("sound", bar -> 100 * (1 + 0.01 * ((bar * 7) % 5)) + 0.05 * bar);
    }

    private interface Close {
        double at(int bar);
    }

    private void write(String name, Close close) throws IOException {
        StringBuilder csv = new StringBuilder("date,close\n");
        LocalDate date = LocalDate.of(2001, 1, 1);
        for (int bar = 0; bar < 160; bar++) {
            csv.append(date.plusDays(bar))
                    .append(String.format(Locale.ROOT, ",%.10e", close.at(bar)))
                    .append('\n');
        }
        Files.writeString(folder.resolve(name + ".csv"), csv);
        Files.writeString(folder.resolve(name + ".yaml"), """
                strategy: %s
                prices: {stocks: {csv: %s.csv}}
                regimes: {observe: [{log-return: stocks}], states: [calm, stormy]}
                refit: {first-fit-after: 60, every: 40, starts: 1, seed: 1}
                allocate: {switch: {regime: stormy, leave-above: 0.7, re-enter-below: 0.3, in: {stocks: 1}, out: {stocks: 0}}}
                judge: {buy-and-hold: {stocks: 1}}
                """.formatted(name, name));
    }

    private int compare() {
        return Shell.unwatched(new PrintWriter(out, true), new PrintWriter(err, true))
                .run(
                        "compare",
                        folder.toString(),
                        "--results",
                        folder.resolve("results").toString(),
                        "--name",
                        "odd");
    }

    private String table() throws IOException {
        return Files.readString(folder.resolve("results/odd/comparison.csv"));
    }

    @Test
    void numbersBeyondAnyPriceAreRefusedAtTheDoor() throws IOException {
        write("overflow", bar -> bar == 80 ? 1e300 : 1e-300);
        write("leap", bar -> bar == 80 ? 1e300 : 100 + bar % 3);
        write("tiny", bar -> 1e-310 * (1 + bar % 3));
        assertThat(compare()).isZero();
        for (String name : new String[] {"overflow", "leap", "tiny"}) {
            assertThat(table()).containsPattern(name + ",strategy,,failed,\"?.*beyond any price");
        }
        assertThat(table()).contains("sound,strategy,").contains(",ran,").doesNotContain("NaN", "Infinity");
    }

    @Test
    void theWidestNumbersThatAreAllowedRunOrFailWithAReason() throws IOException {
        write("wide", bar -> bar % 40 == 39 ? 1e29 : 1e-29 * (1 + bar % 3));
        write("huge", bar -> 1e29 * (1 + 0.01 * ((bar * 11) % 7)));
        write("small", bar -> 1e-29 * (1 + 0.01 * ((bar * 11) % 7)));
        assertThat(compare()).isZero();
        assertThat(err.toString()).doesNotContain("fault of the program");
        assertThat(table()).contains("sound,strategy,").doesNotContain("NaN", "Infinity", "fault of the program");
    }
}
