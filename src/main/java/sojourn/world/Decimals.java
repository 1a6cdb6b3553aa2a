package sojourn.world;

import java.math.BigDecimal;
import java.math.RoundingMode;

/** Numbers as an exchange publishes them: a fixed count of decimals, half to even, computed exactly on the binary value. */
final class Decimals {
    /** Of a bill rate in percent. */
    static final int OF_RATES = 2;

    /** Of a total return index. */
    static final int OF_TOTAL_RETURNS = 4;

    private Decimals() {}

    /** {@code value} rounded to {@code decimals}. */
    static double round(double value, int decimals) {
        return exactly(value, decimals).doubleValue();
    }

    /** A price rounded to {@code decimals}; never below one unit of the last decimal. */
    static double price(double value, int decimals) {
        return exactly(value, decimals)
                .max(BigDecimal.ONE.movePointLeft(decimals))
                .doubleValue();
    }

    /** A rounded number written out with all its {@code decimals}. */
    static String text(double rounded, int decimals) {
        return exactly(rounded, decimals).toPlainString();
    }

    private static BigDecimal exactly(double value, int decimals) {
        return new BigDecimal(value).setScale(decimals, RoundingMode.HALF_EVEN);
    }
}
