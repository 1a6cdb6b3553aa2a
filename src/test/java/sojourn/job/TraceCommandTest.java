package sojourn.job;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** {@code trace} as a user runs it: what it prints is enough to redo the bar, and is what the comparison wrote of it. */
class TraceCommandTest {
    private static final LocalDate START = LocalDate.of(2010, 1, 4);
    private static final double ROUNDING = 1e-12;

    @TempDir
    private Path temporary;

    private JobFolder folder;

    @BeforeEach
    void prepare() {
        folder = new JobFolder(temporary)
                .with("stocks.csv", DrawnPrices.csv(3, 500, START))
                .with("calm-rule.yaml", StrategyText.named("Calm rule"));
    }

    private JobFolder.Ran trace(String date, String... more) {
        List<String> arguments =
                new ArrayList<>(List.of("trace", folder.path("calm-rule.yaml").toString(), "--date", date, "--quiet"));
        arguments.addAll(Arrays.asList(more));
        return JobFolder.shell(arguments.toArray(String[]::new));
    }

    @Test
    void theProbabilityCanBeRedoneFromThePrintedNumbersAlone() {
        folder.compare("all", "calm-rule.yaml");
        WrittenTable bars = timeline();
        for (int row : new int[] {0, 1, 57, 99, 100, 101, 250}) {
            String date = bars.text(row, "date");
            String text = trace(date).out();
            double[] calm = numbers(text, "calm");
            double[] stormy = numbers(text, "stormy");
            // prior, predicted, ln density, density, posterior; predicted from prior and the printed transitions
            double stay = parameter(text, "transition.calm.calm");
            double comes = parameter(text, "transition.stormy.calm");
            assertThat(calm[1]).isCloseTo(calm[0] * stay + stormy[0] * comes, within(ROUNDING));
            assertThat(calm[3]).isCloseTo(density(text, "calm"), within(1e-9 * calm[3]));
            assertThat(stormy[3]).isCloseTo(density(text, "stormy"), within(1e-9 * stormy[3]));
            double sum = calm[1] * calm[3] + stormy[1] * stormy[3];
            assertThat(stormy[4]).isCloseTo(stormy[1] * stormy[3] / sum, within(ROUNDING));
            assertThat(stormy[4]).isEqualTo(bars.number(row, "probability.stormy"));
        }
    }

    /** The normal density of what was seen, by the printed mean and standard deviation. */
    private static double density(String text, String regime) {
        double x = parameter(text, "log return of stocks");
        double mean = parameter(text, "mean.log_return_stocks." + regime);
        double sd = parameter(text, "sd.log_return_stocks." + regime);
        double z = (x - mean) / sd;
        return Math.exp(-z * z / 2) / (sd * Math.sqrt(2 * Math.PI));
    }

    private static double parameter(String text, String name) {
        Matcher found =
                Pattern.compile("\n  " + Pattern.quote(name) + " +([-0-9.E]+)").matcher(text);
        assertThat(found.find()).as(name).isTrue();
        return Double.parseDouble(found.group(1));
    }

    private static double[] numbers(String text, String regime) {
        String flat = text.replaceAll("\\s+", " ");
        Matcher found = Pattern.compile(" " + regime
                        + " prior (\\S+), predicted (\\S+), ln density (\\S+), density (\\S+)," + " posterior (\\S+)")
                .matcher(flat);
        assertThat(found.find()).as(regime).isTrue();
        double[] numbers = new double[5];
        for (int i = 0; i < numbers.length; i++) {
            numbers[i] = Double.parseDouble(found.group(i + 1));
        }
        return numbers;
    }

    private WrittenTable timeline() {
        String name = folder.names("results/all/timelines").stream()
                .filter(one -> !one.endsWith(".fits.csv"))
                .findFirst()
                .orElseThrow();
        return folder.table("all/timelines/" + name);
    }

    @Test
    void theOrderAndItsFillAreThoseOfTheComparison() {
        folder.compare("all", "calm-rule.yaml");
        WrittenTable trades = folder.table("all/calm-rule/trades.csv");
        assertThat(trades.texts("asset")).hasSizeGreaterThan(5);
        for (int row = 0; row < trades.texts("asset").size(); row++) {
            JsonNode found = JobFolder.parsed(
                    trace(trades.text(row, "decided_on"), "--json").out());
            JsonNode fill = found.get("filled_later").get(0);
            assertThat(fill.get("filled_on").asText()).isEqualTo(trades.text(row, "filled_on"));
            for (String column : List.of("units", "price", "notional", "commission", "half_spread", "weight_after")) {
                assertThat(fill.get(column).asDouble()).as(column).isEqualTo(trades.number(row, column));
            }
            assertThat(found.get("decision").get("because").asText()).isEqualTo(trades.text(row, "because"));
            assertThat(found.get("decision").get("kind").asText()).isEqualTo("order");
            JsonNode later = JobFolder.parsed(
                    trace(trades.text(row, "filled_on"), "--json").out());
            assertThat(later.get("filled_here").get(0)).isEqualTo(fill);
        }
    }

    @Test
    void aDateThatIsNoBarIsRefusedWithTheNearestOnes() {
        JobFolder.Ran weekend = trace("2010-12-25");
        assertThat(weekend.code()).isEqualTo(2);
        assertThat(weekend.err())
                .contains("2010-12-25 is no bar that all files have")
                .contains("nearest: 2010-12-24 and 2010-12-27");
        assertThat(trace("foo").code()).isEqualTo(2);
        assertThat(trace("foo").err())
                .contains("--date")
                .contains("'foo' is no date of the calendar; write dates as yyyy-mm-dd, e.g. 2010-03-09")
                .doesNotContain("Exception");
        assertThat(trace("2009-01-02").err())
                .contains("lies before the first bar")
                .contains("nearest: 2010-01-04");
        assertThat(trace("2031-01-02").err()).contains("lies after the last bar");
        assertThat(trace("yesterday").code()).isEqualTo(2);
    }

    @Test
    void aBarBeforeTheFirstFitSaysThatNothingIsKnown() {
        JobFolder.Ran early = trace("2010-02-02");
        assertThat(early.code()).isZero();
        assertThat(early.out()).contains("Undefined, because there is no accepted fit at this close.");
        JobFolder.Ran first = trace("2010-01-04");
        assertThat(first.code()).isZero();
        assertThat(first.out()).contains("missing");
        assertThat(JobFolder.parsed(trace("2010-01-04", "--json").out())
                        .get("decision")
                        .get("kind")
                        .asText())
                .isEqualTo("none");
    }

    @Test
    void everyGaugeHasATraceAndNothingIsWritten() {
        for (String regimes : List.of(
                "{model: volatility-threshold, threshold: {volatility: {ewma: 0.94}, storm-above: 0.8, calm-below: 0.6}, observe: [{log-return: stocks}], states: [calm, stormy]}",
                "{model: jump, penalty: 6, observe: [{absolute-return: stocks}], states: [calm, stormy]}",
                "{emission: student-t, observe: [{log-return: stocks}], states: [calm, stormy]}",
                "{model: mixture, observe: [{log-return: stocks}], states: [calm, stormy]}")) {
            folder.with("calm-rule.yaml", StrategyText.named("Calm rule").with("regimes", regimes));
            JobFolder.Ran ran = trace("2011-06-01");
            assertThat(ran.code()).as(regimes + ran.err()).isZero();
            assertThat(ran.out()).contains("posterior").doesNotContain("NaN").doesNotContain("Infinity");
        }
        assertThat(Files.exists(folder.path("results"))).isFalse();
    }
}
