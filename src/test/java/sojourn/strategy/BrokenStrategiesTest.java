package sojourn.strategy;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import sojourn.document.Document;
import sojourn.document.Problems;
import sojourn.document.RawJson;
import sojourn.document.SchemaJudge;

/** Strategy files with mistakes that people make, each with the messages it must give; see the README beside them. */
class BrokenStrategiesTest {
    private static final SchemaJudge JUDGE = new SchemaJudge(Strategy.SHAPE);

    /** Who can see the fault, by the number that a file's name begins with. */
    private enum Kind {
        SYNTAX,
        SHAPE,
        MEANING;

        static Kind of(Path file) {
            int number = Integer.parseInt(file.getFileName().toString().substring(0, 2));
            return number < 20 ? SYNTAX : number < 70 ? SHAPE : MEANING;
        }
    }

    static List<Path> broken() throws IOException {
        return Samples.broken();
    }

    @ParameterizedTest
    @MethodSource("broken")
    void everyFaultIsToldInTheOrderOfTheFile(Path file) throws IOException {
        String expected = file.getFileName().toString().replace(".yaml", ".expected");
        List<String> lines = Files.readAllLines(file.resolveSibling(expected));
        assertThat(lines).isNotEmpty();
        assertThat(Samples.messages(file)).containsExactlyElementsOf(lines);
    }

    @ParameterizedTest
    @MethodSource("broken")
    void theSchemaSeesWhatASchemaCanSee(Path file) {
        Problems whileReading = new Problems();
        Optional<Document> document = Document.read(file, "broken.yaml", whileReading);
        Kind kind = Kind.of(file);
        assertThat(whileReading.isEmpty()).as("the text is clean").isEqualTo(kind != Kind.SYNTAX);
        if (kind != Kind.SYNTAX) {
            List<String> faults = JUDGE.faults(RawJson.of(document.orElseThrow().root()));
            assertThat(faults.isEmpty()).as("the schema accepts it: " + faults).isEqualTo(kind == Kind.MEANING);
        }
    }

    @Test
    void everyKindOfMistakeIsThere() throws IOException {
        List<Path> files = Samples.broken();
        assertThat(files).extracting(Kind::of).contains(Kind.values());
        assertThat(files).hasSizeGreaterThanOrEqualTo(45);
    }
}
