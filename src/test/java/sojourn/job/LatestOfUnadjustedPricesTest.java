package sojourn.job;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * {@code latest}, {@code trace} and seals of a file with dividends and splits: what is printed and kept is what the file says, what
 * is decided is what a file of total-return closes decides. The unadjusted file is made from the other by hand: halved from the
 * split on, each dividend taken off the closes from its day on.
 */
class LatestOfUnadjustedPricesTest {
    private static final int SPLIT_AT = 120;
    private static final int DIVIDEND_EVERY = 40;
    private static final double DIVIDEND = 1.25;
    private static final double ROUNDING = 1e-9;

    @TempDir
    private Path temporary;

    private JobFolder folder;
    private final List<String> dates = new ArrayList<>();
    private final List<Double> quoted = new ArrayList<>();
    private final List<Double> returns = new ArrayList<>();

    @BeforeEach
    void prepare() {
        folder = new JobFolder(temporary);
        List<String> whole = DrawnPrices.csv(3, 350, LocalDate.of(2010, 1, 4))
                .lines()
                .skip(1)
                .toList();
        StringBuilder raw = new StringBuilder("date,close,dividend,split\n");
        StringBuilder total = new StringBuilder("date,close\n");
        double before = 0;
        double close = 0;
        double index = 0;
        for (int bar = 0; bar < whole.size(); bar++) {
            double drawn = Double.parseDouble(whole.get(bar).substring(11));
            double split = bar == SPLIT_AT ? 2 : 1;
            double dividend = bar > 0 && bar % DIVIDEND_EVERY == 0 ? DIVIDEND : 0;
            double gain = bar == 0 ? 0 : drawn / before - 1;
            close = bar == 0
                    ? drawn
                    : close * (1 + gain) / split - dividend; // so that split (close + dividend) / before = 1 + gain
            index = bar == 0 ? drawn : index * (1 + gain);
            before = drawn;
            dates.add(whole.get(bar).substring(0, 10));
            quoted.add(close);
            returns.add(gain);
            raw.append(dates.get(bar)).append(',').append(close).append(',').append(dividend);
            raw.append(',').append(split).append('\n');
            total.append(dates.get(bar)).append(',').append(index).append('\n');
        }
        folder.with("raw.csv", raw.toString()).with("total.csv", total.toString());
        strategy("raw", "{csv: raw.csv, dividend: dividend, split: split}");
        strategy("total", "{csv: total.csv}");
    }

    private void strategy(String name, String prices) {
        folder.with(
                name + ".yaml",
                StrategyText.named("Rule")
                        .with("prices", "{stocks: " + prices + "}")
                        .with("trade", "{no-trade-band: 0.05}"));
    }

    private JobFolder.Ran run(String command, String name, String... more) {
        List<String> arguments = new ArrayList<>(List.of(
                command,
                folder.path(name + ".yaml").toString(),
                "--quiet",
                "--results",
                folder.path("results").toString()));
        arguments.addAll(Arrays.asList(more));
        return JobFolder.shell(arguments.toArray(String[]::new));
    }

    private JsonNode json(String command, String name, String... more) {
        List<String> arguments = new ArrayList<>(Arrays.asList(more));
        arguments.add("--json");
        JobFolder.Ran ran = run(command, name, arguments.toArray(String[]::new));
        assertThat(ran.code()).as(ran.err()).isZero();
        return JobFolder.parsed(ran.out());
    }

    @Test
    void theLastCloseIsTheQuotedOneAndTheRestIsThatOfTotalReturns() {
        JsonNode raw = json("latest", "raw");
        JsonNode total = json("latest", "total");
        assertThat(raw.at("/forecast/stocks/last_close").asDouble()).isEqualTo(quoted.get(349));
        for (String same :
                List.of("/forecast/stocks/mean", "/decision/probability/stormy", "/decision/target/stocks")) {
            assertThat(raw.at(same).asDouble())
                    .as(same)
                    .isCloseTo(total.at(same).asDouble(), within(1e-6)); // fits stop early
        }
        JsonNode borders = raw.at("/tipping/stocks/borders");
        assertThat(borders).isNotEmpty();
        for (int i = 0; i < borders.size(); i++) {
            assertThat(borders.get(i).get("return").asDouble())
                    .isCloseTo(
                            total.at("/tipping/stocks/borders")
                                    .get(i)
                                    .get("return")
                                    .asDouble(),
                            within(1e-5));
        }
        JsonNode border = borders.get(0);
        boolean below = border.get("tips").asText().equals("below");
        String file = folder.text("raw.csv");
        for (double beside : new double[] {-1e-6, 1e-6}) {
            double next = quoted.get(349) * (1 + border.get("return").asDouble() + beside);
            folder.with("raw.csv", file + raw.get("next_bar").asText() + "," + next + ",0,1\n");
            assertThat(json("latest", "raw").at("/decision/kind").asText().equals("order"))
                    .isEqualTo(beside < 0 == below);
        }
    }

    @Test
    void traceShowsWhatTheFileSaysAndTheReturnTakenFromIt() {
        int both = 3 * DIVIDEND_EVERY; // the split's day too
        assertThat(both).isEqualTo(SPLIT_AT);
        JsonNode prices = json("trace", "raw", "--date", dates.get(both)).at("/prices/stocks");
        assertThat(prices.get("close").asDouble()).isEqualTo(quoted.get(both));
        assertThat(prices.get("close_before").asDouble()).isEqualTo(quoted.get(both - 1));
        assertThat(prices.get("dividend").asDouble()).isEqualTo(DIVIDEND);
        assertThat(prices.get("split").asDouble()).isEqualTo(2);
        assertThat(prices.get("return").asDouble()).isCloseTo(returns.get(both), within(ROUNDING));
        String text = run("trace", "raw", "--date", dates.get(both)).out().replaceAll("\\s+", " ");
        assertThat(text).contains("dividend 1.25, split 2.0; return ");
    }

    @Test
    void cashCanBeAddedUpFromTheTraceAlone() {
        int checked = 0;
        for (int bar : new int[] {240, 241, 280, 320, 349}) {
            JsonNode found = json("trace", "raw", "--date", dates.get(bar));
            if (!found.at("/money/cash_before").isMissingNode()) {
                double cash = found.at("/money/cash_before").asDouble();
                for (JsonNode entry : found.get("ledger")) {
                    cash += entry.get("amount").asDouble();
                    checked += entry.get("kind").asText().equals("dividend") ? 1 : 0;
                }
                assertThat(cash)
                        .as("bar %s", bar)
                        .isCloseTo(found.at("/money/cash").asDouble(), within(1e-6));
            }
        }
        assertThat(checked).as("dividends met").isPositive();
        assertThat(run("trace", "raw", "--date", dates.get(280)).out()).contains("cash before", "dividend of stocks");
    }

    @Test
    void aSealKeepsQuotedPricesSoThatOneChangedDividendIsOneChangedCell() {
        assertThat(run("latest", "raw", "--seal").code()).isZero();
        String name = folder.names("results/seals/raw").get(0);
        JsonNode rows = folder.json("results/seals/raw/" + name).get("rows");
        assertThat(rows.get("columns").toString())
                .isEqualTo("[\"stocks.close\",\"stocks.dividend\",\"stocks.split\",\"cash.rate_a_bar\"]");
        String[] cells = rows.at("/new_or_changed/" + dates.get(200)).asText().split(",", -1);
        assertThat(Double.parseDouble(cells[0])).isEqualTo(quoted.get(200));
        assertThat(Double.parseDouble(cells[1])).isEqualTo(DIVIDEND);
        String row = dates.get(200) + "," + quoted.get(200) + ",";
        folder.with("raw.csv", folder.text("raw.csv").replace(row + "1.25", row + "1.5"));
        JsonNode told =
                json3("--verify", folder.path("results/seals/raw/" + name).toString());
        assertThat(told.get("changed_rows")).hasSize(1);
        assertThat(told.at("/changed_rows/0/column").asText()).isEqualTo("stocks.dividend");
        assertThat(told.at("/changed_rows/0/sealed").asText()).isEqualTo("1.25");
        assertThat(told.at("/changed_rows/0/now").asText()).isEqualTo("1.5");
    }

    private JsonNode json3(String... more) {
        List<String> arguments = new ArrayList<>(Arrays.asList(more));
        arguments.add("--json");
        JobFolder.Ran ran = run("latest", "raw", arguments.toArray(String[]::new));
        assertThat(ran.code()).as(ran.err()).isEqualTo(3);
        return JobFolder.parsed(ran.out());
    }
}
