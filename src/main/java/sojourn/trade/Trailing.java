package sojourn.trade;

import java.util.OptionalDouble;
import sojourn.market.Known;

/** What was known at a close of how an asset had traded on the bars that end there. */
final class Trailing {
    private Trailing() {}

    /**
     * Standard deviation (divisor n - 1) of the last {@code bars} simple returns between closes of its own, per bar, two passes; 0 for a constant price.
     * Empty while there are fewer returns. Cost: two reads of the window.
     */
    static OptionalDouble volatility(Known known, int asset, int bars) {
        double[] closes = known.ownCloses(asset, bars + 1, known.bar());
        if (closes.length <= bars) {
            return OptionalDouble.empty();
        }
        double sum = 0;
        for (int i = 1; i <= bars; i++) {
            sum += closes[i] / closes[i - 1] - 1;
        }
        double mean = sum / bars;
        double squares = 0;
        for (int i = 1; i <= bars; i++) {
            double deviation = closes[i] / closes[i - 1] - 1 - mean;
            squares += deviation * deviation;
        }
        return OptionalDouble.of(Math.sqrt(squares / (bars - 1)));
    }

    /**
     * Mean of volume × close over those of the last {@code bars} bars that have a volume, money a bar. Empty while there are fewer
     * bars, and where none of them has a volume or every volume is 0.
     */
    static OptionalDouble tradedValue(Known known, int asset, int bars) {
        int start = known.bar() - bars + 1;
        if (start < 0) {
            return OptionalDouble.empty();
        }
        double sum = 0;
        int count = 0;
        for (int bar = start; bar <= known.bar(); bar++) {
            OptionalDouble volume = known.volume(asset, bar);
            if (volume.isPresent()) {
                sum += volume.getAsDouble() * known.close(asset, bar);
                count++;
            }
        }
        return sum > 0 ? OptionalDouble.of(sum / count) : OptionalDouble.empty();
    }
}
