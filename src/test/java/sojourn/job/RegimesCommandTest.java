package sojourn.job;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.assertj.core.api.Assertions.withinPercentage;

import com.fasterxml.jackson.databind.JsonNode;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** {@code regimes} as a user runs it. */
class RegimesCommandTest {
    private static final LocalDate START = LocalDate.of(2010, 1, 4);
    private static final List<String> FILES =
            List.of("bars.csv", "forecasts.csv", "influence.csv", "lineage.csv", "record.json", "regimes.json");

    @TempDir
    private Path temporary;

    private JobFolder folder;

    @BeforeEach
    void prepare() {
        folder = new JobFolder(temporary)
                .with("stocks.csv", DrawnPrices.csv(3, 700, START))
                .with("calm-rule.yaml", StrategyText.named("Calm rule"));
    }

    private JobFolder.Ran regimes(String file, String... more) {
        List<String> arguments = new ArrayList<>(List.of(
                "regimes",
                folder.path(file).toString(),
                "--results",
                folder.path("results").toString()));
        arguments.addAll(Arrays.asList(more));
        return JobFolder.shell(arguments.toArray(String[]::new));
    }

    @Test
    void printsAndWritesWhatItFound() {
        JobFolder.Ran ran = regimes("calm-rule.yaml");
        assertThat(ran.code()).isZero();
        assertThat(ran.err()).contains("written to").contains("calm-rule-regimes");
        assertThat(ran.out()).startsWith("Hypothetical performance");
        assertThat(ran.out())
                .contains("Who are the regimes?")
                .contains("Are they the same from fit to fit?")
                .contains("Which forecasts volatility best?")
                .contains("Best by QLIKE: ")
                .contains("What hangs on single bars?")
                .contains("Which bars surprised most?");
        assertThat(ran.out().lines()).allMatch(line -> line.length() <= 100);
        assertThat(folder.names("results/calm-rule-regimes")).isEqualTo(FILES);
        folder.files("results/calm-rule-regimes")
                .forEach((name, text) ->
                        assertThat(text).as(name).doesNotContain("NaN").doesNotContain("Infinity"));
    }

    @Test
    void belongsToTheComparisonOfTheSameFile() {
        regimes("calm-rule.yaml");
        folder.compare("alone", "calm-rule.yaml");
        String digest = folder.record("alone").get("digest").asText();
        assertThat(folder.json("results/calm-rule-regimes/regimes.json")
                        .get("comparison_digest")
                        .asText())
                .isEqualTo(digest);
        JsonNode record = folder.record("calm-rule-regimes");
        assertThat(record.get("comparison_digest").asText()).isEqualTo(digest);
        assertThat(record.get("inputs").get(0).get("sha256").asText()).hasSize(64);
        assertThat(record.get("caution").asText()).startsWith("Hypothetical");
        String timeline = record.get("timeline").asText();
        // what was known of the regimes is what the comparison wrote of them
        List<String> theirs =
                folder.table("alone/timelines/" + timeline + ".csv").texts("probability.stormy");
        assertThat(folder.table("calm-rule-regimes/bars.csv").texts("probability.stormy"))
                .isEqualTo(theirs);
        assertThat(folder.table("calm-rule-regimes/bars.csv").texts("log_score"))
                .isEqualTo(folder.table("alone/timelines/" + timeline + ".csv").texts("log_score"));
    }

    @Test
    void threadsChangeNoByteAndASecondRunLeavesTheFirstAlone() {
        regimes("calm-rule.yaml", "--threads", "1");
        Map<String, String> first = folder.files("results/calm-rule-regimes");
        JobFolder.Ran again = regimes("calm-rule.yaml", "--threads", "3");
        assertThat(again.err()).contains("already; it was left alone");
        assertThat(folder.names("results")).containsExactly("calm-rule-regimes");
        assertThat(folder.files("results/calm-rule-regimes")).isEqualTo(first);
    }

    @Test
    void jsonOnStandardOutputIsTheFile() {
        JobFolder.Ran ran = regimes("calm-rule.yaml", "--json", "--quiet");
        assertThat(ran.code()).isZero();
        assertThat(ran.err()).isEmpty();
        assertThat(ran.out()).isEqualTo(folder.text("results/calm-rule-regimes/regimes.json"));
        JsonNode found = JobFolder.parsed(ran.out());
        assertThat(found.get("identity").get("regimes")).hasSize(2);
        assertThat(found.get("forecasts_of_squared_return").get("forecasters").size())
                .isGreaterThanOrEqualTo(5);
    }

    @Test
    void aMeanOfWhatWasWrittenIsTheFigureThatIsTold() {
        regimes("calm-rule.yaml");
        JsonNode forecasts =
                folder.json("results/calm-rule-regimes/regimes.json").get("forecasts_of_squared_return");
        WrittenTable written = folder.table("calm-rule-regimes/forecasts.csv");
        Map<String, List<String>> losses = new LinkedHashMap<>();
        forecasts.get("forecasters").forEach(row -> {
            String gauge = row.get("gauge").asText();
            losses.put(gauge, written.texts("qlike." + gauge));
        });
        int[] common = IntStream.range(0, written.texts("date").size())
                .filter(row -> losses.values().stream()
                        .noneMatch(cells -> cells.get(row).isEmpty()))
                .toArray();
        assertThat(common).hasSize(forecasts.get("bars").asInt()).hasSizeGreaterThan(400);
        for (JsonNode row : forecasts.get("forecasters")) {
            List<String> cells =
                    Objects.requireNonNull(losses.get(row.get("gauge").asText()));
            double mean = Arrays.stream(common)
                    .mapToDouble(one -> Double.parseDouble(cells.get(one)))
                    .average()
                    .orElseThrow();
            assertThat(row.get("mean_qlike").asDouble()).isCloseTo(mean, within(1e-10));
        }
    }

    @Test
    void pricesThatCannotBeFittedAreAnAnswerToo() {
        List<String> closes = Stream.generate(() -> "100").limit(500).toList();
        folder.with("stocks.csv", DrawnPrices.csv(closes, START));
        JobFolder.Ran ran = regimes("calm-rule.yaml");
        assertThat(ran.code()).isZero();
        assertThat(ran.out())
                .contains("Undefined, because no fit was accepted.")
                .contains("all observations of the window are equal");
        assertThat(folder.names("results/calm-rule-regimes")).isEqualTo(FILES);
        assertThat(folder.text("results/calm-rule-regimes/regimes.json")).doesNotContain("NaN");
    }

    @Test
    void oneRegimeAndDeclaredParametersAreQuestionedToo() {
        folder.with("full.yaml", StrategyText.alwaysFull("Full"));
        JobFolder.Ran one = regimes("full.yaml");
        assertThat(one.code()).isZero();
        assertThat(one.out()).contains("Undefined, because there is one regime, whatever is left out.");
        folder.with(
                "declared.yaml",
                StrategyText.named("Declared")
                        .with(
                                "regimes",
                                "{observe: [{log-return: stocks}], states: [calm, stormy], parameters: {fixed: {initial: [0.9, 0.1],"
                                        + " transition: [[0.98, 0.02], [0.02, 0.98]], mean: [0, 0], sd: [0.006, 0.022]}}}"));
        JobFolder.Ran declared = regimes("declared.yaml");
        assertThat(declared.code()).isZero();
        assertThat(declared.out()).contains("an external prior").contains("declared, not fitted");
    }

    @Test
    void aFolderAndAMissingFileAreRefused() {
        JobFolder.Ran ran = regimes(".");
        assertThat(ran.code()).isEqualTo(2);
        assertThat(ran.err()).contains("is a folder; name one strategy file");
        assertThat(regimes("absent.yaml").code()).isEqualTo(2);
        folder.with("stocks.csv", "date,close\n2010-01-04,x\n");
        JobFolder.Ran unreadable = regimes("calm-rule.yaml");
        assertThat(unreadable.code()).isEqualTo(2);
        assertThat(unreadable.err()).contains("stocks.csv");
    }

    @Test
    void returnsAThousandTimesSmallerOrLargerTellTheSame() {
        regimes("calm-rule.yaml");
        JsonNode plain = folder.json("results/calm-rule-regimes/regimes.json");
        for (double scale : new double[] {1e-3, 3}) {
            folder.with("scaled/stocks.csv", scaled(DrawnPrices.csv(3, 700, START), scale));
            folder.with("scaled/calm-rule.yaml", StrategyText.named("Calm rule"));
            JobFolder.Ran ran = regimes("scaled/calm-rule.yaml", "--json", "--quiet");
            JsonNode other = JobFolder.parsed(ran.out());
            for (String test : List.of("jarque_bera", "ljung_box", "ljung_box_of_squares", "kolmogorov_smirnov")) {
                double expected =
                        plain.get("pseudo_residuals").get(test).get("value").asDouble();
                assertThat(other.get("pseudo_residuals").get(test).get("value").asDouble())
                        .isCloseTo(expected, withinPercentage(0.01));
            }
            assertThat(other.get("single_bars").get("decisive_at_any_close"))
                    .isEqualTo(plain.get("single_bars").get("decisive_at_any_close"));
        }
    }

    /** Prices raised to a power: log returns times {@code scale}, to 17 digits. */
    private static String scaled(String csv, double scale) {
        StringBuilder text = new StringBuilder("date,close\n");
        csv.lines().skip(1).forEach(line -> {
            String[] cells = line.split(",", -1);
            double price = 100 * Math.pow(Double.parseDouble(cells[1]) / 100, scale);
            text.append(cells[0]).append(',').append(price).append('\n');
        });
        return text.toString();
    }
}
