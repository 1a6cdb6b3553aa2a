package sojourn.job;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import java.nio.file.Path;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** {@code regimes} on prices that {@code invent} made: the truth is stated, and it is what must be found. */
class RegimesOfInventedWorldsTest {
    /** Calm for 80 bars on average at 10 % a year, stormy for 40; degrees of freedom so many that moves are practically normal. */
    private static final String WORLD = """
            world: Two weathers
            file-prefix: two
            seed: 5
            first-day: 2001-01-01
            years: 16
            assets: {stocks: {first-price: 1000, decimals: 4}}
            bills:
              every-days: 7
              first-percent-per-year: 3
              long-run-percent-per-year: 2.5
              half-life-years: 2.5
              volatility-points-per-root-year: 0.5
              floor-percent-per-year: 0
            starts-in: calm
            states:
              calm:
                stay: {shortest-bars: 1, mean-bars: 80, negative-binomial-shape: 1}
                then: {stormy: 1}
                degrees-of-freedom: 200
                moves: {stocks: {drift-percent-per-year: 6, volatility-percent-per-year: 10}}
              stormy:
                stay: {shortest-bars: 1, mean-bars: 40, negative-binomial-shape: 1}
                then: {calm: 1}
                degrees-of-freedom: 200
                moves: {stocks: {drift-percent-per-year: 6, volatility-percent-per-year: %s}}
            """;

    private static final String STRATEGY = """
            strategy: Step aside
            prices: {stocks: {csv: world/two-stocks.csv}}
            regimes: {observe: [{log-return: stocks}], states: [calm, stormy]}
            refit: {first-fit-after: 1500, every: 250, starts: 3, seed: 20260101}
            allocate: {switch: {regime: stormy, leave-above: 0.7, re-enter-below: 0.3, in: {stocks: 1}, out: {stocks: 0}}}
            judge: {buy-and-hold: {stocks: 1}}
            """;

    @TempDir
    private Path temporary;

    @Test
    void twoWeathersAreFoundAndForecastBetterThanOne() {
        JsonNode found = questioned("32");
        JsonNode calm = found.get("identity").get("regimes").get(0).get("last_fit");
        JsonNode stormy = found.get("identity").get("regimes").get(1).get("last_fit");
        // 2.5 standard errors of some 2500 and 1400 normal returns: 0.1 / sqrt(5000) and 0.32 / sqrt(2800)
        assertThat(value(calm, "volatility_per_year")).isCloseTo(0.10, within(0.0036));
        assertThat(value(stormy, "volatility_per_year")).isCloseTo(0.32, within(0.015));
        // some 34 stays of each: within a half
        assertThat(value(calm, "stay_bars")).isBetween(55.0, 120.0);
        assertThat(value(stormy, "stay_bars")).isBetween(27.0, 60.0);
        for (String rival : List.of("one-regime", "mixture")) {
            JsonNode ahead = ahead(found, rival);
            assertThat(ahead.get("value").asDouble()).isGreaterThan(0.05);
            assertThat(p(ahead)).isLessThan(0.001);
        }
        assertThat(found.get("forecasts_of_squared_return").get("best_by_qlike").asText())
                .isEqualTo("hidden-markov");
        assertThat(found.get("reproduction").get("figures").findValuesAsText("reproduced"))
                .filteredOn("true"::equals)
                .hasSizeGreaterThanOrEqualTo(36); // of 42
        assertThat(agreement()).isGreaterThan(0.85);
    }

    @Test
    void oneWeatherIsNotForecastBetterByTwoRegimes() {
        JsonNode found = questioned("10");
        JsonNode ahead = ahead(found, "one-regime");
        assertThat(ahead.get("value").asDouble() <= 0 || p(ahead) > 0.05).isTrue();
        assertThat(ahead.get("value").asDouble()).isCloseTo(0, within(0.005));
    }

    private JsonNode questioned(String stormyVolatility) {
        JobFolder folder = new JobFolder(temporary)
                .with("world.yaml", WORLD.formatted(stormyVolatility))
                .with("step-aside.yaml", STRATEGY);
        JobFolder.Ran invented = JobFolder.shell(
                "invent",
                folder.path("world.yaml").toString(),
                "--to",
                folder.path("world").toString());
        assertThat(invented.code()).as(invented.err()).isZero();
        JobFolder.Ran ran = JobFolder.shell(
                "regimes",
                folder.path("step-aside.yaml").toString(),
                "--results",
                folder.path("results").toString(),
                "--json",
                "--quiet");
        assertThat(ran.code()).as(ran.err()).isZero();
        return JobFolder.parsed(ran.out());
    }

    /** The share of closes at which the most likely regime was the true one. */
    private double agreement() {
        JobFolder folder = new JobFolder(temporary);
        Map<String, String> truth = new HashMap<>();
        folder.text("world/two-truth.csv").lines().skip(1).forEach(line -> {
            String[] cells = line.split(",", -1);
            truth.put(cells[0], cells[1]);
        });
        List<String> dates = folder.table("step-aside-regimes/bars.csv").texts("date");
        List<String> likely = folder.table("step-aside-regimes/bars.csv").texts("most_likely");
        int agreeing = 0;
        for (int row = 0; row < dates.size(); row++) {
            agreeing += likely.get(row).equals(truth.get(dates.get(row))) ? 1 : 0;
        }
        return (double) agreeing / dates.size();
    }

    private static JsonNode ahead(JsonNode found, String rival) {
        for (JsonNode row : found.get("log_score_of_observation").get("gauges")) {
            if (row.get("gauge").asText().equals(rival)) {
                return row.get("own_ahead");
            }
        }
        throw new AssertionError(rival + " was not compared");
    }

    private static double p(JsonNode ahead) {
        return ahead.get("diebold_mariano_robust").get("p").asDouble();
    }

    private static double value(JsonNode node, String name) {
        return node.get(name).get("value").asDouble();
    }
}
