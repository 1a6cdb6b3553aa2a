package sojourn.strategy;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.net.URISyntaxException;
import java.net.URL;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import java.util.stream.Stream;
import sojourn.document.Problem;
import sojourn.document.Problems;

/** The strategy files of the tests, and one that is changed line by line. */
final class Samples {
    /** The folder that {@link #base} is read in. */
    static final Path FOLDER = Path.of("somewhere", "strategies").toAbsolutePath();

    private static final String BASE = """
            strategy: Step aside in storms
            prices:
              stocks: {csv: ../prices/stocks.csv}
              bonds: {csv: bonds.csv, close: total_return}
              gold: {csv: gold.csv}
            cash: {csv: ../prices/bills.csv, column: percent_per_year, day-count: actual/360}
            regimes:
              observe: [{log-return: stocks}]
              states: [calm, stormy]
            refit:
              first-fit-after: 1000
              every: 21
              starts: 5
              seed: 20260101
            allocate:
              switch:
                regime: stormy
                leave-above: 0.7
                re-enter-below: 0.3
                in: {stocks: 1}
                out: {stocks: 0, bonds: 0.5}
            trade:
              costs: {commission-bps: 5}
            judge:
              buy-and-hold: {stocks: 1}
            """;

    private Samples() {}

    /** The base file. */
    static StrategyFile base() {
        return parse(BASE);
    }

    /** The base file with {@code from}, which must be there, changed into {@code to}. */
    static StrategyFile with(String from, String to) {
        assertThat(BASE).contains(from);
        return parse(BASE.replace(from, to));
    }

    /** A text that must read without fault. */
    static StrategyFile parse(String text) {
        Problems problems = new Problems();
        Optional<StrategyFile> file = StrategyReader.parse(text, FOLDER, "sample.yaml", problems);
        assertThat(problems.list()).as(text).isEmpty();
        return file.orElseThrow();
    }

    /** A file that must read without fault. */
    static StrategyFile read(Path path) {
        Problems problems = new Problems();
        Optional<StrategyFile> file = StrategyReader.read(path, path.toString(), problems);
        assertThat(problems.list()).as(path.toString()).isEmpty();
        return file.orElseThrow();
    }

    /** What reading a file tells; never nothing but a value, or neither. */
    static List<String> messages(Path path) {
        Problems problems = new Problems();
        Optional<StrategyFile> file =
                StrategyReader.read(path, path.getFileName().toString(), problems);
        assertThat(file.isPresent()).as(path.toString()).isEqualTo(problems.isEmpty());
        return problems.list().stream().map(Problem::toString).toList();
    }

    /** The files with faults, in order. */
    static List<Path> broken() throws IOException {
        return yamlFiles(resources("broken"));
    }

    /** The good files of the tests and the examples. */
    static List<Path> good() throws IOException {
        return Stream.concat(yamlFiles(resources("good")).stream(), examples().stream())
                .toList();
    }

    /** The examples that come with the program. */
    static List<Path> examples() throws IOException {
        return yamlFiles(Path.of("strategies"));
    }

    private static Path resources(String folder) {
        URL url = Objects.requireNonNull(Samples.class.getResource("/strategies/" + folder));
        try {
            return Path.of(url.toURI());
        } catch (URISyntaxException e) {
            throw new AssertionError(e);
        }
    }

    private static List<Path> yamlFiles(Path folder) throws IOException {
        try (Stream<Path> files = Files.list(folder)) {
            return files.filter(file -> file.toString().endsWith(".yaml"))
                    .sorted()
                    .toList();
        }
    }
}
