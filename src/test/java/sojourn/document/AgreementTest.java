package sojourn.document;

import static org.assertj.core.api.Assertions.assertThat;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** What is written reads back, and reader and schema agree, on many seeded random trees. */
class AgreementTest {
    private static final int TREES = 200;

    private static Document parse(String yaml, String description) {
        Problems problems = new Problems();
        Document document = Document.parse("r.yaml", yaml, problems)
                .orElseThrow(() -> new AssertionError(description + "\n" + problems.list() + "\n" + yaml));
        assertThat(problems.list()).as("%s%n%s", description, yaml).isEmpty();
        return document;
    }

    @ParameterizedTest
    @ValueSource(longs = {1, 2, 3, 4, 5})
    void anyTreeReadsBackFromItsYaml(long seed) throws IOException {
        RandomDocuments random = new RandomDocuments(seed);
        ObjectMapper mapper = new ObjectMapper();
        for (int i = 0; i < TREES; i++) {
            JsonNode tree = random.anyMap(4);
            String yaml = YamlText.of(tree);
            String description = "seed " + seed + ", tree " + i;
            JsonNode back = RawJson.of(parse(yaml, description).root());
            assertThat(JsonText.compact(back)).as("%s%n%s", description, yaml).isEqualTo(JsonText.compact(tree));
            assertThat(mapper.readTree(JsonText.indented(tree)))
                    .as(description)
                    .isEqualTo(mapper.readTree(JsonText.compact(tree)));
        }
    }

    @ParameterizedTest
    @ValueSource(longs = {11, 12, 13, 14, 15})
    void readerAndSchemaAgreeAndTheResolvedDocumentRepeatsItself(long seed) {
        RandomDocuments random = new RandomDocuments(seed);
        SchemaJudge judge = new SchemaJudge(SampleStrategy.SHAPE);
        int accepted = 0;
        for (int i = 0; i < TREES; i++) {
            String yaml = YamlText.of(random.nearSample());
            String description = "seed " + seed + ", tree " + i;
            Document document = parse(yaml, description);
            Problems problems = new Problems();
            boolean reads = SampleStrategy.SHAPE.read(document.root(), problems).isPresent();
            assertThat(reads).as(description).isEqualTo(problems.isEmpty());
            assertThat(judge.faults(RawJson.of(document.root())).isEmpty())
                    .as("%s%n%s%n%s", description, yaml, problems.list())
                    .isEqualTo(reads);
            if (reads) {
                accepted++;
                resolvedRepeatsItself(document, description);
            }
        }
        assertThat(accepted).as("seed %d", seed).isBetween(TREES / 10, TREES * 9 / 10);
    }

    private static void resolvedRepeatsItself(Document document, String description) {
        JsonNode resolved = SampleStrategy.SHAPE.resolved(document.root());
        Document again = parse(YamlText.of(resolved), description);
        assertThat(SampleStrategy.SHAPE.resolved(again.root())).as(description).isEqualTo(resolved);
        assertThat(SampleStrategy.SHAPE.read(again.root(), new Problems()))
                .as(description)
                .isEqualTo(SampleStrategy.SHAPE.read(document.root(), new Problems()));
    }

    @Test
    void wholeNumbersWithAPointAreWholeForBoth() {
        SchemaJudge judge = new SchemaJudge(Shapes.integer());
        for (String text : new String[] {"5.0", "5e0", "12e2", "-0.0"}) {
            Document document = parse("x: " + text, text);
            assertThat(judge.accepts(RawJson.of(document.at("/x").orElseThrow())))
                    .as(text)
                    .isTrue();
            assertThat(Reading.ofValue(text, Shapes.integer()).problems())
                    .as(text)
                    .isEmpty();
        }
    }
}
