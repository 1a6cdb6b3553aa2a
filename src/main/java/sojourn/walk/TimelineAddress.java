package sojourn.walk;

import java.nio.ByteBuffer;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import sojourn.market.Known;
import sojourn.market.PriceTable;

/**
 * The address of a timeline: a hash chain that starts from the settings and takes in bar after bar exactly what a walk may see
 * (date, closes, what the observations read besides closes, probabilities computed elsewhere that count, the cash rate). Equal addresses mean equal timelines; the address at an earlier bar is that of the shorter
 * history.
 */
public final class TimelineAddress {
    private static final int SHOWN_DIGITS = 16;

    private TimelineAddress() {}

    /**
     * The address after the last bar.
     *
     * @param settings the resolved sections that the walk depends on, in one fixed form. Not modified.
     * @param observed what the walk observes
     */
    public static String of(byte[] settings, PriceTable table, List<Observation> observed) {
        return at(settings, table, observed, table.size() - 1);
    }

    /** The address after {@code lastBar}; {@code settings} is not modified. */
    public static String at(byte[] settings, PriceTable table, List<Observation> observed, int lastBar) {
        MessageDigest digest = sha256();
        byte[] link = digest.digest(settings);
        int beside = observed.stream()
                .mapToInt(one -> one.reads().size() + (one.fromPrices() ? 0 : 1))
                .sum();
        ByteBuffer row = ByteBuffer.allocate(
                Long.BYTES * (2 + table.assets().size() + table.levels().size() + beside));
        for (int bar = 0; bar <= lastBar; bar++) {
            Known known = table.knownAt(bar);
            row.clear();
            row.putLong(known.date().toEpochDay());
            for (int asset = 0; asset < table.assets().size(); asset++) {
                row.putLong(Double.doubleToLongBits(known.close(asset, bar)));
            }
            for (String level : table.levels()) {
                row.putLong(Double.doubleToLongBits(known.close(level, bar)));
            }
            for (Observation one : observed) {
                one.reads()
                        .forEach(column -> row.putLong(
                                Double.doubleToLongBits(column.of(known, table.asset(one.asset()), known.bar())
                                        .orElse(Double.NaN))));
                if (!one.fromPrices()) {
                    row.putLong(Double.doubleToLongBits(one.at(known).orElse(Double.NaN)));
                }
            }
            row.putLong(Double.doubleToLongBits(known.expectedCashReturn()));
            digest.update(link);
            carried(known, table).ifPresent(digest::update);
            link = digest.digest(row.array());
        }
        return HexFormat.of().formatHex(link).substring(0, SHOWN_DIGITS);
    }

    /** A byte a series, 1 where its close is carried; empty on bars where none is, so that one calendar has one address. */
    private static Optional<byte[]> carried(Known known, PriceTable table) {
        byte[] carried = new byte[table.assets().size() + table.levels().size()];
        int series = 0;
        boolean any = false;
        for (String name :
                Stream.concat(table.assets().stream(), table.levels().stream()).toList()) {
            boolean here = known.carried(name, known.bar());
            carried[series++] = (byte) (here ? 1 : 0);
            any |= here;
        }
        return any ? Optional.of(carried) : Optional.empty();
    }

    private static MessageDigest sha256() {
        try {
            return MessageDigest.getInstance("SHA-256");
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException("every Java platform has SHA-256", e);
        }
    }
}
