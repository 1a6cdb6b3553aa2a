package sojourn.job;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.time.LocalDate;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Over which bars variants are judged, and that company changes no variant's own figures. */
class EvaluationWindowTest {
    private static final LocalDate START = LocalDate.of(2003, 1, 1);

    @TempDir
    Path temp;

    private JobFolder job = new JobFolder(Path.of(""));

    @BeforeEach
    void writePrices() {
        job = new JobFolder(temp)
                .with("stocks.csv", DrawnPrices.csv(41, 420, START))
                .with("early.yaml", mixture("Early", 100))
                .with("late.yaml", mixture("Late", 180));
    }

    /** A mixture, because it fits fast. */
    private static StrategyText mixture(String name, int firstFitAfter) {
        return StrategyText.named(name)
                .with("regimes", "{model: mixture, observe: [{log-return: stocks}], states: [calm, stormy]}")
                .with("refit", "{first-fit-after: " + firstFitAfter + ", every: 100, starts: 1, seed: 7}");
    }

    @Test
    void theBaseIsTheCloseOfTheLatestFirstFill() {
        assertThat(job.compare("both", "early.yaml", "late.yaml").code()).isZero();
        String latest = job.table("both/late/trades.csv").text(0, "filled_on");
        assertThat(latest).isGreaterThan(job.table("both/early/trades.csv").text(0, "filled_on"));
        WrittenTable table = job.table("both/comparison.csv");
        List<String> dates = WrittenTable.read(job.path("stocks.csv")).texts("date");
        for (String variant : List.of("early", "late")) {
            int row = table.row("variant", variant);
            assertThat(table.text(row, "from")).isEqualTo(latest);
            assertThat(table.text(row, "to")).isEqualTo(dates.get(419));
            assertThat(table.number(row, "bars")).isEqualTo(419 - dates.indexOf(latest));
        }
    }

    @Test
    void aLateOrFailingCompanionChangesTheWindowButNoDigest() {
        job.with("gone.yaml", mixture("Gone", 100).with("prices", "{stocks: {csv: nowhere.csv}}"));
        job.compare("alone", "early.yaml");
        job.compare("with-late", "early.yaml", "late.yaml");
        job.compare("with-failing", "early.yaml", "gone.yaml");
        String alone = job.digests("alone").get("early");
        assertThat(alone).matches("[0-9a-f]{64}");
        assertThat(job.digests("with-late")).containsEntry("early", alone);
        assertThat(job.digests("with-failing")).isEqualTo(Map.of("early", alone));
        assertThat(job.text("results/with-late/early/path.csv")).isEqualTo(job.text("results/alone/early/path.csv"));
        assertThat(from("with-failing", "early")).isEqualTo(from("alone", "early"));
        assertThat(from("with-late", "early")).isGreaterThan(from("alone", "early"));
    }

    @Test
    void theOrderOfTheFilesChangesNothing() {
        job.with("a-gone.yaml", mixture("A gone", 100).with("prices", "{stocks: {csv: nowhere.csv}}"))
                .with("z-gone.yaml", mixture("Z gone", 100).with("prices", "{stocks: {csv: nowhere.csv}}"));
        job.compare("one-way", "early.yaml", "late.yaml", "a-gone.yaml", "z-gone.yaml");
        job.compare("other-way", "z-gone.yaml", "late.yaml", "a-gone.yaml", "early.yaml");
        assertThat(job.text("results/other-way/comparison.csv")).isEqualTo(job.text("results/one-way/comparison.csv"));
        assertThat(job.record("other-way").get("digest"))
                .isEqualTo(job.record("one-way").get("digest"));
    }

    @Test
    void aStatedWindowIsKeptToWhatTheVariantTraded() {
        job.with("stated.yaml", judged("Stated", "{from: 2003-09-06, to: 2004-02-01}"))
                .with("wide.yaml", judged("Wide", "{from: 1990-01-01, to: 2090-01-01}"));
        job.compare("stated", "stated.yaml", "wide.yaml");
        // 6 September 2003 and 1 February 2004 are a Saturday and a Sunday: the base is the next close, the end the one
        // before
        assertThat(from("stated", "stated")).isEqualTo("2003-09-08");
        assertThat(to("stated", "stated")).isEqualTo("2004-01-30");
        assertThat(from("stated", "wide"))
                .isEqualTo(job.table("stated/wide/trades.csv").text(0, "filled_on"));
        assertThat(to("stated", "wide")).isEqualTo(lastDate());
        assertThat(job.record("stated").get("warnings").toString()).contains("2 different windows");
    }

    @Test
    void aWindowWithoutABarIsAFailureWithItsReason() {
        job.with("after.yaml", judged("After", "{from: 2050-01-01}"))
                .with("before.yaml", judged("Before", "{to: 2003-02-01}"))
                .with("last.yaml", judged("Last", "{from: " + lastDate() + "}"));
        JobFolder.Ran ran = job.compare("empty", "after.yaml", "before.yaml", "last.yaml", "early.yaml");
        assertThat(ran.code()).isZero();
        WrittenTable table = job.table("empty/comparison.csv");
        for (String variant : List.of("after", "before", "last")) {
            int row = table.row("variant", variant);
            assertThat(table.text(row, "outcome")).isEqualTo("failed");
            assertThat(table.text(row, "reason")).contains("holds no bar").contains("judge.window");
            assertThat(table.text(row, "bars")).isEmpty();
        }
        assertThat(table.text(table.row("variant", "early"), "outcome")).isEqualTo("ran");
    }

    @Test
    void eachPriceSetHasItsOwnWindow() {
        job.with("gold.csv", DrawnPrices.csv(42, 330, LocalDate.of(2004, 1, 1)))
                .with("gold.yaml", mixture("Gold", 100).with("prices", "{stocks: {csv: gold.csv}}"));
        job.compare("sets", "early.yaml", "late.yaml", "gold.yaml");
        job.compare("two", "early.yaml", "late.yaml");
        assertThat(from("sets", "early")).isEqualTo(from("two", "early"));
        assertThat(to("sets", "early")).isEqualTo(to("two", "early"));
        assertThat(from("sets", "gold"))
                .isEqualTo(job.table("sets/gold/trades.csv").text(0, "filled_on"));
        assertThat(to("sets", "gold")).isGreaterThan(to("sets", "early"));
        WrittenTable table = job.table("sets/comparison.csv");
        assertThat(table.texts("variant")).contains("buy_and_hold of gold");
    }

    @Test
    void anotherMeaningOfDoingNothingOnTheSamePricesSharesTheWindow() {
        job.with("half.yaml", mixture("Half", 100).with("judge", "{buy-and-hold: {stocks: 0.5}}"));
        job.compare("meanings", "half.yaml", "late.yaml");
        assertThat(from("meanings", "half")).isEqualTo(from("meanings", "late"));
    }

    @Test
    void aLongerCalendarOfTheSamePricesIsJudgedOverTheCommonDates() {
        String bonds = DrawnPrices.csv(43, 400, START);
        job.with("bonds.csv", bonds)
                .with(
                        "pair.yaml",
                        mixture("Pair", 100)
                                .with("prices", "{stocks: {csv: stocks.csv}, bonds: {csv: bonds.csv}}")
                                .with("allocate", "{table: {weights: {calm: {stocks: 1.0}, stormy: {bonds: 0.5}}}}"));
        job.compare("calendars", "early.yaml", "pair.yaml");
        String end = bonds.lines().skip(400).findFirst().orElseThrow().substring(0, 10);
        assertThat(to("calendars", "pair")).isEqualTo(end);
        assertThat(to("calendars", "early")).isEqualTo(end);
    }

    @Test
    void noFigureOfAPathRestsOnLaterPrices() {
        job.with("chain.yaml", StrategyText.named("Chain").with("refit", "{first-fit-after: 120, every: 60, seed: 1}"));
        job.compare("whole", "chain.yaml");
        String whole = job.text("results/whole/chain/path.csv");
        job.with("stocks.csv", DrawnPrices.first(job.text("stocks.csv"), 300));
        job.compare("cut", "chain.yaml");
        String cut = job.text("results/cut/chain/path.csv");
        assertThat(cut.lines().count())
                .isGreaterThan(100)
                .isLessThan(whole.lines().count());
        assertThat(whole).startsWith(cut);
    }

    private static StrategyText judged(String name, String window) {
        return mixture(name, 100).with("judge", "{buy-and-hold: {stocks: 1.0}, window: " + window + "}");
    }

    private String lastDate() {
        List<String> dates = WrittenTable.read(job.path("stocks.csv")).texts("date");
        return dates.get(dates.size() - 1);
    }

    private String from(String result, String variant) {
        WrittenTable table = job.table(result + "/comparison.csv");
        return table.text(table.row("variant", variant), "from");
    }

    private String to(String result, String variant) {
        WrittenTable table = job.table(result + "/comparison.csv");
        return table.text(table.row("variant", variant), "to");
    }
}
