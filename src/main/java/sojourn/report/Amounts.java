package sojourn.report;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.Locale;

/** Prices, units and money as people read them. */
final class Amounts {
    private static final MathContext PRICE = new MathContext(7);

    private Amounts() {}

    /** A price with at most seven digits: 1234.56. */
    static String price(double price) {
        BigDecimal rounded = new BigDecimal(price).round(PRICE).stripTrailingZeros();
        return rounded.scale() < 0 ? rounded.setScale(0).toPlainString() : rounded.toPlainString();
    }

    /** Units, signed, with up to four decimals. */
    static String units(double units) {
        BigDecimal rounded =
                new BigDecimal(units).setScale(4, RoundingMode.HALF_EVEN).stripTrailingZeros();
        String plain = rounded.scale() < 0 ? rounded.setScale(0).toPlainString() : rounded.toPlainString();
        return units > 0 ? "+" + plain : plain;
    }

    /** Money with two decimals. */
    static String money(double money) {
        String text = String.format(Locale.ROOT, "%.2f", money);
        return text.equals("-0.00") ? "0.00" : text;
    }

    /** A fraction as percent. */
    static String percent(double fraction, int decimals) {
        return new BigDecimal(fraction)
                        .movePointRight(2)
                        .setScale(decimals, RoundingMode.HALF_EVEN)
                        .toPlainString()
                + " %";
    }

    /** A return with its sign, as percent. */
    static String signed(double fraction, int decimals) {
        return (fraction > 0 ? "+" : "") + percent(fraction, decimals);
    }
}
