package sojourn.job;

import static org.assertj.core.api.Assertions.assertThat;

import com.fasterxml.jackson.databind.JsonNode;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** On files cut at t {@code latest} says what a comparison of the whole files decided at t: target, order, reason, and which orders wait. */
class LatestAgainstComparisonTest {
    private static final String PRICES = DrawnPrices.csv(5, 420, LocalDate.of(2010, 1, 4));

    @TempDir
    private Path temporary;

    @ParameterizedTest
    @ValueSource(
            strings = {
                "{switch: {regime: stormy, leave-above: 0.6, re-enter-below: 0.4, in: {stocks: 1}, out: {stocks: 0.2}}}",
                "{table: {confirm: 2, weights: {calm: {stocks: 0.9}, stormy: {stocks: 0.1}}}}",
                "{blend: {smooth: {half-life: 3}, weights: {calm: {stocks: 1}, stormy: {stocks: 0}}}}",
                "{volatility-target: {of: {stocks: 1}, percent-per-year: 12, step-toward: 0.5}}"
            })
    void theDecisionOfEachCutIsThatOfTheWhole(String rule) {
        JobFolder folder = new JobFolder(temporary)
                .with("stocks.csv", PRICES)
                .with(
                        "rule.yaml",
                        StrategyText.named("Rule")
                                .with("allocate", rule)
                                .with("trade", "{no-trade-band: 0.03, delay: 2}"));
        folder.compare("all", "rule.yaml");
        WrittenTable path = folder.table("all/rule/path.csv");
        WrittenTable trades = folder.table("all/rule/trades.csv");
        List<String> decided = trades.texts("decided_on");
        List<Integer> rows = new ArrayList<>(List.of(0, 1, 2, 50, 99, 100, 101, 150, 199, 200));
        decided.stream().limit(12).forEach(date -> {
            rows.add(path.row("date", date));
            rows.add(path.row("date", date) + 1);
        });
        int waited = 0;
        for (int row : rows) {
            String date = path.text(row, "date");
            folder.with("stocks.csv", upTo(date));
            JobFolder.Ran ran =
                    JobFolder.shell("latest", folder.path("rule.yaml").toString(), "--json", "--quiet");
            assertThat(ran.code()).as(ran.err()).isZero();
            JsonNode found = JobFolder.parsed(ran.out());
            assertThat(found.get("as_of").asText()).isEqualTo(date);
            JsonNode decision = found.get("decision");
            assertThat(decision.get("target").get("stocks").asDouble()).isEqualTo(path.number(row, "target.stocks"));
            assertThat(decision.get("probability").get("stormy").asDouble())
                    .isEqualTo(path.number(row, "probability.stormy"));
            assertThat(decision.get("kind").asText()).isEqualTo(decided.contains(date) ? "order" : "keep");
            if (decided.contains(date)) {
                assertThat(decision.get("because").asText()).isEqualTo(trades.text(decided.indexOf(date), "because"));
            }
            List<String> waiting = waiting(trades, date);
            JsonNode orders = decision.get("orders");
            assertThat(orders).as("orders waiting at %s", date).hasSize(waiting.size());
            for (int i = 0; i < waiting.size(); i++) {
                JsonNode order = orders.get(i);
                int at = path.row("date", waiting.get(i));
                assertThat(order.get("decided_on").asText()).isEqualTo(waiting.get(i));
                assertThat(order.get("target").get("stocks").asDouble()).isEqualTo(path.number(at, "target.stocks"));
                assertThat(order.get("bars_to_fill").asInt()).isEqualTo(at + 3 - row); // next close, and two bars more
                waited += waiting.get(i).equals(date) ? 0 : 1;
            }
        }
        assertThat(waited).as("orders found waiting from earlier closes").isPositive();
    }

    /** When the orders were decided that, by the whole, were decided up to {@code date} and filled after it. */
    private static List<String> waiting(WrittenTable trades, String date) {
        List<String> filled = trades.texts("filled_on");
        List<String> decided = trades.texts("decided_on");
        return IntStream.range(0, decided.size())
                .filter(i ->
                        decided.get(i).compareTo(date) <= 0 && filled.get(i).compareTo(date) > 0)
                .mapToObj(decided::get)
                .distinct()
                .toList();
    }

    private static String upTo(String date) {
        List<String> lines = PRICES.lines()
                .filter(line -> line.compareTo(date + "~") < 0 || line.startsWith("d"))
                .toList();
        return String.join("\n", lines) + "\n";
    }
}
