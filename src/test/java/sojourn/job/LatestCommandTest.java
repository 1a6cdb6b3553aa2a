package sojourn.job;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.apache.commons.math3.distribution.NormalDistribution;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** {@code latest} as a user runs it. */
class LatestCommandTest {
    private static final LocalDate START = LocalDate.of(2010, 1, 4);
    private static final String PRICES = DrawnPrices.csv(3, 350, START);
    private static final double CALM = 0.006;
    private static final double STORMY = 0.022;
    /** Known parameters, so that tipping returns have a closed form. */
    private static final String DECLARED =
            "{observe: [{log-return: stocks}], states: [calm, stormy], parameters: {fixed:"
                    + " {initial: [0.9, 0.1], transition: [[0.98, 0.02], [0.02, 0.98]], mean: [0, 0], sd: [0.006, 0.022]}}}";

    @TempDir
    private Path temporary;

    private JobFolder folder;

    @BeforeEach
    void prepare() {
        folder = new JobFolder(temporary)
                .with("stocks.csv", PRICES)
                .with("declared.yaml", StrategyText.named("Declared").with("regimes", DECLARED));
    }

    private JobFolder.Ran latest(String file, String... more) {
        List<String> arguments = new ArrayList<>(List.of(
                "latest",
                folder.path(file).toString(),
                "--results",
                folder.path("results").toString()));
        arguments.addAll(Arrays.asList(more));
        return JobFolder.shell(arguments.toArray(String[]::new));
    }

    private JsonNode json(String file, String... more) {
        List<String> arguments = new ArrayList<>(List.of("--json", "--quiet"));
        arguments.addAll(Arrays.asList(more));
        JobFolder.Ran ran = latest(file, arguments.toArray(String[]::new));
        assertThat(ran.code()).as(ran.err()).isZero();
        return JobFolder.parsed(ran.out());
    }

    @Test
    void tellsEveryThingInOrderAndWritesNothing() {
        JobFolder.Ran ran = latest("declared.yaml");
        assertThat(ran.code()).isZero();
        assertThat(ran.out())
                .startsWith("Hypothetical performance")
                .containsSubsequence(
                        "As of the close of 2011-05-06, the last bar of stocks: 'Declared'.",
                        "an external prior",
                        "What regime is it?",
                        "What is forecast of the next bar?",
                        "What does the strategy decide?",
                        "Because ",
                        "Which orders are that?",
                        "Which returns of the next bar would change that?",
                        "By the forecast it tips with probability");
        assertThat(ran.out().lines()).allMatch(line -> line.length() <= 100);
        assertThat(ran.out()).doesNotContain("NaN").doesNotContain("Infinity");
        assertThat(Files.exists(folder.path("results"))).isFalse();
    }

    /**
     * With means of 0 the posterior odds of stormy are q_s/q_c sd_c/sd_s exp(x^2 (1/sd_c^2 - 1/sd_s^2) / 2): solved for x at the
     * odds of the level. Below 0.6 the rule is in; leaving is what tips it.
     */
    @Test
    void tippingReturnsOfTwoDeclaredRegimesAreTheRootsOfAQuadratic() {
        JsonNode found = json("declared.yaml");
        assertThat(found.get("decision").get("because").asText()).contains("stays in");
        double calm = found.get("regime").get("predicted").get("calm").asDouble();
        double stormy = found.get("regime").get("predicted").get("stormy").asDouble();
        double odds = Math.log(0.6 / 0.4 * calm / stormy * STORMY / CALM);
        double root = Math.sqrt(2 * odds / (1 / (CALM * CALM) - 1 / (STORMY * STORMY)));
        JsonNode tipping = found.get("tipping").get("stocks");
        assertThat(tipping.get("unchanged")).hasSize(1);
        double low = tipping.get("unchanged").get(0).get("from").asDouble();
        double high = tipping.get("unchanged").get(0).get("to").asDouble();
        assertThat(low).isCloseTo(Math.exp(-root) - 1, within(2e-9)); // the search ends within 1e-9
        assertThat(high).isCloseTo(Math.exp(root) - 1, within(2e-9));
        double inside = calm * inside(CALM, root) + stormy * inside(STORMY, root);
        assertThat(tipping.get("probability_of_tipping").asDouble()).isCloseTo(1 - inside, within(1e-6));
        assertThat(tipping.get("borders").get(0).get("tips").asText()).isEqualTo("below");
        assertThat(tipping.get("borders").get(0).get("because").asText()).contains("rose above 0.60");
    }

    private static double inside(double deviation, double root) {
        return new NormalDistribution(null, 0, deviation).probability(-root, root);
    }

    @Test
    void ordersFromHoldingsAreInUnitsAtTheLastClose() {
        folder.with("mine.csv", "asset,units\nstocks,10\ncash,5000\n");
        folder.with(
                "free.yaml",
                StrategyText.named("Free").with("regimes", DECLARED).with("trade", "{}"));
        JsonNode found = json("free.yaml", "--holdings", folder.path("mine.csv").toString());
        double price = found.get("forecast").get("stocks").get("last_close").asDouble();
        double wealth = 10 * price + 5000;
        JsonNode order = found.get("decision").get("orders").get(0);
        assertThat(found.get("decision").get("kind").asText()).isEqualTo("order");
        assertThat(order.get("target").get("stocks").asDouble()).isEqualTo(1);
        assertThat(order.get("bars_to_fill").asInt()).isEqualTo(1);
        assertThat(order.get("legs").get(0).get("units").asDouble()).isCloseTo(wealth / price - 10, within(1e-9));
        assertThat(order.get("estimated_cost").asDouble()).isZero();
        // 10 bps one way: wealth after the order is W - 0.001 (W' - 10 P), W' what stocks are then worth
        JsonNode costly =
                json("declared.yaml", "--holdings", folder.path("mine.csv").toString());
        double after = (wealth + 0.001 * 10 * price) / 1.001;
        JsonNode leg = costly.get("decision").get("orders").get(0);
        assertThat(leg.get("legs").get(0).get("units").asDouble()).isCloseTo(after / price - 10, within(1e-8));
        assertThat(leg.get("estimated_cost").asDouble()).isCloseTo(wealth - after, within(1e-8));
        assertThat(latest("declared.yaml", "--holdings", folder.path("mine.csv").toString())
                        .out())
                .contains("From 10 stocks, cash 5000.00 (held by ")
                .contains("estimated costs");
    }

    /** Units worked from the closes as the file quotes them. */
    @Test
    void ordersAtTheOpenInLotsSettledAtTheDecisionGoByQuotedClosesThoughDividendsArePaid() {
        List<String> lines = PRICES.lines().toList();
        List<String> paying = new ArrayList<>(List.of("date,close,open,dividend"));
        for (int row = 1; row < lines.size(); row++) {
            String close = lines.get(row).split(",", -1)[1];
            paying.add(lines.get(row) + "," + close + (row % 60 == 0 ? ",1.5" : ",0"));
        }
        double quoted = Double.parseDouble(lines.get(lines.size() - 1).split(",", -1)[1]);
        folder.with("paying.csv", String.join("\n", paying) + "\n");
        folder.with("mine.csv", "asset,units\nstocks,10\ncash," + 16.5 * quoted + "\n");
        folder.with(
                "paying.yaml",
                StrategyText.named("Paying")
                        .with("prices", "{stocks: {csv: paying.csv, dividend: dividend}}")
                        .with("regimes", DECLARED)
                        .with("trade", "{fill: next-open, size-at: decision, lots: {stocks: 7}}"));
        JsonNode found =
                json("paying.yaml", "--holdings", folder.path("mine.csv").toString());
        assertThat(found.get("forecast").get("stocks").get("last_close").asDouble())
                .isEqualTo(quoted);
        JsonNode leg = found.get("decision").get("orders").get(0).get("legs").get(0);
        // wealth is 26.5 units: 21 are whole lots of 7
        assertThat(leg.get("units").asDouble()).isCloseTo(11, within(1e-9));
        assertThat(latest("paying.yaml", "--holdings", folder.path("mine.csv").toString())
                        .out())
                .contains("Quantities are settled at the close of the decision");
    }

    @Test
    void whatIsHeldAsWantedNeedsNoOrder() {
        folder.with("mine.csv", "asset,units\nstocks,10\n");
        JsonNode found =
                json("declared.yaml", "--holdings", folder.path("mine.csv").toString());
        assertThat(found.get("decision").get("kind").asText()).isEqualTo("keep");
        assertThat(found.get("decision").get("orders")).isEmpty();
    }

    @Test
    void faultsOfHoldingsAreToldWithTheirPlace() {
        folder.with("mine.csv", "asset,units\nstoks,10\nstocks,many\nstocks,1\nstocks,2\ncash,1\n");
        JobFolder.Ran ran =
                latest("declared.yaml", "--holdings", folder.path("mine.csv").toString());
        assertThat(ran.code()).isEqualTo(2);
        assertThat(ran.err())
                .contains("mine.csv:2:1: the strategy uses no asset called 'stoks'; did you mean 'stocks'?")
                .contains("mine.csv:3:8: units 'many' is not a number")
                .contains("mine.csv:5:1: 'stocks' stands twice");
        folder.with("mine.csv", "asset,units\ncash,-5\n");
        JobFolder.Ran poor =
                latest("declared.yaml", "--holdings", folder.path("mine.csv").toString());
        assertThat(poor.code()).isEqualTo(2);
        assertThat(poor.err()).contains("these holdings are worth -5.0");
        JobFolder.Ran absent =
                latest("declared.yaml", "--holdings", folder.path("absent.csv").toString());
        assertThat(absent.code()).isEqualTo(2);
        assertThat(absent.err())
                .contains("there is no such file")
                .contains("taken from the folder that the command runs in")
                .doesNotContain("strategy file");
        folder.with("mine.csv", "asset,units\nstocks,\n");
        assertThat(latest("declared.yaml", "--holdings", folder.path("mine.csv").toString())
                        .err())
                .contains("mine.csv:2:8: units '' is not a number")
                .contains("write a number such as 12.5, or 0 where nothing is held");
        folder.with("mine.csv", "");
        assertThat(latest("declared.yaml", "--holdings", folder.path("mine.csv").toString())
                        .err())
                .contains("mine.csv: the file is empty")
                .contains("give a header line 'asset,units' and a row for each asset that is held");
    }

    /** An order of a thousandth of what can be traded on one bar goes on for many bars, and the next part is due at the next one. */
    @Test
    void anOrderThatGoesOnFillsAtTheNextBar() {
        StringBuilder thin = new StringBuilder("date,close,volume\n");
        PRICES.lines().skip(1).forEach(line -> thin.append(line).append(",100\n"));
        folder.with("stocks.csv", thin.toString());
        folder.with(
                "thin.yaml",
                StrategyText.named("Thin")
                        .with("regimes", DECLARED)
                        .with("trade", "{no-trade-band: 0.9, costs: {impact: {participation-percent: 5}}}"));
        JsonNode orders = json("thin.yaml").at("/decision/orders");
        assertThat(orders).isNotEmpty();
        assertThat(orders.get(0).get("decided_on").asText()).isLessThan("2011-05-06");
        orders.forEach(one -> assertThat(one.get("bars_to_fill").asInt()).isEqualTo(1));
        JobFolder.Ran traced =
                JobFolder.shell("trace", folder.path("thin.yaml").toString(), "--date", "2011-05-06", "--quiet");
        assertThat(traced.out().replaceAll("\\s+", " "))
                .contains("still waits decided on ")
                .contains(" and goes on");
    }

    @Test
    void quantitiesSettledAtTheDecisionAreSaidToBe() {
        folder.with("mine.csv", "asset,units\nstocks,10\ncash,5000\n");
        folder.with(
                "decided.yaml",
                StrategyText.named("Decided").with("regimes", DECLARED).with("trade", "{size-at: decision}"));
        String holdings = folder.path("mine.csv").toString();
        String text = latest("decided.yaml", "--holdings", holdings).out().replaceAll("\\s+", " ");
        assertThat(text)
                .contains("Quantities are settled at the close of the decision")
                .doesNotContain("quantities and costs are settled at the prices of the fill")
                .contains("what is held is away from it: stocks ")
                .doesNotContain("drifted");
        assertThat(latest("declared.yaml", "--holdings", holdings).out().replaceAll("\\s+", " "))
                .contains("quantities and costs are settled at the prices of the fill");
    }

    @Test
    void whatCannotTipSaysWhy() {
        folder.with("given.csv", given());
        folder.with(
                "given.yaml",
                StrategyText.named("Given")
                        .with(
                                "regimes",
                                "{given: {csv: given.csv, known-on: known_on}, states: [calm, stormy],"
                                        + " order-by: stocks}"));
        JsonNode given = json("given.yaml");
        assertThat(given.get("tipping").get("stocks").get("undefined_because").asText())
                .contains("computed elsewhere");
        folder.with(
                "weekly.yaml",
                StrategyText.named("Weekly").with("regimes", DECLARED).with("trade", "{decide: first-of-month}"));
        JsonNode weekly = json("weekly.yaml");
        assertThat(weekly.get("tipping").get("stocks").get("undefined_because").asText())
                .contains("nothing is decided at the close of the next bar, 2011-05-09");
        folder.with(
                "short.yaml", StrategyText.named("Short").with("refit", "{first-fit-after: 5000, every: 5, seed: 1}"));
        JobFolder.Ran shortOne = latest("short.yaml");
        assertThat(shortOne.code()).isZero();
        assertThat(shortOne.out())
                .contains("Undefined, because there is no accepted fit at this close.")
                .contains("stocks: undefined, because there is no accepted fit at this close.");
    }

    private static String given() {
        StringBuilder text = new StringBuilder("date,calm,stormy,known_on\n");
        PRICES.lines().skip(1).forEach(line -> {
            String date = line.substring(0, 10);
            text.append(date).append(",0.8,0.2,").append(date).append('\n');
        });
        return text.toString();
    }

    @Test
    void aRuleThatMovesWithEveryCloseIsTippedByEveryReturn() {
        folder.with(
                "blend.yaml",
                StrategyText.named("Blend")
                        .with("regimes", DECLARED)
                        .with("allocate", "{blend: {weights: {calm: {stocks: 1}, stormy: {stocks: 0}}}}"));
        JsonNode tipping = json("blend.yaml").get("tipping").get("stocks");
        assertThat(tipping.get("unchanged")).isEmpty();
        assertThat(tipping.get("probability_of_tipping").asDouble()).isEqualTo(1);
        folder.with("full.yaml", StrategyText.alwaysFull("Full"));
        JsonNode never = json("full.yaml").get("tipping").get("stocks");
        assertThat(never.get("borders")).isEmpty();
        assertThat(never.get("unchanged").get(0).get("from").asDouble()).isEqualTo(-0.25);
        assertThat(never.get("probability_of_tipping").asDouble()).isZero();
    }

    @Test
    void aMissingFileAFolderAndContradictionsAreRefused() {
        assertThat(latest("absent.yaml").code()).isEqualTo(2);
        assertThat(latest(".").err()).contains("is a folder; name one strategy file");
        JobFolder.Ran both = latest("declared.yaml", "--seal", "--verify", "x.json");
        assertThat(both.code()).isEqualTo(2);
        assertThat(both.err()).contains("--verify goes alone");
    }

    @Test
    void threadsChangeNoByte() {
        assertThat(latest("declared.yaml", "--threads", "1").out())
                .isEqualTo(latest("declared.yaml", "--threads", "3").out());
    }
}
