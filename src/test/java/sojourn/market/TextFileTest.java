package sojourn.market;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.RandomAccessFile;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class TextFileTest {
    private static final String TEXT_WANTED = "; save the table as a text file in UTF-8, cells separated by commas";

    @TempDir
    Path folder = Path.of("");

    @Test
    void aMissingFileIsNamedWithThePlaceItWasLookedFor() {
        assertThat(faultsOf("../none.csv"))
                .containsExactly("../none.csv: there is no such file (prices of 'stocks'); it was sought as "
                        + folder.resolveSibling("none.csv") + ": a path is taken from the folder of the strategy file");
    }

    @Test
    void aFolderIsRefused() throws IOException {
        Files.createDirectory(folder.resolve("prices"));
        assertThat(faultsOf("prices"))
                .containsExactly("prices: this is a folder, not a file (prices of 'stocks'); name a file in it");
    }

    @Test
    void aNameThatIsNoPathIsRefused() {
        assertThat(faultsOf("a\0b"))
                .containsExactly("a\0b: this is no path: Nul character not allowed (prices of 'stocks'); name a file");
    }

    @Test
    void aHugeFileIsRefusedBeforeItIsRead() throws IOException {
        try (RandomAccessFile file =
                new RandomAccessFile(folder.resolve("huge.csv").toFile(), "rw")) {
            file.setLength((512L << 20) + 1);
        }
        assertThat(faultsOf("huge.csv"))
                .containsExactly(
                        "huge.csv: the file has 536870913 bytes, more than 512 MiB (prices of 'stocks'); keep only the columns and dates that are needed");
    }

    @Test
    void bytesThatAreNoTextAreRefusedAtTheirPlace() throws IOException {
        Files.write(folder.resolve("junk.csv"), new byte[] {'d', '\n', 'a', 0, 'b'});
        Files.write(folder.resolve("latin.csv"), "date,close\n2020-01-02,Ä\n".getBytes(StandardCharsets.ISO_8859_1));
        Files.write(folder.resolve("wide.csv"), "\ufeffdate,close\n".getBytes(StandardCharsets.UTF_16LE));
        Files.write(folder.resolve("cut.csv"), new byte[] {'d', (byte) 0xc3});
        assertThat(faultsOf("junk.csv"))
                .containsExactly("junk.csv:2:2: the file holds the byte 0x00, which is no text" + TEXT_WANTED);
        assertThat(faultsOf("latin.csv")).containsExactly("latin.csv:2:12: the byte 0xc4 is not UTF-8" + TEXT_WANTED);
        assertThat(faultsOf("wide.csv")).containsExactly("wide.csv:1:1: the byte 0xff is not UTF-8" + TEXT_WANTED);
        assertThat(faultsOf("cut.csv")).containsExactly("cut.csv:1:2: the byte 0xc3 is not UTF-8" + TEXT_WANTED);
    }

    @Test
    void theDigestIsThatOfTheBytes() {
        Fixture.write(folder, "abc.csv", "abc");
        Faults faults = new Faults("prices of 'stocks'");
        TextFile read = TextFile.read(folder, "abc.csv", faults).orElseThrow();
        // FIPS 180-2, appendix B.1: the digest of "abc"
        assertThat(read.sha256()).isEqualTo("ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad");
    }

    @Test
    void faultsOfAllFilesAreToldTogether() {
        Fixture.write(folder, "a.csv", "date,close\n2020-01-02,x\n");
        Fixture.write(folder, "bills.csv", "date,rate\n2020-01-02,y\n");
        CashSource cash = new CashSource.Dated(CsvLayout.of("bills.csv"), "rate", DayCount.ACTUAL_360);
        Map<String, PriceSource> sources = new LinkedHashMap<>();
        sources.put("a", PriceSource.of("a.csv"));
        sources.put("b", PriceSource.of("b.csv"));
        List<String> faults =
                Fixture.faults(() -> PriceReader.read(folder, sources, Calendar.DAILY, cash, List.of("a", "b")));
        assertThat(faults).hasSize(3);
        assertThat(faults.get(0)).startsWith("a.csv:2:12: close 'x'");
        assertThat(faults.get(1)).startsWith("b.csv: there is no such file (prices of 'b');");
        assertThat(faults.get(2)).startsWith("bills.csv:2:12: rate 'y'");
    }

    private List<String> faultsOf(String name) {
        return Fixture.faults(() -> PriceReader.read(
                folder, Map.of("stocks", PriceSource.of(name)), Calendar.DAILY, CashSource.NOTHING, List.of("stocks")));
    }
}
