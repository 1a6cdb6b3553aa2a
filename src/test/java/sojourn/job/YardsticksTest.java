package sojourn.job;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.List;
import java.util.Locale;
import java.util.stream.DoubleStream;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Every yardstick and the parts of the difference to buy-and-hold, as a comparison writes and shows them. */
class YardsticksTest {
    private static final String ALL =
            "{buy-and-hold: {stocks: 1.0}, against: [buy-and-hold, same-exposure, same-exposure-so-far,"
                    + " same-volatility, volatility-gate, volatility-target, random-switcher]}";

    @TempDir
    static Path temp;

    private static JobFolder job = new JobFolder(Path.of(""));
    private static JobFolder.Ran ran = new JobFolder.Ran(0, "", "");

    @BeforeAll
    static void compare() {
        job = new JobFolder(temp)
                .with("stocks.csv", DrawnPrices.csv(31, 900, LocalDate.of(2003, 1, 1)))
                .with("a.yaml", StrategyText.named("Switches").with("judge", ALL))
                .with("b.yaml", StrategyText.alwaysFull("Full").with("judge", ALL));
        ran = job.compare("all", "a.yaml", "b.yaml");
        assertThat(ran.code()).as(ran.err()).isZero();
    }

    @Test
    void eachIsARowWithItsKnowledgeAndOneThatCannotBeSaysWhy() {
        WrittenTable table = job.table("all/comparison.csv");
        for (String causal : List.of("same_exposure_so_far", "volatility_gate", "volatility_target")) {
            int row = table.row("variant", causal + " of switches");
            assertThat(table.text(row, "kind")).isEqualTo("yardstick");
            assertThat(table.text(row, "outcome")).isEqualTo("ran");
        }
        for (String after :
                List.of("same_volatility", "random_switcher_05", "random_switcher_50", "random_switcher_95")) {
            int row = table.row("variant", after + " of switches");
            assertThat(table.text(row, "kind")).isEqualTo("yardstick-after-the-fact");
            assertThat(table.text(row, "outcome")).isEqualTo("ran");
        }
        int gate = table.row("variant", "volatility_gate of full");
        assertThat(table.text(gate, "outcome")).isEqualTo("undefined");
        assertThat(table.text(gate, "reason")).contains("one regime alone");
        int random = table.row("variant", "random_switcher of full");
        assertThat(table.text(random, "reason")).contains("every decision inside the window is the same");
        assertThat(job.record("all").get("warnings").toString()).contains("random_switcher is undefined");
    }

    @Test
    void theSameVolatilityIsTheStrategysAndOnlyWhatCouldBeTradedStandsInThePath() {
        WrittenTable table = job.table("all/comparison.csv");
        // exact but for the covariance with what cash earns, which here is steady to a few days a bar
        assertThat(table.number(table.row("variant", "same_volatility of switches"), "volatility_per_year"))
                .isCloseTo(table.number(table.row("variant", "switches"), "volatility_per_year"), within(1e-5));
        assertThat(job.table("all/switches/path.csv").header())
                .contains("volatility_gate.wealth", "volatility_target.wealth")
                .doesNotContain("same_volatility.wealth");
        assertThat(job.table("all/switches/yardsticks.csv").header())
                .contains("after_the_fact.same_volatility.wealth", "after_the_fact.random_switcher_50.wealth");
    }

    @Test
    void quantilesOfTheDrawsAreInOrderAndTheStrategysPlaceIsTold() {
        WrittenTable table = job.table("all/comparison.csv");
        double[] grown = DoubleStream.of(5, 50, 95)
                .map(level -> table.number(
                        table.row("variant", String.format(Locale.ROOT, "random_switcher_%02.0f of switches", level)),
                        "growth_per_year"))
                .toArray();
        assertThat(grown).isSorted();
        JsonNode switches = job.json("results/all/switches/measures.json").get("random_switcher");
        assertThat(switches.get("draws").asInt()).isEqualTo(999);
        JsonNode growth = switches.get("growth_per_year");
        // growth orders draws as final wealth does, so its quantiles are those very draws
        assertThat(growth.get("quantile_05").get("value").asDouble()).isEqualTo(grown[0]);
        assertThat(growth.get("quantile_95").get("value").asDouble()).isEqualTo(grown[2]);
        double below = growth.get("share_of_draws_below").get("value").asDouble();
        double chance = growth.get("chance_does_as_well").get("value").asDouble();
        assertThat(chance).isCloseTo((1 + 999 * (1 - below)) / 1000, within(1e-12));
    }

    @Test
    void thePartsOfTheDifferenceAddUpToTheTable() {
        WrittenTable table = job.table("all/comparison.csv");
        for (String variant : List.of("switches", "full")) {
            JsonNode parts = job.json("results/all/" + variant + "/measures.json")
                    .get("difference_to_buy_and_hold")
                    .get("growth_per_year");
            double sum = 0;
            for (String part : List.of("exposure", "timing", "cash", "costs")) {
                sum += parts.get(part).get("value").asDouble();
            }
            assertThat(sum)
                    .isCloseTo(table.number(table.row("variant", variant), "growth_minus_buy_and_hold"), within(1e-12));
            double costs = 0;
            for (JsonNode kind : parts.get("costs_by_kind")) {
                costs += kind.get("value").asDouble();
            }
            assertThat(costs).isCloseTo(parts.get("costs").get("value").asDouble(), within(1e-15));
        }
    }

    @Test
    void theTerminalShowsThemWithinItsWidth() {
        assertThat(ran.out())
                .contains("Growth beside", "Sharpe beside", "Among random switchers", "Against buy-and-hold, a year");
        assertThat(ran.out().lines())
                .allSatisfy(line -> assertThat(line.length()).isLessThanOrEqualTo(100));
    }

    @Test
    void threadsChangeNoDraw() {
        String once = job.text("results/all/switches/measures.json");
        JobFolder.Ran alone = JobFolder.shell(
                "compare",
                "--results",
                job.path("alone").toString(),
                "--name",
                "all",
                "--threads",
                "1",
                job.path("a.yaml").toString(),
                job.path("b.yaml").toString());
        assertThat(alone.code()).as(alone.err()).isZero();
        assertThat(job.text("alone/all/switches/measures.json")).isEqualTo(once);
        assertThat(job.text("alone/all/comparison.csv")).isEqualTo(job.text("results/all/comparison.csv"));
    }
}
