package sojourn.strategy;

import static java.nio.charset.StandardCharsets.UTF_8;
import static org.assertj.core.api.Assertions.assertThat;

import com.fasterxml.jackson.databind.JsonNode;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.document.YamlText;

class StrategyFileTest {
    private static final Map<String, String> CONTENTS =
            Map.of("stocks", "digest-s", "bonds", "digest-b", "gold", "digest-g", "cash", "digest-c");

    @ParameterizedTest
    @CsvSource({
        "Step aside in storms, step-aside-in-storms",
        "'  60/40, always!  ', 60-40-always",
        "C++ & Java__17, c-java-17",
        "ÜBER 9, ber-9",
        "-x-, x"
    })
    void aSlugIsLowerCaseLettersDigitsAndHyphens(String name, String slug) {
        assertThat(named(name).slug()).isEqualTo(slug);
    }

    @Test
    void aSlugHasAtMostSixtyCharactersAndNoHyphenAtItsEnds() {
        assertThat(named("a".repeat(70)).slug()).isEqualTo("a".repeat(60));
        assertThat(named("a".repeat(59) + " bcd").slug()).isEqualTo("a".repeat(59));
    }

    @Test
    void usedAssetsAreThoseObservedOrderedByHeldOrComparedWithInTheOrderOfPrices() {
        assertThat(Samples.base().strategy().usedAssets()).containsExactly("stocks", "bonds");
        assertThat(Samples.with("out: {stocks: 0, bonds: 0.5}", "out: {stocks: 0}")
                        .strategy()
                        .usedAssets())
                .containsExactly("stocks");
        assertThat(Samples.with("buy-and-hold: {stocks: 1}", "buy-and-hold: {gold: 1}")
                        .strategy()
                        .usedAssets())
                .containsExactly("stocks", "bonds", "gold");
        assertThat(Samples.with("  states:", "  order-by: gold\n  states:")
                        .strategy()
                        .usedAssets())
                .containsExactly("stocks", "bonds", "gold");
        assertThat(Samples.with("log-return: stocks", "log-return: gold")
                        .strategy()
                        .usedAssets())
                .containsExactly("stocks", "bonds", "gold");
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "Step aside in storms | Another name",
                "commission-bps: 5 | half-spread-bps: 50",
                "leave-above: 0.7 | leave-above: 0.9",
                "in: {stocks: 1} | in: {stocks: 0.5}",
                "csv: bonds.csv | csv: other.csv",
                "csv: gold.csv | csv: silver.csv",
                "percent_per_year | rate",
                "every: 21 | every: 21.0",
                "states: [calm, stormy] | states: [ calm, 'stormy' ]",
                "observe: [{log-return: stocks}] | {observe: [{log-return: stocks}], model: hidden-markov}"
            })
    void whatAWalkDoesNotDependOnLeavesItsSettingsAsTheyAre(String from, String to) {
        String changed = to.startsWith("{") ? "model: hidden-markov\n  " + from : to;
        assertThat(text(Samples.with(from, changed).walkSettings()))
                .isEqualTo(text(Samples.base().walkSettings()));
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "starts: 5 | starts: 6",
                "seed: 20260101 | seed: 20260102",
                "every: 21 | every: month",
                "first-fit-after: 1000 | first-fit-after: 1001",
                "every: 21 | {window: {rolling: 2000}, every: 21}",
                "states: [calm, stormy] | states: [calm, windy, stormy]",
                "log-return: stocks | simple-return: stocks",
                "observe: [{log-return: stocks}] | {emission: normal-zero-mean}",
                "buy-and-hold: {stocks: 1} | buy-and-hold: {gold: 1}"
            })
    void whatAWalkDependsOnChangesItsSettings(String from, String to) {
        String changed = switch (to) {
            case "{window: {rolling: 2000}, every: 21}" -> "window: {rolling: 2000}\n  every: 21";
            case "{emission: normal-zero-mean}" -> "emission: normal-zero-mean\n  " + from;
            default -> to;
        };
        assertThat(text(Samples.with(from, changed).walkSettings()))
                .isNotEqualTo(text(Samples.base().walkSettings()));
    }

    @Test
    void settingsByContentHoldNoPathAndChangeWithEverythingElse() {
        String settings = text(Samples.base().settingsByContent(CONTENTS));
        assertThat(settings)
                .doesNotContain(".csv", "..", "somewhere", "/prices")
                .contains("digest-s", "digest-b", "digest-g", "digest-c actual/360", "\"leave-above\":0.7");
        assertThat(byContent("csv: bonds.csv", "csv: elsewhere/b.csv")).isEqualTo(settings);
        assertThat(byContent("close: total_return", "close: adjusted")).isEqualTo(settings);
        assertThat(byContent("actual/360", "actual/365")).isNotEqualTo(settings);
        assertThat(byContent("commission-bps: 5", "commission-bps: 6")).isNotEqualTo(settings);
        assertThat(text(Samples.base().settingsByContent(changed("bonds")))).isNotEqualTo(settings);
        assertThat(text(Samples.base().settingsByContent(changed("cash")))).isNotEqualTo(settings);
    }

    @ParameterizedTest
    @ValueSource(strings = {"results/run/variant", "somewhere/strategies", ".", "somewhere/prices/deep/er"})
    void pathsWrittenForAnotherFolderPointAtTheSameFiles(String folder) {
        Path target = Path.of(folder);
        StrategyFile file = Samples.base();
        JsonNode moved = file.resolvedFor(target);
        for (String pointer : List.of("/prices/stocks/csv", "/prices/bonds/csv", "/prices/gold/csv", "/cash/csv")) {
            String written = moved.at(pointer).asText();
            assertThat(written).as(pointer).doesNotContain("\\").isNotEmpty();
            assertThat(target.toAbsolutePath().resolve(written).normalize())
                    .as(pointer)
                    .isEqualTo(Samples.FOLDER
                            .resolve(file.resolved().at(pointer).asText())
                            .normalize());
        }
        assertThat(file.resolved()).isEqualTo(Samples.base().resolved());
    }

    @Test
    void anExampleWrittenElsewhereReadsTheSameFiles(@TempDir Path temp) throws IOException {
        for (Path example : Samples.examples()) {
            StrategyFile file = Samples.read(example);
            Path folder = Files.createDirectories(temp.resolve("deep").resolve(file.slug()));
            Path written = folder.resolve("strategy.yaml");
            Files.writeString(written, YamlText.of(file.resolvedFor(folder)));
            StrategyFile again = Samples.read(written);
            assertThat(again.strategy().name()).isEqualTo(file.strategy().name());
            assertThat(text(again.walkSettings())).isEqualTo(text(file.walkSettings()));
            for (String asset : file.strategy().prices().keySet()) {
                Path there = again.folder()
                        .resolve(
                                again.resolved().at("/prices/" + asset + "/csv").asText());
                Path here = file.folder()
                        .resolve(file.resolved().at("/prices/" + asset + "/csv").asText());
                assertThat(Files.isSameFile(there, here)).as(there.toString()).isTrue();
            }
        }
    }

    @Test
    void anAbsolutePathStaysTheSameFile() {
        Path absolute = Path.of("data", "stocks.csv").toAbsolutePath();
        StrategyFile file = Samples.with("../prices/stocks.csv", "'" + absolute + "'");
        Path target = Path.of("results", "run").toAbsolutePath();
        String written = file.resolvedFor(target).at("/prices/stocks/csv").asText();
        assertThat(target.resolve(written).normalize()).isEqualTo(absolute);
    }

    private static StrategyFile named(String name) {
        return Samples.with("Step aside in storms", "'" + name + "'");
    }

    private static String byContent(String from, String to) {
        return text(Samples.with(from, to).settingsByContent(CONTENTS));
    }

    private static Map<String, String> changed(String role) {
        Map<String, String> contents = new LinkedHashMap<>(CONTENTS);
        contents.put(role, "digest-other");
        return contents;
    }

    private static String text(byte[] settings) {
        return new String(settings, UTF_8);
    }
}
