package sojourn.archive;

import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;

/** SHA-256 over texts and the raw bits of numbers, each with its length, so that no two inputs run into each other. */
public final class Digest {
    private final MessageDigest sha256;

    private Digest(MessageDigest sha256) {
        this.sha256 = sha256;
    }

    /** Over nothing so far. */
    public static Digest begin() {
        try {
            return new Digest(MessageDigest.getInstance("SHA-256"));
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException("every Java platform has SHA-256", e);
        }
    }

    /** The hexadecimal SHA-256 of some bytes alone. Not modified. */
    public static String of(byte[] bytes) {
        return HexFormat.of().formatHex(begin().sha256.digest(bytes));
    }

    /** Takes in a text. */
    public Digest text(String text) {
        byte[] bytes = text.getBytes(StandardCharsets.UTF_8);
        count(bytes.length);
        sha256.update(bytes);
        return this;
    }

    /** Takes in bytes. Not modified. */
    public Digest bytes(byte[] bytes) {
        count(bytes.length);
        sha256.update(bytes);
        return this;
    }

    /** Takes in the raw bits of a column. Not modified. */
    public Digest column(double[] values) {
        count(values.length);
        ByteBuffer bits = ByteBuffer.allocate(Long.BYTES * values.length);
        for (double value : values) {
            bits.putLong(Double.doubleToLongBits(value));
        }
        sha256.update(bits.array());
        return this;
    }

    /** The 64 hexadecimal digits. Call once. */
    public String hex() {
        return HexFormat.of().formatHex(sha256.digest());
    }

    private void count(int length) {
        sha256.update(ByteBuffer.allocate(Integer.BYTES).putInt(length).array());
    }
}
