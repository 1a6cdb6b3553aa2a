package sojourn.archive;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatExceptionOfType;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import sojourn.document.InputException;

class ResultFolderTest {
    private static final String DIGEST = "0123456789abcdef";

    @TempDir
    Path temp;

    @Test
    void nothingBearsTheNameBeforeTheRecordIsWritten() throws IOException {
        Path results = temp.resolve("results");
        try (ResultFolder folder = ResultFolder.begin(results)) {
            folder.write("a/path.csv", "x\n");
            assertThat(results.resolve("mine")).doesNotExist();
            folder.publish("mine", DIGEST, record(DIGEST));
        }
        assertThat(names(results)).containsExactly("mine");
        assertThat(results.resolve("mine/a/path.csv")).hasContent("x\n");
        assertThat(results.resolve("mine").resolve(ResultFolder.RECORD)).hasContent(record(DIGEST));
    }

    @Test
    void writingThatIsInterruptedLeavesNoFolder() throws IOException {
        try (ResultFolder folder = ResultFolder.begin(temp)) {
            folder.write("a/path.csv", "x\n");
            assertThatIllegalArgumentException()
                    .isThrownBy(() -> folder.write("../outside.csv", "x\n"))
                    .withMessageContaining("../outside.csv");
        }
        assertThat(names(temp)).isEmpty();
    }

    @Test
    void twoResultsMayBeWrittenAtOnce() throws IOException {
        try (ResultFolder one = ResultFolder.begin(temp);
                ResultFolder two = ResultFolder.begin(temp)) {
            one.write("x.csv", "one");
            two.write("x.csv", "two");
            one.publish("mine", DIGEST, record(DIGEST));
            ResultFolder.Published second = two.publish("mine", "fedcba9876543210", record("fedcba9876543210"));
            assertThat(second.folder()).isEqualTo(temp.resolve("mine-fedcba98"));
        }
        assertThat(names(temp)).containsExactly("mine", "mine-fedcba98");
        assertThat(temp.resolve("mine/x.csv")).hasContent("one");
        assertThat(temp.resolve("mine-fedcba98/x.csv")).hasContent("two");
    }

    @Test
    void theSameDigestIsLeftAlone() throws IOException {
        publish("first");
        ResultFolder.Published again = publish("second");
        assertThat(again.arrival()).isEqualTo(ResultFolder.Arrival.STOOD_ALREADY);
        assertThat(temp.resolve("mine/x.csv")).hasContent("first");
        assertThat(names(temp)).containsExactly("mine");
    }

    @Test
    void aRecordThatCannotBeReadIsSomeOtherResult() throws IOException {
        Files.createDirectories(temp.resolve("mine"));
        Files.writeString(temp.resolve("mine/record.json"), "{ torn");
        assertThat(publish("content").folder()).isEqualTo(temp.resolve("mine-01234567"));
        assertThat(temp.resolve("mine/record.json")).hasContent("{ torn");
    }

    @Test
    void aFileWhereAFolderIsExpectedIsToldWithItsPath() throws IOException {
        Path file = Files.writeString(temp.resolve("file"), "x");
        assertThatExceptionOfType(InputException.class)
                .isThrownBy(() -> ResultFolder.begin(file.resolve("results")))
                .withMessageContaining(file.resolve("results").toString())
                .withMessageContaining("cannot be written");
    }

    private ResultFolder.Published publish(String content) {
        try (ResultFolder folder = ResultFolder.begin(temp)) {
            folder.write("x.csv", content);
            return folder.publish("mine", DIGEST, record(DIGEST));
        }
    }

    private static String record(String digest) {
        return "{\"digest\": \"" + digest + "\"}";
    }

    private static List<String> names(Path folder) throws IOException {
        try (Stream<Path> entries = Files.list(folder)) {
            return entries.map(path -> path.getFileName().toString()).sorted().toList();
        }
    }
}
