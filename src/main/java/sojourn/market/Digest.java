package sojourn.market;

import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;

/** SHA-256 over named parts, each with its length, so that no two lists of parts run together into the same bytes. */
final class Digest {
    private final MessageDigest sha256 = sha256();

    /** Adds a part. Not modified. */
    void add(String name, byte[] part) {
        absorb(name.getBytes(StandardCharsets.UTF_8));
        absorb(part);
    }

    String hex() {
        return HexFormat.of().formatHex(sha256.digest());
    }

    /** SHA-256 of {@code bytes} alone, as other programs compute it. Not modified. */
    static String ofFile(byte[] bytes) {
        return HexFormat.of().formatHex(sha256().digest(bytes));
    }

    private void absorb(byte[] bytes) {
        sha256.update(ByteBuffer.allocate(Long.BYTES).putLong(bytes.length).array());
        sha256.update(bytes);
    }

    private static MessageDigest sha256() {
        try {
            return MessageDigest.getInstance("SHA-256");
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException("every Java platform has SHA-256", e);
        }
    }
}
