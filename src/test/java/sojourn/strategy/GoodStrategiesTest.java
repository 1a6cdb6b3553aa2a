package sojourn.strategy;

import static org.assertj.core.api.Assertions.assertThat;

import com.fasterxml.jackson.databind.JsonNode;
import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import sojourn.document.Document;
import sojourn.document.Problems;
import sojourn.document.RawJson;
import sojourn.document.SchemaJudge;
import sojourn.document.YamlText;

class GoodStrategiesTest {
    private static final SchemaJudge JUDGE = new SchemaJudge(Strategy.SHAPE);

    static List<Path> good() throws IOException {
        return Samples.good();
    }

    @ParameterizedTest
    @MethodSource("good")
    void aGoodFileReadsAndTheSchemaAcceptsIt(Path file) {
        assertThat(Samples.messages(file)).isEmpty();
        assertThat(JUDGE.faults(rawJson(file))).isEmpty();
    }

    @ParameterizedTest
    @MethodSource("good")
    void whatIsWrittenOutInFullReadsBackTheSame(Path path) {
        StrategyFile file = Samples.read(path);
        String yaml = YamlText.of(file.resolved());
        StrategyFile again = Samples.parse(yaml);
        assertThat(again.resolved()).isEqualTo(file.resolved());
        assertThat(again.strategy()).isEqualTo(file.strategy());
        assertThat(YamlText.of(again.resolved())).isEqualTo(yaml);
        assertThat(JUDGE.faults(file.resolved())).isEmpty();
    }

    @Test
    void theGoodFilesUseEveryKeyThatThereIs() throws IOException {
        Set<String> written = new TreeSet<>();
        for (Path file : Samples.good()) {
            keys(rawJson(file), written);
        }
        Set<String> known = new TreeSet<>();
        SchemaKeys.of(StrategySchemaTest.SCHEMA).forEach(key -> known.add(key.name()));
        known.removeAll(written);
        assertThat(known).as("keys that no good file uses").isEmpty();
    }

    @Test
    void thereAreExamples() throws IOException {
        assertThat(Samples.examples()).isNotEmpty();
        assertThat(Samples.good().size() - Samples.examples().size()).isGreaterThanOrEqualTo(8);
    }

    private static JsonNode rawJson(Path file) {
        Problems problems = new Problems();
        Document document = Document.read(file, file.toString(), problems).orElseThrow();
        assertThat(problems.list()).isEmpty();
        return RawJson.of(document.root());
    }

    private static void keys(JsonNode tree, Set<String> into) {
        tree.fieldNames().forEachRemaining(into::add);
        tree.forEach(child -> keys(child, into));
    }
}
