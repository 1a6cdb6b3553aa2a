package sojourn.numeric;

import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.simple.RandomSource;

/**
 * A stream of random numbers named by a master seed, a purpose and further parts (a date, an index): the same name gives
 * the same numbers on every machine, whatever else runs. The seed is SHA-256 of the name; the generator is xoshiro256++
 * (Blackman and Vigna 2021, ACM Trans. Math. Softw. 47); normals come by the inverse distribution function, one uniform
 * each. One stream belongs to one thread.
 */
public final class RandomStream {
    private static final double UNIT = 0x1.0p-53;

    private final UniformRandomProvider generator;

    private RandomStream(UniformRandomProvider generator) {
        this.generator = generator;
    }

    /** The stream of that name. {@code purpose} and {@code parts} may hold any text. */
    public static RandomStream of(long masterSeed, String purpose, String... parts) {
        MessageDigest digest = sha256();
        digest.update(ByteBuffer.allocate(Long.BYTES).putLong(masterSeed).array());
        absorb(digest, purpose);
        for (String part : parts) {
            absorb(digest, part);
        }
        ByteBuffer hash = ByteBuffer.wrap(digest.digest());
        long[] seed = {hash.getLong(), hash.getLong(), hash.getLong(), hash.getLong()};
        return new RandomStream(RandomSource.XO_SHI_RO_256_PP.create(seed));
    }

    /** Uniform on [0, 1), a multiple of 2^-53. */
    public double nextDouble() {
        return (generator.nextLong() >>> 11) * UNIT;
    }

    /** Uniform on 0, 1, …, {@code bound} - 1, without bias (rejection). */
    public int nextInt(int bound) {
        Check.within(bound, 1, Integer.MAX_VALUE, "bound");
        long limit = (1L << 31) - (1L << 31) % bound;
        long draw = generator.nextLong() >>> 33;
        while (draw >= limit) {
            draw = generator.nextLong() >>> 33;
        }
        return (int) (draw % bound);
    }

    /** A standard normal. */
    public double nextNormal() {
        return NormalQuantile.of(((generator.nextLong() >>> 12) + 0.5) * 0x1.0p-52);
    }

    private static void absorb(MessageDigest digest, String text) {
        byte[] bytes = text.getBytes(StandardCharsets.UTF_8);
        digest.update(ByteBuffer.allocate(Integer.BYTES).putInt(bytes.length).array());
        digest.update(bytes);
    }

    private static MessageDigest sha256() {
        try {
            return MessageDigest.getInstance("SHA-256");
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException("every Java platform has SHA-256", e);
        }
    }
}
