package sojourn.job;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.function.IntFunction;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * Series that no regime model can be fitted to, or hardly: each costs its own variant a row with a reason in plain words, names the
 * regime or the series, and writes no number that is none.
 */
class UnfittableSeriesTest {
    private static final LocalDate START = LocalDate.of(2003, 1, 1);
    private static final String REFIT = "{first-fit-after: 100, every: 100, starts: 3, seed: 7}";
    private static final String TWO_SERIES =
            "{observe: [{log-return: stocks}, {log-return: other}], states: [calm, stormy]}";

    @TempDir
    Path temp;

    private static List<String> closes(int bars, IntFunction<String> close) {
        List<String> closes = new ArrayList<>();
        for (int bar = 0; bar < bars; bar++) {
            closes.add(close.apply(bar));
        }
        return closes;
    }

    private static StrategyText on(String name, String csv) {
        return StrategyText.named(name)
                .with("prices", "{stocks: {csv: " + csv + "}}")
                .with("refit", REFIT);
    }

    private static StrategyText onTwo(String name, String other) {
        return StrategyText.named(name)
                .with("prices", "{stocks: {csv: stocks.csv}, other: {csv: " + other + "}}")
                .with("regimes", TWO_SERIES)
                .with("refit", REFIT);
    }

    @Test
    void eachIsARowWithItsReasonAndTheBatchGoesOn() {
        String drawn = DrawnPrices.csv(51, 460, START);
        JobFolder job = new JobFolder(temp)
                .with("stocks.csv", drawn)
                .with("twin.csv", drawn)
                .with("constant.csv", DrawnPrices.csv(Collections.nCopies(460, "50"), START))
                .with("two-values.csv", DrawnPrices.csv(closes(460, bar -> bar % 2 == 0 ? "100" : "110"), START))
                .with("three-values.csv", DrawnPrices.csv(closes(460, bar -> bar / 5 % 2 == 0 ? "100" : "110"), START))
                .with("outlier.csv", leapt(drawn))
                .with("brief.csv", DrawnPrices.csv(53, 38, START))
                .with("sound.yaml", on("Sound", "stocks.csv"))
                .with("constant.yaml", on("Constant", "constant.csv"))
                .with("two-values.yaml", on("Two values", "two-values.csv"))
                .with("three-values.yaml", on("Three values", "three-values.csv"))
                .with("outlier.yaml", on("Outlier", "outlier.csv"))
                .with("four-states.yaml", fourStates())
                .with("twins.yaml", onTwo("Twins", "twin.csv"))
                .with("one-constant.yaml", onTwo("One constant", "constant.csv"))
                .with("never-known.yaml", neverKnown());
        JobFolder.Ran ran = job.compare(
                "odd",
                "sound.yaml",
                "constant.yaml",
                "two-values.yaml",
                "three-values.yaml",
                "outlier.yaml",
                "four-states.yaml",
                "twins.yaml",
                "one-constant.yaml",
                "never-known.yaml");
        assertThat(ran.code()).as(ran.err()).isZero();
        assertThat(ran.out() + ran.err()).doesNotContain("fault of the program", "NaN", "Infinity");
        WrittenTable table = job.table("odd/comparison.csv");
        assertThat(table.text(table.row("variant", "sound"), "outcome")).isEqualTo("ran");
        assertThat(table.text(table.row("variant", "outlier"), "outcome")).isEqualTo("ran");
        assertThat(reason(table, "constant")).contains("failed (all observations of the window are equal)");
        assertThat(reason(table, "two-values")).contains("degenerate (all").contains("of 400 observations");
        assertThat(reason(table, "three-values"))
                .contains("degenerate (all")
                .containsAnyOf("calm closed in on a single value", "stormy closed in on a single value");
        assertThat(reason(table, "four-states"))
                .contains("failed (the window holds 20 observations; 4 states with 23 parameters need at least 24)");
        assertThat(reason(table, "twins")).contains("the observed series move together exactly");
        assertThat(reason(table, "one-constant"))
                .contains("failed (all observations of log-return of other in the window are equal)");
        assertThat(reason(table, "never-known"))
                .contains("failed (the window holds 0 observations of log-return of other, known 5000 bars late");
        job.files("results/odd")
                .forEach((name, text) -> assertThat(text)
                        .as(name)
                        .doesNotContain("NaN")
                        .doesNotContain("Infinity")
                        .doesNotContain("{0}", "{1}", "[0]", "[1]"));
        assertThat(job.names("results/odd/timelines")).hasSize(2 * 9);
    }

    private static StrategyText fourStates() {
        return on("Four states", "brief.csv")
                .with("regimes", "{observe: [{log-return: stocks}], states: [calm, stormy, wild, mad]}")
                .with("refit", "{first-fit-after: 20, every: 20, starts: 2, seed: 7}");
    }

    private static StrategyText neverKnown() {
        return onTwo("Never known", "twin.csv")
                .with(
                        "regimes",
                        "{observe: [{log-return: stocks}, {log-return: {of: other, known-after: 5000}}],"
                                + " states: [calm, stormy]}");
    }

    /** The same closes, with a single return of about fifty standard deviations: a day on which the price doubles. */
    private static String leapt(String csv) {
        StringBuilder changed = new StringBuilder();
        int row = 0;
        for (String line : csv.split("\n", -1)) {
            String[] cells = line.split(",", -1);
            boolean after = row++ > 250 && cells.length > 1;
            changed.append(after ? cells[0] + "," + 2 * Double.parseDouble(cells[1]) : line)
                    .append('\n');
        }
        return changed.toString().stripTrailing() + "\n";
    }

    private static String reason(WrittenTable table, String variant) {
        int row = table.row("variant", variant);
        assertThat(table.text(row, "outcome")).as(variant).isEqualTo("failed");
        return table.text(row, "reason");
    }
}
