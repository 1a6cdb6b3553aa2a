package sojourn.document;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class DocumentTest {
    private static final String TEXT = """
            prices:
              stocks: {csv: a.csv}
              "b/c~d": {csv: b.csv}
            states: [calm, stormy]
            """;

    private static Document parse(String text) {
        Problems problems = new Problems();
        Document document = Document.parse("t.yaml", text, problems).orElseThrow();
        assertThat(problems.list()).isEmpty();
        return document;
    }

    private static String place(Node node) {
        return node.line() + ":" + node.column() + " " + node.path() + " " + node.name();
    }

    @Test
    void everyNodeKnowsItsPlacePathAndName() {
        Document document = parse(TEXT);
        assertThat(place(document.root())).isEqualTo("1:1  the file");
        assertThat(place(document.at("/prices/stocks").orElseThrow())).isEqualTo("2:11 /prices/stocks 'stocks'");
        assertThat(place(document.at("/prices/stocks/csv").orElseThrow())).isEqualTo("2:17 /prices/stocks/csv 'csv'");
        assertThat(place(document.at("/states/1").orElseThrow())).isEqualTo("4:16 /states/1 item 2 of 'states'");
        assertThat(place(document.at("/prices/b~1c~0d/csv").orElseThrow())).isEqualTo("3:18 /prices/b~1c~0d/csv 'csv'");
        MapNode prices = (MapNode) document.at("/prices").orElseThrow();
        assertThat(prices.keys()).containsExactly("stocks", "b/c~d");
        Place key = prices.keyPlace("stocks").orElseThrow();
        assertThat(key.line()).isEqualTo(2);
        assertThat(key.column()).isEqualTo(3);
        assertThat(prices.keyPlace("bonds")).isEmpty();
    }

    @Test
    void columnsCountCharactersNotCodeUnits() {
        assertThat(parse("{a: 🌊🌊, b: x}").at("/b").orElseThrow().column()).isEqualTo(12);
    }

    @Test
    void aPointerThatLeadsNowhereFindsNothing() {
        Document document = parse(TEXT);
        for (String pointer : List.of("/bonds", "/states/2", "/states/01", "/states/x", "/prices/stocks/csv/x")) {
            assertThat(document.at(pointer)).as(pointer).isEmpty();
        }
        assertThatThrownBy(() -> document.at("prices"))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("'prices'");
    }

    @Test
    void keysAreFoundByPointerAndWhereThereIsNoneTheNearestNode() {
        Document document = parse(TEXT);
        assertThat(document.keyPlace("/prices/stocks").column()).isEqualTo(3);
        assertThat(document.keyPlace("/prices/b~1c~0d").line()).isEqualTo(3);
        assertThat(document.keyPlace("/prices/gold").path()).isEqualTo("/prices");
        assertThat(document.keyPlace("/states/1").path()).isEqualTo("/states/1");
        assertThat(document.keyPlace("").path()).isEmpty();
    }

    @Test
    void nearestStopsAtTheInnermostWrittenNode() {
        Document document = parse(TEXT);
        assertThat(document.nearest("/prices/stocks/close").path()).isEqualTo("/prices/stocks");
        assertThat(document.nearest("/refit/every").path()).isEmpty();
        assertThat(document.nearest("/states/0").path()).isEqualTo("/states/0");
    }

    @Test
    void aReplacedValueKeepsItsOwnPlaceAndGetsTheNewPath() {
        Document document = parse("levels: {high: 0.7}\nvary:\n  levels.high: [0.6, 0.8]\nlist: [a, b]\n");
        Node varied = document.at("/vary/levels.high/1").orElseThrow();
        Document changed = document.with("/levels/high", varied).orElseThrow().without("vary");
        assertThat(RawJson.of(changed.root())).hasToString("{\"levels\":{\"high\":0.8},\"list\":[\"a\",\"b\"]}");
        assertThat(place(changed.at("/levels/high").orElseThrow())).isEqualTo("3:22 /levels/high 'high'");
        Document added = document.with("/refit/every", varied).orElseThrow();
        assertThat(place(added.at("/refit/every").orElseThrow())).isEqualTo("3:22 /refit/every 'every'");
        Document item = document.with("/list/1", varied).orElseThrow();
        assertThat(RawJson.of(item.at("/list").orElseThrow())).hasToString("[\"a\",0.8]");
        assertThat(RawJson.of(document.root()).at("/levels/high").doubleValue()).isEqualTo(0.7);
    }

    @Test
    void aReplacementThatLeadsIntoAValueIsEmpty() {
        Document document = parse(TEXT);
        Node value = document.at("/states").orElseThrow();
        assertThat(document.with("/states/2", value)).isEmpty();
        assertThat(document.with("/states/0/x", value)).isEmpty();
        assertThat(document.with("", value)).isEmpty();
    }

    @Test
    void aByteOrderMarkIsPassedOver(@TempDir Path folder) throws IOException {
        assertThat(readProblems(folder, "\uFEFFa: 1\n".getBytes(StandardCharsets.UTF_8)))
                .isEmpty();
    }

    @Test
    void bytesThatAreNotUtf8ArePlaced(@TempDir Path folder) throws IOException {
        byte[] latin1 = "a: 1\nb: Zürich\n".getBytes(StandardCharsets.ISO_8859_1);
        assertThat(readProblems(folder, latin1))
                .containsExactly("s.yaml:2:5: this byte is not UTF-8; save the file as UTF-8");
        byte[] utf16 = "a: 1\n".getBytes(StandardCharsets.UTF_16);
        assertThat(readProblems(folder, utf16))
                .containsExactly("s.yaml:1:1: this byte is not UTF-8; save the file as UTF-8");
        byte[] cut = {'a', ':', ' ', (byte) 0xC3};
        assertThat(readProblems(folder, cut))
                .containsExactly("s.yaml:1:4: this byte is not UTF-8; save the file as UTF-8");
    }

    @Test
    void aFileThatCannotBeReadIsTold(@TempDir Path folder) {
        Problems problems = new Problems();
        assertThat(Document.read(folder.resolve("none.yaml"), "none.yaml", problems))
                .isEmpty();
        assertThat(Document.read(folder, "folder", problems)).isEmpty();
        assertThat(problems.list().stream().map(Problem::toString))
                .containsExactly(
                        "none.yaml: there is no such file; check the name and the folder",
                        "folder: this is a folder; give a YAML file that you may read");
    }

    @Test
    void aFileOfTooManyBytesIsNotDecoded(@TempDir Path folder) throws IOException {
        byte[] bytes = new byte[4 * Limits.CODE_POINTS + 1];
        assertThat(readProblems(folder, bytes))
                .containsExactly("s.yaml: the file has more than 1048576 characters; give a smaller file");
    }

    private static List<String> readProblems(Path folder, byte[] bytes) throws IOException {
        Path file = folder.resolve("f.yaml");
        Files.write(file, bytes);
        Problems problems = new Problems();
        Optional<Document> document = Document.read(file, "s.yaml", problems);
        assertThat(document.isPresent()).isEqualTo(problems.isEmpty());
        return problems.list().stream().map(Problem::toString).toList();
    }
}
