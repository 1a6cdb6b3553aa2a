package sojourn.job;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A variant that cannot run is a row with its reason; the others go on. */
class FailureRowsTest {
    private static final LocalDate START = LocalDate.of(2003, 1, 1);

    @TempDir
    Path temp;

    private JobFolder job = new JobFolder(Path.of(""));

    @BeforeEach
    void writePrices() {
        job = new JobFolder(temp)
                .with("stocks.csv", DrawnPrices.csv(51, 460, START))
                .with("sound.yaml", fast("Sound"));
    }

    private static StrategyText fast(String name) {
        return StrategyText.alwaysFull(name).with("refit", "{first-fit-after: 100, every: 200, starts: 1, seed: 7}");
    }

    @Test
    void missingFileConstantPricesAndTooFewBarsAreRowsAndTheBatchGoesOn() {
        job.with("constant.csv", DrawnPrices.csv(Collections.nCopies(300, "50"), START))
                .with("short.csv", DrawnPrices.csv(52, 90, START))
                .with("brief.csv", DrawnPrices.csv(52, 102, START))
                .with("missing.yaml", fast("Missing").with("prices", "{stocks: {csv: no-such.csv}}"))
                .with("constant.yaml", StrategyText.named("Constant").with("prices", "{stocks: {csv: constant.csv}}"))
                .with("short.yaml", fast("Short").with("prices", "{stocks: {csv: short.csv}}"))
                .with("brief.yaml", fast("Brief").with("prices", "{stocks: {csv: brief.csv}}"));
        JobFolder.Ran ran =
                job.compare("mixed", "missing.yaml", "constant.yaml", "short.yaml", "brief.yaml", "sound.yaml");
        assertThat(ran.code()).as(ran.err()).isZero();
        assertThat(reason("mixed", "missing")).contains("no-such.csv");
        assertThat(reason("mixed", "constant")).contains("fits was accepted").contains("2003-10-08");
        assertThat(reason("mixed", "short"))
                .contains("no fit was due", "there are 89 on 90 common bars", "first-fit-after");
        assertThat(reason("mixed", "brief")).contains("leaves no bar to be judged");
        WrittenTable table = job.table("mixed/comparison.csv");
        assertThat(table.text(table.row("variant", "sound"), "outcome")).isEqualTo("ran");
        assertThat(job.record("mixed").get("counts").toString())
                .contains("\"variants\":5", "\"ran\":1", "\"failed\":4");
        assertThat(job.names("results/mixed")).doesNotContain("missing", "constant", "short", "brief");
        nothingUndefinedIsWrittenAsANumber("mixed");
    }

    @Test
    void noNameBecomesAFormulaInASpreadsheet() {
        job.with("formula.yaml", fast("'=SUM(A1), \"x\"'").with("prices", "{stocks: {csv: '=1+1.csv'}}"));
        job.compare("formula", "formula.yaml");
        WrittenTable table = job.table("formula/comparison.csv");
        assertThat(table.text(0, "variant")).isEqualTo("sum-a1-x");
        assertThat(table.text(0, "reason")).startsWith("'=1+1.csv: ");
        assertThat(job.record("formula").get("variants").get(0).get("strategy").asText())
                .isEqualTo("=SUM(A1), \"x\"");
    }

    @Test
    void ifNoneRanTheCodeIsTwoAndTheReasonsAreWritten() {
        job.with("missing.yaml", fast("Missing").with("prices", "{stocks: {csv: no-such.csv}}"));
        JobFolder.Ran ran = job.compare("none", "missing.yaml");
        assertThat(ran.code()).isEqualTo(2);
        assertThat(reason("none", "missing")).contains("no-such.csv");
        assertThat(job.record("none").get("counts").get("ran").asInt()).isZero();
    }

    @Test
    void ruinIsARowWithGrowthOfMinusOneAndEmptyRatios() {
        shortOnARisingPrice();
        JobFolder.Ran ran = job.compare("ruin", "short.yaml", "calm.yaml");
        assertThat(ran.code()).as(ran.err()).isZero();
        WrittenTable table = job.table("ruin/comparison.csv");
        int row = table.row("variant", "short");
        assertThat(table.text(row, "outcome")).isEqualTo("ruined");
        assertThat(table.number(row, "growth_per_year")).isEqualTo(-1);
        assertThat(table.number(row, "worst_drawdown")).isEqualTo(-1);
        assertThat(table.text(row, "sharpe")).isEmpty();
        assertThat(table.text(row, "calmar")).isEmpty();
        assertThat(job.record("ruin").get("variants").toString()).contains("ruined_on");
        WrittenTable path = job.table("ruin/short/path.csv");
        assertThat(path.number(path.size() - 1, "wealth")).isZero();
        nothingUndefinedIsWrittenAsANumber("ruin");
    }

    @Test
    void aVariantRuinedBeforeTheOthersBeginIsARowToo() {
        shortOnARisingPrice();
        job.with(
                "late.yaml",
                fast("Late")
                        .with("refit", "{first-fit-after: 300, every: 200, starts: 1, seed: 7}")
                        .with("prices", "{stocks: {csv: jump.csv}}"));
        JobFolder.Ran ran = job.compare("before", "short.yaml", "late.yaml");
        assertThat(ran.code()).as(ran.err()).isZero();
        WrittenTable table = job.table("before/comparison.csv");
        assertThat(table.text(table.row("variant", "late"), "outcome")).isEqualTo("ran");
        int row = table.row("variant", "short");
        assertThat(table.text(row, "outcome")).isEqualTo("failed");
        // at twice the price a tenth of the capital is left, at four times nothing
        String secondDoubling = WrittenTable.read(job.path("jump.csv")).text(151, "date");
        assertThat(table.text(row, "reason")).contains("ruined on " + secondDoubling + ", before");
        assertThat(table.text(row, "growth_per_year")).isEmpty();
        nothingUndefinedIsWrittenAsANumber("before");
    }

    /**
     * Three times long while calm and out while stormy, with a fall by 60 % amid the storm: the strategy lives through it, the mix of
     * its mean weights does not.
     */
    @Test
    void aYardstickRuinedBeforeTheWindowIsNotJudgedAndSaidSo() {
        List<String> closes = new ArrayList<>();
        for (int bar = 0; bar < 460; bar++) {
            double swing = bar >= 200 && bar < 300 ? 0.03 : 0.002;
            double level = bar < 250 ? 100 : 40;
            closes.add(Double.toString(level * (bar % 2 == 0 ? 1 : 1 + swing)));
        }
        StrategyText levered = StrategyText.named("Levered")
                .with("prices", "{stocks: {csv: fall.csv}}")
                .with(
                        "regimes",
                        "{observe: [{log-return: stocks}], states: [calm, stormy], parameters: {fixed:"
                                + " {initial: [0.5, 0.5], transition: [[0.98, 0.02], [0.02, 0.98]],"
                                + " mean: [0, 0], sd: [0.003, 0.04]}}}")
                .with("refit", "{first-fit-after: 100, every: 200, starts: 1, seed: 7}")
                .with("allocate", "{table: {weights: {calm: {stocks: 3.0}, stormy: {stocks: 0.0}}}}")
                .with("limits", "{gross: 3, per-asset: [0, 3]}");
        job.with("fall.csv", DrawnPrices.csv(closes, START))
                .with("levered.yaml", levered)
                .with(
                        "late.yaml",
                        levered.with("strategy", "Late")
                                .with("refit", "{first-fit-after: 320, every: 200, starts: 1, seed: 7}"));
        JobFolder.Ran ran = job.compare("levered", "levered.yaml", "late.yaml");
        assertThat(ran.code()).as(ran.err()).isZero();
        WrittenTable table = job.table("levered/comparison.csv");
        assertThat(table.text(table.row("variant", "levered"), "outcome")).isEqualTo("ran");
        assertThat(table.text(table.row("variant", "same_exposure of late"), "outcome"))
                .isEqualTo("ran");
        for (String name : List.of("same_exposure", "same_exposure_so_far")) {
            int row = table.row("variant", name + " of levered");
            assertThat(table.text(row, "outcome")).isEqualTo("undefined");
            assertThat(table.text(row, "reason")).contains("ruined before the window begins");
            assertThat(table.text(row, "sharpe")).isEmpty();
            assertThat(job.json("results/levered/levered/measures.json")
                            .get("yardsticks")
                            .get(name)
                            .toString())
                    .contains("RUIN", "ruined before the window");
        }
        nothingUndefinedIsWrittenAsANumber("levered");
    }

    @Test
    void aRuleThatStaysInCashIsJudgedFromItsFirstDecisionOn() {
        job.with(
                "cash.yaml",
                fast("Cash")
                        .with("allocate", "{table: {weights: {only: {stocks: 0.0}}}}")
                        .with("cash", "{percent-per-year: 0}"));
        JobFolder.Ran ran = job.compare("cash", "cash.yaml");
        assertThat(ran.code()).as(ran.err()).isZero();
        WrittenTable table = job.table("cash/comparison.csv");
        int row = table.row("variant", "cash");
        assertThat(table.text(row, "from"))
                .isEqualTo(job.table("cash/cash/path.csv").text(0, "date"));
        assertThat(table.number(row, "total_return")).isZero();
        assertThat(table.text(row, "sharpe")).as("nothing varies").isEmpty();
        assertThat(job.table("cash/cash/trades.csv").size()).isZero();
        assertThat(job.files("results/cash").get("comparison.csv")).doesNotContain("-0.0,");
        nothingUndefinedIsWrittenAsANumber("cash");
    }

    /** A price that doubles and doubles again on bars 150 to 153: a short position cannot survive it. */
    private void shortOnARisingPrice() {
        List<String> closes = new ArrayList<>();
        double[] up = {200, 400, 800, 1600};
        for (int bar = 0; bar < 460; bar++) {
            double level = bar < 150 ? 100 : up[Math.min(bar - 150, 3)];
            closes.add(Double.toString(level * (bar % 2 == 0 ? 1 : 1.01)));
        }
        StrategyText onJump = fast("Calm").with("prices", "{stocks: {csv: jump.csv}}");
        job.with("jump.csv", DrawnPrices.csv(closes, START))
                .with("calm.yaml", onJump)
                .with(
                        "short.yaml",
                        onJump.with("strategy", "Short")
                                .with("allocate", "{table: {weights: {only: {stocks: -0.9}}}}")
                                .with("limits", "{gross: 1, per-asset: [-1, 1]}"));
    }

    private String reason(String result, String variant) {
        WrittenTable table = job.table(result + "/comparison.csv");
        int row = table.row("variant", variant);
        assertThat(table.text(row, "outcome")).isEqualTo("failed");
        assertThat(table.text(row, "sharpe")).isEmpty();
        return table.text(row, "reason");
    }

    private void nothingUndefinedIsWrittenAsANumber(String result) {
        for (Map.Entry<String, String> file : job.files("results/" + result).entrySet()) {
            assertThat(file.getValue()).as(file.getKey()).doesNotContain("NaN").doesNotContain("Infinity");
        }
    }
}
