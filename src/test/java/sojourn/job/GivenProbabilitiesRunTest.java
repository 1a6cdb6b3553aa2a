package sojourn.job;

import static org.assertj.core.api.Assertions.assertThat;

import com.fasterxml.jackson.databind.JsonNode;
import java.math.BigDecimal;
import java.math.RoundingMode;
import java.nio.file.Path;
import java.time.LocalDate;
import java.time.temporal.IsoFields;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A strategy that trades somebody else's probabilities, run as a user would. */
class GivenProbabilitiesRunTest {
    private static final LocalDate FIRST = LocalDate.of(2003, 1, 1);

    @TempDir
    Path temp;

    @Test
    void theWrittenStrategyRunsOnItsOwnAndTheDigestIsOfTheContentNotThePlace() {
        JobFolder job = job(gauge(2));
        String digest = digest(job, "first", "plans/given.yaml");
        assertThat(digest(job, "alone", "results/first/given/strategy.yaml")).isEqualTo(digest);
        job.with("elsewhere/weekly.csv", job.text("data/gauge.csv"))
                .with("plans/given.yaml", strategy("../elsewhere/weekly.csv"));
        assertThat(digest(job, "moved", "plans/given.yaml")).isEqualTo(digest);
        assertThat(timeline(job, "moved")).isEqualTo(timeline(job, "first"));
        job.with("elsewhere/weekly.csv", gauge(3));
        assertThat(digest(job, "later", "plans/given.yaml")).isNotEqualTo(digest);
        assertThat(timeline(job, "later")).isNotEqualTo(timeline(job, "first"));
    }

    @Test
    void everyOutputSaysThatTheyWereComputedElsewhere() {
        JobFolder job = job(gauge(2));
        JobFolder.Ran ran = job.compare("marked", "plans/given.yaml");
        assertThat(ran.code()).as(ran.err()).isZero();
        String plain = ran.out().replaceAll("\\s+", " ");
        assertThat(plain)
                .contains("given**")
                .contains("** its probabilities were computed elsewhere, and are not audited");
        JsonNode record = job.record("marked");
        assertThat(record.get("warnings").toString()).contains("computed elsewhere and are not audited");
        assertThat(record.get("variants").get(0).get("parameters").asText()).startsWith("computed elsewhere");
        assertThat(record.get("inputs").toString()).contains("regimes.given").contains("../data/gauge.csv");
        assertThat(record.get("timelines").get(0).get("fits").toString()).startsWith("{\"given\":");
        assertThat(job.table("marked/comparison.csv").texts("parameters")).contains("computed-elsewhere");
        assertThat(job.json("results/marked/given/measures.json")
                        .get("parameters")
                        .asText())
                .isEqualTo("computed-elsewhere");
        assertThat(job.text("results/marked/timelines/" + timeline(job, "marked") + ".csv"))
                .doesNotContain("NaN");
        JobFolder.Ran plan =
                JobFolder.shell("check", job.path("plans/given.yaml").toString());
        assertThat(plan.out().replaceAll("\\s+", " "))
                .contains("were computed elsewhere (../data/gauge.csv) and are not audited for how they were computed")
                .contains("first close on or after its known_on");
        JobFolder.Ran regimes = JobFolder.shell(
                "regimes",
                job.path("plans/given.yaml").toString(),
                "--results",
                job.path("results").toString());
        assertThat(regimes.code()).as(regimes.err()).isZero();
        assertThat(regimes.out().replaceAll("\\s+", " ")).contains("computed elsewhere and are not audited");
    }

    @Test
    void aFileThatClaimsToKnowBeforeTheDayIsRefusedWhereItSaysSo() {
        JobFolder job = job("date,calm,stormy,known_on\n2003-02-03,0.9,0.1,2003-02-02\n");
        JobFolder.Ran ran = job.compare("refused", "plans/given.yaml");
        assertThat(ran.code()).isEqualTo(2);
        assertThat((ran.out() + ran.err()).replaceAll("\\s+", " "))
                .contains("../data/gauge.csv:2:20: the probabilities of 2003-02-03 are said to be known on 2003-02-02");
    }

    /** The recipe in demo-data/README.md, from the prices that stand there. */
    @Test
    void theDemoGaugeIsWhatItsRecipeMakesOfTheDemoStocks() {
        JobFolder demo = new JobFolder(Path.of("demo-data"));
        List<LocalDate> dates = new ArrayList<>();
        List<Double> closes = new ArrayList<>();
        for (String line : demo.text("skerry-stocks.csv").lines().skip(1).toList()) {
            String[] cells = line.split(",", -1);
            dates.add(LocalDate.parse(cells[0]));
            closes.add(Double.parseDouble(cells[4]));
        }
        StringBuilder expected = new StringBuilder("date,calm,stormy,known_on\n");
        for (int t = 10; t + 2 < closes.size(); t++) {
            if (week(dates.get(t)) == week(dates.get(t + 1))) {
                continue;
            }
            double sum = 0;
            for (int u = t - 9; u <= t; u++) {
                sum += Math.abs(closes.get(u) / closes.get(u - 1) - 1);
            }
            double p = Math.min(1, Math.max(0, (sum / 10 - 0.006) / 0.008));
            BigDecimal stormy = new BigDecimal(p).setScale(3, RoundingMode.HALF_UP);
            expected.append(dates.get(t))
                    .append(',')
                    .append(BigDecimal.ONE.subtract(stormy))
                    .append(',');
            expected.append(stormy).append(',').append(dates.get(t + 2)).append('\n');
        }
        assertThat(demo.text("skerry-weekly-gauge.csv")).isEqualTo(expected.toString());
    }

    private static int week(LocalDate date) {
        return date.get(IsoFields.WEEK_BASED_YEAR) * 100 + date.get(IsoFields.WEEK_OF_WEEK_BASED_YEAR);
    }

    private JobFolder job(String gauge) {
        return new JobFolder(temp)
                .with("data/stocks.csv", DrawnPrices.csv(91, 330, FIRST))
                .with("data/gauge.csv", gauge)
                .with("plans/given.yaml", strategy("../data/gauge.csv"));
    }

    private static StrategyText strategy(String csv) {
        return StrategyText.named("Given")
                .with("prices", "{stocks: {csv: ../data/stocks.csv}}")
                .with("refit", "{first-fit-after: 120, every: 90, starts: 1, seed: 5}")
                .with(
                        "regimes",
                        "{given: {csv: " + csv + ", known-on: known_on}, states: [calm, stormy], order-by: stocks}");
    }

    /** A row every fifth day, calm and stormy by turns, known so many days later. */
    private static String gauge(int daysLater) {
        StringBuilder rows = new StringBuilder("date,calm,stormy,known_on\n");
        for (int row = 0; row < 90; row++) {
            LocalDate date = FIRST.plusDays(5L * row);
            rows.append(date).append(row / 4 % 2 == 0 ? ",0.9,0.1," : ",0.15,0.85,");
            rows.append(date.plusDays(daysLater)).append('\n');
        }
        return rows.toString();
    }

    private static String digest(JobFolder job, String name, String file) {
        JobFolder.Ran ran = job.compare(name, file);
        assertThat(ran.code()).as(ran.err()).isZero();
        Map<String, String> digests = job.digests(name);
        assertThat(digests).containsOnlyKeys("given");
        return digests.getOrDefault("given", "");
    }

    private static String timeline(JobFolder job, String name) {
        return job.record(name).get("variants").get(0).get("timeline").asText();
    }
}
