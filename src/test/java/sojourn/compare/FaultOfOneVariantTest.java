package sojourn.compare;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.List;
import java.util.concurrent.atomic.AtomicBoolean;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import sojourn.archive.ResultFolder;
import sojourn.archive.RunFacts;
import sojourn.document.Problems;
import sojourn.strategy.StrategyFile;
import sojourn.strategy.StrategyReader;

/** A fault of the program in the middle of one walk: planted in the listener that every walk tells its bars to. */
class FaultOfOneVariantTest {
    private static final String PLANTED = "planted fault";

    @TempDir
    private Path folder;

    /** Throws at the first report of bars and is silent afterwards: with one thread, the first timeline breaks. */
    private static final class BreaksOnce implements Progress {
        private final AtomicBoolean broken = new AtomicBoolean();

        @Override
        public void begin(String stage, long steps) {}

        @Override
        public void advance(long steps) {
            if (broken.compareAndSet(false, true)) {
                throw new IllegalStateException(PLANTED);
            }
        }

        @Override
        public void end() {}
    }

    @Test
    void costsItsOwnRowAndLeavesTheOthersAndTheirFilesWhole() throws IOException {
        prices();
        StrategyFile unlucky = strategy("Unlucky", 60);
        StrategyFile sound = strategy("Sound", 70);
        Compared alone = run(List.of(sound), Progress.silent());
        Compared both = run(List.of(unlucky, sound), new BreaksOnce());
        assertThat(both.faults())
                .singleElement()
                .satisfies(fault -> assertThat(fault).hasMessage(PLANTED));
        assertThat(both.failed()).singleElement().satisfies(failed -> {
            assertThat(failed.file().slug()).isEqualTo("unlucky");
            assertThat(failed.reason()).contains("a fault of the program").contains(PLANTED);
        });
        assertThat(both.ranked()).hasSize(1);
        assertThat(both.ranked().get(0).run().digest())
                .isEqualTo(alone.ranked().get(0).run().digest());
        RunFacts facts = new RunFacts(List.of("compare"), "here", 1, "2001-01-01T00:00:00Z", 0);
        ResultFolder.Published published =
                ResultWriter.write(folder.resolve("results"), "both", both, facts, WhichPaths.all());
        assertThat(published.folder().resolve("sound/path.csv")).isRegularFile();
        assertThat(published.folder().resolve("unlucky")).doesNotExist();
        assertThat(Files.readString(published.folder().resolve("comparison.csv")))
                .contains(PLANTED);
    }

    private static Compared run(List<StrategyFile> files, Progress progress) {
        try (LocalWorkers workers = new LocalWorkers(1)) {
            return new Comparison(workers, progress).run(files);
        }
    }

    private void prices() throws IOException {
        StringBuilder csv = new StringBuilder("date,close\n");
        for (int bar = 0; bar < 200; bar++) {
            csv.append(LocalDate.of(2001, 1, 1).plusDays(bar))
                    .append(',')
                    .append(100 + (bar * 7) % 11)
                    .append('\n');
        }
        Files.writeString(folder.resolve("stocks.csv"), csv);
    }

    private StrategyFile strategy(String name, int firstFitAfter) {
        String text = """
                strategy: %s
                prices: {stocks: {csv: stocks.csv}}
                regimes: {model: one-regime, observe: [{log-return: stocks}], states: [all]}
                refit: {first-fit-after: %d, every: 50, seed: 1}
                allocate: {table: {weights: {all: {stocks: 0.5}}}}
                judge: {buy-and-hold: {stocks: 1}}
                """.formatted(name, firstFitAfter);
        Problems problems = new Problems();
        StrategyFile file =
                StrategyReader.parse(text, folder, name + ".yaml", problems).orElseThrow();
        assertThat(problems.list()).isEmpty();
        return file;
    }
}
