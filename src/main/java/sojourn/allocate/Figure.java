package sojourn.allocate;

import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;

/** Numbers in sentences: two decimals, or as many more as it takes not to say something untrue. */
final class Figure {
    private static final int DECIMALS = 2;

    private Figure() {}

    /** Two decimals. */
    static String of(double value) {
        return new BigDecimal(value).setScale(DECIMALS, RoundingMode.HALF_EVEN).toPlainString();
    }

    /** A number as people write it in a file: 1 and 0.7, not 1.0. */
    static String written(double value) {
        return BigDecimal.valueOf(value).stripTrailingZeros().toPlainString();
    }

    /** A level as written in the file, with at least two decimals. */
    static String level(double level) {
        BigDecimal written = BigDecimal.valueOf(level);
        return written.setScale(Math.max(DECIMALS, written.scale())).toPlainString();
    }

    /** Weights by name, of {@code chosen} among {@code assets}: "stocks 0.70, bonds 0.20"; the reason where there are none. */
    static String weights(Wish wish, List<String> assets, int[] chosen) {
        if (!(wish instanceof Weights weights)) {
            return ((Wish.Undefined) wish).because().sentence();
        }
        List<String> parts = new ArrayList<>();
        for (int asset : chosen) {
            parts.add(assets.get(asset) + " " + of(weights.at(asset)));
        }
        return String.join(", ", parts);
    }

    /** Weights of all assets by name: "stocks 0.70, bonds 0.20". */
    static String weights(Weights weights, List<String> assets) {
        return weights(weights, assets, IntStream.range(0, assets.size()).toArray());
    }

    /** Where {@code held} is not {@code target}, with as many decimals as tell them apart: "stocks 0.999, not 1.000". */
    static String apart(Weights held, Weights target, List<String> assets) {
        List<String> parts = new ArrayList<>();
        for (int asset = 0; asset < assets.size(); asset++) {
            BigDecimal is = new BigDecimal(held.at(asset));
            BigDecimal wanted = new BigDecimal(target.at(asset));
            int decimals = DECIMALS;
            while (rounded(is, decimals).compareTo(rounded(wanted, decimals)) == 0
                    && decimals < Math.max(is.scale(), wanted.scale())) {
                decimals++;
            }
            if (is.compareTo(wanted) != 0) {
                parts.add(assets.get(asset) + " " + rounded(is, decimals).toPlainString() + ", not "
                        + rounded(wanted, decimals).toPlainString());
            }
        }
        return String.join("; ", parts);
    }

    private static BigDecimal rounded(BigDecimal value, int decimals) {
        return value.setScale(decimals, RoundingMode.HALF_EVEN);
    }

    /** {@code value} with enough decimals to stand on the same side of {@code level} as it does in truth. */
    static String beside(double value, double level) {
        BigDecimal exact = new BigDecimal(value);
        BigDecimal limit = BigDecimal.valueOf(level);
        if (value == level) {
            return level(level);
        }
        int decimals = DECIMALS;
        BigDecimal shown = exact.setScale(decimals, RoundingMode.HALF_EVEN);
        while (Integer.signum(shown.compareTo(limit)) != Double.compare(value, level) && decimals < exact.scale()) {
            decimals++;
            shown = exact.setScale(decimals, RoundingMode.HALF_EVEN);
        }
        return shown.toPlainString();
    }
}
