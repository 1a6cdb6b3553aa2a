package sojourn.document;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.net.URISyntaxException;
import java.net.URL;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Objects;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Documents kept as files, each with the messages it must give; what they are is told in the README beside them. */
class DocumentCasesTest {
    private static final SchemaJudge JUDGE = new SchemaJudge(SampleStrategy.SHAPE);

    private record Outcome(List<String> problems, boolean value, boolean schemaAccepts) {}

    static List<Path> good() throws IOException {
        return cases("good");
    }

    static List<Path> syntax() throws IOException {
        return cases("syntax");
    }

    static List<Path> shape() throws IOException {
        return cases("shape");
    }

    static List<Path> meaning() throws IOException {
        return cases("meaning");
    }

    @ParameterizedTest
    @MethodSource("good")
    void aGoodDocumentIsReadAndTheSchemaAcceptsIt(Path file) {
        Outcome outcome = read(file);
        assertThat(outcome.problems()).isEmpty();
        assertThat(outcome.value()).isTrue();
        assertThat(outcome.schemaAccepts()).isTrue();
    }

    @ParameterizedTest
    @MethodSource("syntax")
    void aSyntaxFaultIsToldWhereItStands(Path file) throws IOException {
        assertThat(read(file).problems()).containsExactlyElementsOf(expected(file));
    }

    @ParameterizedTest
    @MethodSource("shape")
    void aShapeFaultIsToldAndTheSchemaRefusesItToo(Path file) throws IOException {
        Outcome outcome = read(file);
        assertThat(outcome.problems()).containsExactlyElementsOf(expected(file));
        assertThat(outcome.value()).isFalse();
        assertThat(outcome.schemaAccepts()).isFalse();
    }

    @ParameterizedTest
    @MethodSource("meaning")
    void aFaultOfMeaningIsToldThoughTheSchemaAcceptsIt(Path file) throws IOException {
        Outcome outcome = read(file);
        assertThat(outcome.problems()).containsExactlyElementsOf(expected(file));
        assertThat(outcome.value()).isFalse();
        assertThat(outcome.schemaAccepts()).isTrue();
    }

    @Test
    void everyRefusedDocumentHasItsMessagesAndEveryKindOccurs() throws IOException {
        int count = 0;
        for (String kind : List.of("syntax", "shape", "meaning")) {
            List<Path> files = cases(kind);
            assertThat(files).as(kind).isNotEmpty();
            for (Path file : files) {
                assertThat(expected(file)).as(file.toString()).isNotEmpty();
            }
            count += files.size();
        }
        assertThat(count).isGreaterThanOrEqualTo(40);
    }

    private static Outcome read(Path file) {
        Problems problems = new Problems();
        var document = Document.read(file, file.getFileName().toString(), problems);
        boolean parsedClean = problems.isEmpty();
        boolean value = document.flatMap(d -> SampleStrategy.SHAPE.read(d.root(), problems))
                .isPresent();
        boolean accepts = parsedClean
                && document.isPresent()
                && JUDGE.accepts(RawJson.of(document.get().root()));
        List<String> told = problems.list().stream().map(Problem::toString).toList();
        return new Outcome(told, value, accepts);
    }

    private static List<String> expected(Path file) throws IOException {
        String name = file.getFileName().toString().replace(".yaml", ".txt");
        return Files.readAllLines(file.resolveSibling(name));
    }

    private static List<Path> cases(String kind) throws IOException {
        URL folder = Objects.requireNonNull(DocumentCasesTest.class.getResource("/documents/" + kind));
        try (Stream<Path> files = Files.list(Path.of(folder.toURI()))) {
            return files.filter(file -> file.toString().endsWith(".yaml"))
                    .sorted()
                    .toList();
        } catch (URISyntaxException e) {
            throw new AssertionError(e);
        }
    }
}
