package sojourn.job;

import static org.assertj.core.api.Assertions.assertThat;

import com.fasterxml.jackson.databind.JsonNode;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Tipping returns against the files themselves: a row appended at such a return, and the command run again. */
class TippingReturnsTest {
    private static final LocalDate START = LocalDate.of(2010, 1, 4);
    private static final double BESIDE = 1e-6;
    private static final String DECLARED = "parameters: {fixed: {initial: [0.9, 0.1], transition: [[0.98, 0.02],"
            + " [0.02, 0.98]], mean: [0, 0], sd: [0.006, 0.022]}}";
    private static final String SWITCH =
            "{switch: {regime: stormy, leave-above: 0.6, re-enter-below: 0.4, in: {stocks: 1},"
                    + " out: {stocks: 0.2}}}";
    private static final String BLEND =
            "{blend: {probability: predicted, weights: {calm: {stocks: 1}, stormy: {stocks: 0}}}}";
    private static final String TARGET = "{volatility-target: {of: {stocks: 1}, percent-per-year: 12}}";
    private static final String RETURN = "observe: [{log-return: stocks}]";

    @TempDir
    private Path temporary;

    private JobFolder folder;
    private final List<String> candles = new ArrayList<>();

    @BeforeEach
    void begin() {
        folder = new JobFolder(temporary);
    }

    private void prepare(int rows, String regimes, String rule) {
        candles.add("date,open,high,low,close");
        double last = 100;
        for (String line : DrawnPrices.csv(3, rows, START).lines().skip(1).toList()) {
            double close = Double.parseDouble(line.substring(11));
            double above = 1 + 0.004 * ((candles.size() * 7) % 10) / 10.0; // made-up ranges around open and close
            candles.add(row(line.substring(0, 10), last, close, above));
            last = close;
        }
        folder.with("stocks.csv", String.join("\n", candles) + "\n")
                .with(
                        "rule.yaml",
                        StrategyText.named("Rule")
                                .with("regimes", "{" + regimes + ", states: [calm, stormy]}")
                                .with("allocate", rule)
                                .with("trade", "{no-trade-band: 0.05}"));
    }

    private static String row(String date, double open, double close, double above) {
        return date + "," + open + "," + above * Math.max(open, close) + "," + Math.min(open, close) / above + ","
                + close;
    }

    private JsonNode latest() {
        JobFolder.Ran ran = JobFolder.shell("latest", folder.path("rule.yaml").toString(), "--json", "--quiet");
        assertThat(ran.code()).as(ran.err()).isZero();
        return JobFolder.parsed(ran.out());
    }

    /** Whether the file with one row more orders something else than stood before. */
    private boolean tips(JsonNode before, double simpleReturn) {
        double last = before.get("forecast").get("stocks").get("last_close").asDouble();
        List<String> longer = new ArrayList<>(candles);
        longer.add(row(before.get("next_bar").asText(), last, last * (1 + simpleReturn), 1));
        folder.with("stocks.csv", String.join("\n", longer) + "\n");
        JsonNode after = latest().get("decision");
        assertThat(latest().get("as_of")).isEqualTo(before.get("next_bar"));
        return after.get("kind").asText().equals("order");
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', textBlock = """
                    declared, switch        | 350 | declared  | switch
                    declared, blend         | 350 | declared  | blend
                    fitted, between fits    | 350 | fitted    | switch
                    fitted, on a fit bar    | 300 | fitted    | switch
                    fitted, volatility      | 350 | fitted    | target
                    ranges                  | 350 | ranges    | switch
                    threshold               | 350 | threshold | switch
                    jump                    | 350 | jump      | switch
                    """)
    void aRowAppendedBesideATippingReturnDecidesAsItsSideSays(String name, int rows, String regimes, String rule) {
        prepare(rows, regimes(regimes), rule.equals("switch") ? SWITCH : rule.equals("blend") ? BLEND : TARGET);
        JsonNode before = latest();
        JsonNode borders = before.get("tipping").get("stocks").get("borders");
        assertThat(borders).as(before.toPrettyString()).isNotEmpty();
        assertThat(before.get("refit_at_next_bar").asText()).isEqualTo(rows == 300 ? "made" : "not-due");
        for (JsonNode border : borders) {
            boolean below = border.get("tips").asText().equals("below");
            double at = border.get("return").asDouble();
            assertThat(tips(before, at - BESIDE))
                    .as("%s just below %s", name, at)
                    .isEqualTo(below);
            assertThat(tips(before, at + BESIDE))
                    .as("%s just above %s", name, at)
                    .isEqualTo(!below);
        }
    }

    private static String regimes(String kind) {
        return switch (kind) {
            case "declared" -> RETURN + ", " + DECLARED;
            case "ranges" -> "observe: [{log-parkinson-volatility: stocks}]";
            case "threshold" ->
                "model: volatility-threshold, threshold: {volatility: {ewma: 0.94}, storm-above: 0.8, calm-below: 0.6}, "
                        + RETURN;
            case "jump" -> "model: jump, penalty: 6, observe: [{absolute-return: stocks}]";
            default -> RETURN;
        };
    }

    @Test
    void theIntervalsAreThoseOfABruteForceScan() {
        prepare(350, regimes("declared"), SWITCH);
        JsonNode before = latest();
        JsonNode unchanged = before.get("tipping").get("stocks").get("unchanged");
        for (double r = -0.09; r < 0.09; r += 0.0037) {
            boolean calm = false;
            for (JsonNode interval : unchanged) {
                calm |= interval.get("from").asDouble() < r
                        && r < interval.get("to").asDouble();
            }
            assertThat(tips(before, r)).as("at %s", r).isEqualTo(!calm);
        }
    }

    /**
     * The same far finer than any grid, by Bayes' rule at each return: with declared parameters the posterior of stormy needs what is
     * predicted and two normal densities alone, and the rule, which is in, leaves from 0.6 on.
     */
    @Test
    void theIntervalsAreThoseOfBayesRuleAtEveryHundredthOfAThousandth() {
        prepare(350, regimes("declared"), SWITCH);
        JsonNode before = latest();
        assertThat(before.at("/decision/because").asText()).contains("stays in");
        double calm = before.at("/regime/predicted/calm").asDouble();
        double stormy = before.at("/regime/predicted/stormy").asDouble();
        JsonNode unchanged = before.at("/tipping/stocks/unchanged");
        assertThat(unchanged).isNotEmpty();
        int tipping = 0;
        for (int i = -24_999; i < 25_000; i++) {
            double r = i * 1e-5 + 3e-7; // beside round numbers, where a search may have looked
            double x = Math.log(1 + r);
            double weightCalm = calm * Math.exp(-x * x / (2 * 0.006 * 0.006)) / 0.006;
            double weightStormy = stormy * Math.exp(-x * x / (2 * 0.022 * 0.022)) / 0.022;
            boolean stays = false;
            for (JsonNode interval : unchanged) {
                stays |= interval.get("from").asDouble() < r
                        && r < interval.get("to").asDouble();
            }
            boolean tips = weightStormy / (weightCalm + weightStormy) >= 0.6;
            tipping += tips ? 1 : 0;
            assertThat(stays).as("at %s", r).isEqualTo(!tips);
        }
        assertThat(tipping).as("returns that tip").isBetween(1, 49_998);
    }

    @Test
    void ofTwoSeriesOneMovesAndTheOtherReturnsItsForecast() {
        String stocks = DrawnPrices.csv(3, 350, START);
        String bonds = DrawnPrices.csv(9, 350, START);
        folder.with("stocks.csv", stocks).with("bonds.csv", bonds);
        folder.with(
                "rule.yaml",
                StrategyText.named("Rule")
                        .with("prices", "{stocks: {csv: stocks.csv}, bonds: {csv: bonds.csv}}")
                        .with(
                                "regimes",
                                "{observe: [{log-return: stocks}, {log-return: bonds}], states: [calm, stormy]}"));
        JsonNode before = latest();
        for (String moved : List.of("stocks", "bonds")) {
            JsonNode borders = before.get("tipping").get(moved).get("borders");
            assertThat(borders).as(before.toPrettyString()).isNotEmpty();
            for (JsonNode border : borders) {
                for (double beside : new double[] {-BESIDE, BESIDE}) {
                    double at = border.get("return").asDouble() + beside;
                    folder.with("stocks.csv", stocks + next(before, "stocks", moved, at));
                    folder.with("bonds.csv", bonds + next(before, "bonds", moved, at));
                    boolean tips = latest().get("decision").get("kind").asText().equals("order");
                    boolean below = border.get("tips").asText().equals("below");
                    assertThat(tips).as("%s %s", moved, at).isEqualTo(beside < 0 == below);
                }
            }
            folder.with("stocks.csv", stocks).with("bonds.csv", bonds);
        }
    }

    private static String next(JsonNode before, String asset, String moved, double simpleReturn) {
        JsonNode forecast = before.get("forecast").get(asset);
        double by = asset.equals(moved) ? simpleReturn : forecast.get("mean").asDouble();
        return before.get("next_bar").asText() + ","
                + forecast.get("last_close").asDouble() * (1 + by) + "\n";
    }

    @Test
    void aRefitThatTakesTooLongToRepeatIsLeftOutAndSaidSo() {
        prepare(700, RETURN, SWITCH);
        folder.with(
                "rule.yaml",
                StrategyText.named("Rule").with("refit", "{first-fit-after: 500, every: 100, starts: 100, seed: 7}"));
        assertThat(latest().get("refit_at_next_bar").asText()).isEqualTo("parameters-frozen");
        JobFolder.Ran ran = JobFolder.shell("latest", folder.path("rule.yaml").toString());
        assertThat(ran.out().replaceAll("\\s+", " "))
                .contains("The next bar is one to fit at.")
                .contains("A fit is due then and was not made: parameters frozen.");
    }
}
