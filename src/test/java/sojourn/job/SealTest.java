package sojourn.job;

import static org.assertj.core.api.Assertions.assertThat;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HexFormat;
import java.util.List;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import sojourn.document.JsonText;

/** Seals: written, chained, verified, and found broken. */
class SealTest {
    private static final String PRICES = DrawnPrices.csv(3, 420, LocalDate.of(2010, 1, 4));
    private static final String REGIMES =
            "{observe: [{log-return: stocks}], states: [calm, stormy], parameters: {fixed:"
                    + " {initial: [0.9, 0.1], transition: [[0.98, 0.02], [0.02, 0.98]], mean: [0, 0], sd: [0.006, 0.022]}}}";

    @TempDir
    private Path temporary;

    private JobFolder folder;

    @BeforeEach
    void prepare() {
        folder = new JobFolder(temporary);
        rows(415);
        strategy("{costs: {commission-bps: 5}}");
    }

    private void rows(int rows) {
        folder.with("stocks.csv", DrawnPrices.first(PRICES, rows));
    }

    private void strategy(String trade) {
        folder.with(
                "rule.yaml", StrategyText.named("Rule").with("regimes", REGIMES).with("trade", trade));
    }

    private JobFolder.Ran latest(String... more) {
        List<String> arguments = new ArrayList<>(List.of(
                "latest",
                folder.path("rule.yaml").toString(),
                "--results",
                folder.path("results").toString()));
        arguments.addAll(Arrays.asList(more));
        return JobFolder.shell(arguments.toArray(String[]::new));
    }

    private String seal() {
        JobFolder.Ran ran = latest("--seal");
        assertThat(ran.code()).as(ran.err()).isZero();
        List<String> names = folder.names("results/seals/rule");
        return names.get(names.size() - 1);
    }

    private JobFolder.Ran verify(String name, String... more) {
        List<String> arguments = new ArrayList<>(
                List.of("--verify", folder.path("results/seals/rule/" + name).toString()));
        arguments.addAll(Arrays.asList(more));
        return latest(arguments.toArray(String[]::new));
    }

    @Test
    void holdsWhileNothingChangesAlsoWhenTheFilesGrow() {
        String first = seal();
        assertThat(first).isEqualTo("00001-2011-08-05.json");
        assertThat(verify(first).code()).isZero();
        assertThat(verify(first).out().replaceAll("\\s+", " "))
                .contains("it holds. The same inputs give the same decision.");
        rows(420);
        assertThat(verify(first).code()).isZero();
        JsonNode told = JobFolder.parsed(verify(first, "--json").out());
        assertThat(told.get("holds").asBoolean()).isTrue();
        assertThat(told.get("changed_rows")).isEmpty();
    }

    @Test
    void theSameDecisionIsSealedOnce() {
        seal();
        JobFolder.Ran again = latest("--seal");
        assertThat(again.err()).contains("already; it was left alone");
        assertThat(folder.names("results/seals/rule")).hasSize(1);
    }

    @Test
    void sealsAreChainedAndHoldOnlyRowsThatAreNew() {
        String first = seal();
        rows(420);
        String second = seal();
        assertThat(second).isEqualTo("00002-2011-08-12.json");
        JsonNode one = folder.json("results/seals/rule/" + first);
        JsonNode two = folder.json("results/seals/rule/" + second);
        assertThat(one.get("previous").isNull()).isTrue();
        assertThat(two.get("previous").get("file").asText()).isEqualTo(first);
        assertThat(two.get("previous").get("sha256")).isEqualTo(one.get("sha256"));
        assertThat(one.get("rows").get("new_or_changed")).hasSize(415);
        assertThat(two.get("rows").get("new_or_changed")).hasSize(5);
        assertThat(verify(first).code()).isZero();
        assertThat(verify(second).code()).isZero();
    }

    @Test
    void aChangedPriceIsToldWithItsBarItsDateAndBothValues() {
        seal();
        rows(420);
        String second = seal();
        String[] lines = PRICES.split("\n", -1);
        String[] cells = lines[200].split(",", -1); // bar 200, since the header is line 0
        folder.with("stocks.csv", PRICES.replace(lines[200], cells[0] + ",123.5"));
        JobFolder.Ran ran = verify(second);
        assertThat(ran.code()).isEqualTo(3);
        assertThat(ran.out().replaceAll(" +", " "))
                .contains("it does not hold")
                .contains("200 " + cells[0] + " stocks.close " + Double.parseDouble(cells[1]) + " 123.5");
        JsonNode told = JobFolder.parsed(verify(second, "--json").out());
        assertThat(told.get("changed_rows")).hasSize(1);
        assertThat(told.get("changed_rows").get(0).get("bar").asInt()).isEqualTo(200);
        rows(419);
        JsonNode gone = JobFolder.parsed(verify(second, "--json").out());
        assertThat(gone.get("holds").asBoolean()).isFalse();
        assertThat(gone.get("changed_rows").get(0).get("date").asText()).isEqualTo("2011-08-12");
        assertThat(gone.get("changed_rows").get(0).get("now").asText()).isEmpty();
    }

    @Test
    void anotherStrategyIsToldByWhatDiffers() {
        String first = seal();
        strategy("{costs: {commission-bps: 6}}");
        JobFolder.Ran ran = verify(first);
        assertThat(ran.code()).isEqualTo(3);
        assertThat(ran.out()).contains("/settings/trade/costs/commission-bps was 5.0 and is 6.0");
    }

    @Test
    void aSealThatWasEditedBreaksTheChain() throws IOException {
        String first = seal();
        rows(420);
        String second = seal();
        String text = folder.text("results/seals/rule/" + first);
        folder.with("results/seals/rule/" + first, text.replace("\"number\": 1", "\"number\": 7"));
        JobFolder.Ran ran = verify(second);
        assertThat(ran.code()).isEqualTo(3);
        assertThat(ran.out().replaceAll("\\s+", " ")).contains("00001-2011-08-05.json is not what was sealed");
        JobFolder.Ran more = latest("--seal");
        assertThat(more.code()).isEqualTo(2);
        assertThat(more.err()).contains("the chain of seals is broken");
        Files.delete(folder.path("results/seals/rule/" + first));
        assertThat(verify(second).out().replaceAll("\\s+", " "))
                .contains("names 00001-2011-08-05.json as the seal before it, which is gone");
        assertThat(verify(second).code()).isEqualTo(3);
        assertThat(verify(second).out().replaceAll("\\s+", " ")).contains("cannot be told, since the chain is broken");
    }

    @Test
    void holdingsAreUnderSealToo() {
        folder.with("mine.csv", "asset,units\nstocks,10\ncash,5000\n");
        JobFolder.Ran ran =
                latest("--seal", "--holdings", folder.path("mine.csv").toString());
        assertThat(ran.code()).isZero();
        String name = folder.names("results/seals/rule").get(0);
        assertThat(folder.json("results/seals/rule/" + name)
                        .at("/content/holdings/stocks")
                        .asDouble())
                .isEqualTo(10);
        assertThat(verify(name).code()).as(verify(name).out()).isZero();
    }

    @Test
    void whatIsNoSealIsRefused() {
        folder.with("results/seals/rule/note.json", "{\"a\": 1}");
        assertThat(verify("note.json").code()).isEqualTo(2);
        assertThat(verify("note.json").err()).contains("this is no seal");
        assertThat(verify("absent.json").err()).contains("there is no such file");
    }

    @Test
    void aLaterSealVouchesForAnEarlierOneAndTheLastHasNone() {
        String first = seal();
        String alone = flat(verify(first));
        String hash = folder.json("results/seals/rule/" + first).get("sha256").asText();
        assertThat(alone).contains("Hash " + hash + ", and no later seal vouches for it");
        rows(420);
        String second = seal();
        assertThat(flat(verify(first)))
                .contains("Hash " + hash + ", which " + second + " names as that of the seal before it.");
        assertThat(flat(verify(second))).contains("no later seal vouches for it");
        JsonNode told = JobFolder.parsed(verify(first, "--json").out());
        assertThat(told.get("sha256").asText()).isEqualTo(hash);
        assertThat(told.get("vouched_by").asText()).isEqualTo(second);
    }

    /** What a forger would do: change the hour and give the seal the hash that then fits. */
    @Test
    void aSealThatWasBackdatedWithAFittingHashIsGivenAwayByTheNext() {
        String first = seal();
        rows(420);
        String second = seal();
        ObjectNode forged = (ObjectNode) folder.json("results/seals/rule/" + first);
        forged.put("sealed_at", "2001-01-01T00:00:00Z");
        forged.remove("sha256");
        forged.put("sha256", sha256(JsonText.compact(forged)));
        folder.with("results/seals/rule/" + first, JsonText.indented(forged));
        JobFolder.Ran ran = verify(first);
        assertThat(ran.code()).isEqualTo(3);
        assertThat(flat(ran))
                .contains("it does not hold")
                .contains(second + " names " + first + " with another hash than it has now")
                .contains("no later seal vouches for it")
                .doesNotContain("is not what was sealed");
        assertThat(JobFolder.parsed(verify(first, "--json").out()).has("vouched_by"))
                .isFalse();
    }

    @Test
    void aKeyThatStandsTwiceIsNoSeal() {
        String first = seal();
        rows(420);
        String second = seal();
        String text = folder.text("results/seals/rule/" + first);
        folder.with(
                "results/seals/rule/" + first, text.replace("  \"number\": 1,", "  \"number\": 7,\n  \"number\": 1,"));
        assertThat(verify(first).code()).isEqualTo(2);
        assertThat(verify(first).err())
                .contains("this is no seal: line ")
                .contains("Duplicate")
                .contains("'number'");
        assertThat(verify(second).code()).isEqualTo(3);
        assertThat(flat(verify(second))).contains(first + " cannot be read as a seal (line");
    }

    private static String flat(JobFolder.Ran ran) {
        return ran.out().replaceAll("\\s+", " ");
    }

    private static String sha256(String text) {
        try {
            byte[] hash = MessageDigest.getInstance("SHA-256").digest(text.getBytes(StandardCharsets.UTF_8));
            return HexFormat.of().formatHex(hash);
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException(e);
        }
    }
}
