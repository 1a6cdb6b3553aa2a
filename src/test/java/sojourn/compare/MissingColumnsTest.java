package sojourn.compare;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import sojourn.document.Problem;
import sojourn.document.Problems;
import sojourn.strategy.StrategyFile;
import sojourn.strategy.StrategyReader;

/** Observations that read more than closes, and files that have no more. */
class MissingColumnsTest {
    @TempDir
    private Path folder;

    @Test
    void aRangeOfAFileOfClosesIsRefusedWithEveryColumnThatIsWanting() throws IOException {
        Prepared prepared = prepared("date,close,low\n2001-01-01,100,99\n2001-01-02,101,99\n");
        assertThat(((Prepared.Unreadable) prepared).problems())
                .extracting(Problem::toString)
                .containsExactly(
                        "stocks.csv:1:1: stocks has no open on any bar, and log-garman-klass-volatility cannot be computed"
                                + " without; name the column under prices (open: ...), or observe something else",
                        "stocks.csv:1:1: stocks has no high on any bar, and log-garman-klass-volatility cannot be computed"
                                + " without; name the column under prices (high: ...), or observe something else");
    }

    @Test
    void oneBarWithAllPricesIsEnoughToBegin() throws IOException {
        assertThat(prepared("date,open,high,low,close\n2001-01-01,,,,100\n2001-01-02,100,102,99,101\n"))
                .isInstanceOf(Prepared.Ready.class);
    }

    @Test
    void impactOnAFileWithoutVolumesIsRefused() throws IOException {
        String rule = "trade: {costs: {impact: {coefficient: 1}}}";
        String rows = "date,open,high,low,close,volume\n2001-01-01,99,101,98,100,\n2001-01-02,100,102,99,101,";
        Prepared refused = prepared(rows + "\n", rule);
        assertThat(((Prepared.Unreadable) refused).problems())
                .extracting(Problem::toString)
                .containsExactly(
                        "stocks.csv:1:1: stocks has no volume on any bar, and impact needs it; name the column under"
                                + " prices (volume: ...), or trade without impact");
        assertThat(prepared(rows + "5000\n", rule)).isInstanceOf(Prepared.Ready.class);
    }

    @Test
    void fillingAtOpensOfAFileWithoutThemIsRefused() throws IOException {
        String rows = "date,open,high,low,close\n2001-01-01,,101,98,100\n2001-01-02,,102,99,101\n";
        assertThat(((Prepared.Unreadable) prepared(rows, "trade: {fill: next-open}")).problems())
                .extracting(Problem::toString)
                .contains(
                        "stocks.csv:1:1: stocks has no open on any bar, and fill: next-open needs it; name the column under"
                                + " prices (open: ...), or trade without fill: next-open");
    }

    @Test
    void opensThatMayBelongToOtherClosesAreRefused() throws IOException {
        String rows =
                "date,open,high,low,close,total,first\n2001-01-01,99,101,98,100,50,49\n2001-01-02,100,102,99,101,51,50\n";
        String open = "trade: {fill: next-open}";
        assertThat(((Prepared.Unreadable) prepared(rows, open, "close: total")).problems())
                .extracting(Problem::toString)
                .containsExactly(
                        "stocks.csv:1:1: closes of stocks are read from total, its opens from a column that is not named, and"
                                + " log-garman-klass-volatility needs both on one scale; name the column of opens that belong to"
                                + " these closes under prices (open: ...), or observe something else",
                        "stocks.csv:1:1: closes of stocks are read from total, its opens from a column that is not named, and"
                                + " fill: next-open needs both on one scale; name the column of opens that belong to these closes"
                                + " under prices (open: ...), or trade without fill: next-open");
        assertThat(prepared(rows, open, "close: total, open: first")).isInstanceOf(Prepared.Ready.class);
        assertThat(prepared(rows, open, "open: open")).isInstanceOf(Prepared.Ready.class);
    }

    /** Opens of 100 beside closes of 50 and 51, by hand: twice the close before, whatever the columns are called. */
    @Test
    void opensFarFromTheClosesBeforeAreRefused() throws IOException {
        String rows = "date,open,high,low,close,total\n2001-01-01,99,101,98,100,50\n2001-01-02,100,102,99,101,51\n";
        assertThat(((Prepared.Unreadable) prepared(rows, "trade: {fill: next-open}", "close: total, open: open"))
                        .problems())
                .extracting(Problem::toString)
                .anyMatch(
                        text -> text.startsWith(
                                "stocks.csv:1:1: opens of stocks lie 100.0 % from the close before on the"
                                        + " median bar, while closes move 2.0 %: they are on different scales, and fill: next-open needs both"));
    }

    private Prepared prepared(String prices) throws IOException {
        return prepared(prices, "");
    }

    private Prepared prepared(String prices, String trade) throws IOException {
        return prepared(prices, trade, "close: close");
    }

    private Prepared prepared(String prices, String trade, String columns) throws IOException {
        Files.writeString(folder.resolve("stocks.csv"), prices);
        Problems problems = new Problems();
        Optional<StrategyFile> file =
                StrategyReader.parse("""
                strategy: Storms by the range
                prices: {stocks: {csv: stocks.csv, COLUMNS}}
                regimes: {observe: [{log-garman-klass-volatility: stocks}], states: [calm, stormy]}
                refit: {first-fit-after: 100, every: 50, seed: 7}
                allocate: {blend: {weights: {calm: {stocks: 1}, stormy: {stocks: 0}}}}
                judge: {buy-and-hold: {stocks: 1}}
                """.replace("COLUMNS", columns) + trade, folder, "strategy.yaml", problems);
        assertThat(problems.list()).isEmpty();
        return Prepared.of(file.orElseThrow());
    }
}
