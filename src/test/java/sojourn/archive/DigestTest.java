package sojourn.archive;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.charset.StandardCharsets;
import org.junit.jupiter.api.Test;

class DigestTest {
    /** FIPS 180-2 (2002), appendix B.1: the one-block message "abc". */
    @Test
    void bytesAloneAreSha256() {
        assertThat(Digest.of("abc".getBytes(StandardCharsets.US_ASCII)))
                .isEqualTo("ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad");
    }

    @Test
    void whereOneTextEndsAndTheNextBeginsMatters() {
        assertThat(Digest.begin().text("ab").text("c").hex())
                .isNotEqualTo(Digest.begin().text("a").text("bc").hex());
    }

    @Test
    void theLastBitOfANumberMatters() {
        double[] column = {0.1, 0.2};
        double[] next = {0.1, Math.nextUp(0.2)};
        assertThat(Digest.begin().column(column).hex())
                .isEqualTo(Digest.begin().column(column.clone()).hex())
                .isNotEqualTo(Digest.begin().column(next).hex());
    }

    @Test
    void theDigestIsThatOfLengthThenContent() {
        byte[] framed = {0, 0, 0, 2, 'o', 'k'};
        assertThat(Digest.begin().text("ok").hex()).isEqualTo(Digest.of(framed));
        assertThat(Digest.begin().bytes(new byte[] {'o', 'k'}).hex()).isEqualTo(Digest.of(framed));
    }
}
