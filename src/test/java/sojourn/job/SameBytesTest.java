package sojourn.job;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.TimeZone;
import java.util.TreeMap;
import java.util.stream.Stream;
import org.junit.jupiter.api.Assumptions;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Same inputs and seed, same bytes: whatever the threads, the place, the language, the time zone and the JDK. */
class SameBytesTest {
    private static final String[] STRATEGIES = {"chain.yaml", "mixture.yaml", "pair.yaml", "gone.yaml"};

    @TempDir
    static Path temp;

    private static JobFolder job = new JobFolder(Path.of(""));
    private static Map<String, String> expected = Map.of();

    @BeforeAll
    static void compareOnce() {
        job = filled(temp.resolve("here"));
        assertThat(job.compare("title", STRATEGIES).code()).isZero();
        expected = content(job);
        assertThat(expected).containsKeys("comparison.csv", "chain-i/path.csv", "record.json digest");
    }

    private static JobFolder filled(Path folder) {
        return new JobFolder(folder)
                .with("stocks.csv", DrawnPrices.csv(71, 420, LocalDate.of(2003, 1, 1)))
                .with("bonds.csv", DrawnPrices.csv(72, 420, LocalDate.of(2003, 1, 1)))
                .with("chain.yaml", StrategyText.named("CHAIN I").with("refit", fits("starts: 3")))
                .with(
                        "mixture.yaml",
                        StrategyText.named("Mixture")
                                .with(
                                        "regimes",
                                        "{model: mixture, observe: [{log-return: stocks}], states: [calm, stormy]}")
                                .with("refit", fits("starts: 2")))
                .with(
                        "pair.yaml",
                        StrategyText.named("Pair")
                                .with("prices", "{stocks: {csv: stocks.csv}, bonds: {csv: bonds.csv}}")
                                .with("refit", fits("starts: 1"))
                                .with("allocate", "{blend: {weights: {calm: {stocks: 1.0}, stormy: {bonds: 0.7}}}}"))
                .with("gone.yaml", StrategyText.named("Gone").with("prices", "{stocks: {csv: nowhere.csv}}"));
    }

    private static String fits(String starts) {
        return "{first-fit-after: 150, every: 120, seed: 20260101, " + starts + "}";
    }

    /** Every file of the result byte for byte, and of the record what stands inside the digest. */
    private static Map<String, String> content(JobFolder folder) {
        Map<String, String> content = new TreeMap<>(folder.files("results/title"));
        content.remove("record.json");
        content.put("record.json digest", folder.record("title").get("digest").asText());
        content.put("record.json variants", folder.digests("title").toString());
        return content;
    }

    /** Where a result differs from the first one: the files, each with its first line that differs. */
    private static List<String> differences(Map<String, String> actual) {
        List<String> differences = new ArrayList<>();
        if (!actual.keySet().equals(expected.keySet())) {
            differences.add("files " + actual.keySet() + " instead of " + expected.keySet());
        }
        actual.forEach((name, text) -> {
            List<String> lines = text.lines().toList();
            List<String> before = expected.getOrDefault(name, "").lines().toList();
            int line = 0;
            while (line < lines.size()
                    && line < before.size()
                    && lines.get(line).equals(before.get(line))) {
                line++;
            }
            if (line < lines.size() || line < before.size()) {
                differences.add(
                        name + " line " + (line + 1) + ": " + lines.subList(line, Math.min(line + 1, lines.size()))
                                + " instead of " + before.subList(line, Math.min(line + 1, before.size())));
            }
        });
        return differences;
    }

    @Test
    void threadsChangeNothing() {
        for (String threads : List.of("1", "4")) {
            assertThat(differences(runAgain("threads-" + threads, threads))).isEmpty();
        }
    }

    @Test
    void oneTimelineWalkedWithThreadsOfItsOwnIsTheSameToo() {
        Path one = temp.resolve("single");
        JobFolder folder = filled(one);
        String alone = folder.compare("title", "chain.yaml").err();
        assertThat(folder.digests("title"))
                .as(alone)
                .containsEntry("chain-i", job.digests("title").get("chain-i"));
    }

    @Test
    void anotherPlaceChangesNothing() {
        JobFolder elsewhere = filled(temp.resolve("else").resolve("where"));
        elsewhere.compare("title", STRATEGIES);
        assertThat(differences(content(elsewhere))).isEmpty();
    }

    @Test
    void languageAndTimeZoneChangeNothing() {
        Locale language = Locale.getDefault();
        TimeZone zone = TimeZone.getDefault();
        try {
            Locale.setDefault(new Locale("tr", "TR"));
            TimeZone.setDefault(TimeZone.getTimeZone("Asia/Tokyo"));
            assertThat(differences(runAgain("turkish", "2"))).isEmpty();
        } finally {
            Locale.setDefault(language);
            TimeZone.setDefault(zone);
        }
    }

    @Test
    void anotherWorkingFolderWithRelativePathsChangesNothing() {
        Path folder = temp.resolve("relative");
        filled(folder);
        List<String> command = new ArrayList<>(java(Path.of(System.getProperty("java.home"))));
        command.addAll(List.of("compare", "--results", "results", "--name", "title"));
        command.addAll(List.of(STRATEGIES));
        assertThat(exitCode(command, folder)).isZero();
        assertThat(differences(content(new JobFolder(folder)))).isEmpty();
    }

    @Test
    void aNewerJdkChangesNothing() {
        Optional<Path> newer = newerJdk();
        Assumptions.assumeTrue(newer.isPresent(), "no newer JDK stands beside this one");
        Path folder = temp.resolve("newer");
        filled(folder);
        List<String> command = new ArrayList<>(java(newer.get()));
        command.addAll(List.of("compare", "--results", "results", "--name", "title"));
        command.addAll(List.of(STRATEGIES));
        assertThat(exitCode(command, folder)).isZero();
        assertThat(differences(content(new JobFolder(folder)))).isEmpty();
        String host = new JobFolder(folder)
                .record("title")
                .get("outside_the_digest")
                .get("host")
                .asText();
        assertThat(host).doesNotEndWith("Java " + System.getProperty("java.version"));
    }

    private static Map<String, String> runAgain(String place, String threads) {
        JobFolder again = filled(temp.resolve(place));
        List<String> command = new ArrayList<>(List.of(
                "compare", "--results", again.path("results").toString(), "--name", "title", "--threads", threads));
        Stream.of(STRATEGIES).forEach(file -> command.add(again.path(file).toString()));
        JobFolder.shell(command.toArray(String[]::new));
        return content(again);
    }

    private static List<String> java(Path home) {
        return List.of(
                home.resolve("bin/java").toString(),
                "-cp",
                Objects.requireNonNull(System.getProperty("java.class.path")),
                "sojourn.cli.Main");
    }

    private static int exitCode(List<String> command, Path folder) {
        try {
            Path log = Files.createTempFile(temp, "forked", ".txt");
            Process process = new ProcessBuilder(command)
                    .directory(folder.toFile())
                    .redirectErrorStream(true)
                    .redirectOutput(log.toFile())
                    .start();
            int code = process.waitFor();
            return code == 0 ? 0 : failed(code, Files.readString(log, StandardCharsets.UTF_8));
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
            throw new IllegalStateException(e);
        }
    }

    private static int failed(int code, String log) {
        throw new AssertionError("the forked run ended with " + code + ":\n" + log);
    }

    /** A JDK with a higher feature version in a folder beside this one's. */
    private static Optional<Path> newerJdk() {
        Path own = Path.of(System.getProperty("java.home")).toAbsolutePath().normalize();
        try (Stream<Path> beside = Files.list(Objects.requireNonNull(own.getParent()))) {
            return beside.filter(home -> Files.isExecutable(home.resolve("bin/java")))
                    .filter(home -> feature(home) > Runtime.version().feature())
                    .sorted()
                    .findFirst();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    /** The feature version that the file {@code release} of a JDK states; 0 if it has none. */
    private static int feature(Path home) {
        Path release = home.resolve("release");
        if (!Files.isRegularFile(release)) {
            return 0;
        }
        try (Stream<String> lines = Files.lines(release, StandardCharsets.UTF_8)) {
            return lines.filter(line -> line.startsWith("JAVA_VERSION="))
                    .map(line -> line.replaceAll("[^0-9.]", "").split("\\.", -1)[0])
                    .mapToInt(Integer::parseInt)
                    .findFirst()
                    .orElse(0);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
