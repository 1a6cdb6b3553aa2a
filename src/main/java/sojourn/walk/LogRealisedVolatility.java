package sojourn.walk;

import java.util.OptionalDouble;
import sojourn.document.Field;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.market.Known;
import sojourn.numeric.Check;

/**
 * ln sqrt((r_t^2 + ... + r_{t-n+1}^2) / n) of the log returns r of the last n bars: the logarithm of their root mean square, per
 * bar, not annualised; no mean is taken off. None on the first n bars, which have fewer than n returns before them, none where its
 * close is carried, and none where all n returns are 0. Successive numbers share n - 1 returns, more dependence than a regime model allows for: the larger
 * n, the surer of itself it is, and the later it notices.
 *
 * @param asset the asset's name
 * @param bars n, at least 2
 */
public record LogRealisedVolatility(String asset, int bars) implements Observation {
    static final String WORD = "log-realised-volatility";

    private static final int LEAST_BARS = 2;

    private static final Field<Integer> BARS = Field.required(
            "bars", Shapes.integer().atLeast(LEAST_BARS), "how many of the last returns it is computed from, e.g. 21");

    static final Shape<Observation> SHAPE = Shapes.object(
                    WORD,
                    f -> Observed.late(new LogRealisedVolatility(f.get(Observed.OF), f.get(BARS)), f),
                    Observed.OF,
                    BARS,
                    Observed.KNOWN_AFTER)
            .described("logarithm of the root mean square of the last log returns, per bar");

    /** Refuses fewer than 2 bars. */
    public LogRealisedVolatility {
        Check.within(bars, LEAST_BARS, Integer.MAX_VALUE, "bars");
    }

    @Override
    public OptionalDouble at(Known known) {
        if (known.carried(asset, known.bar())) {
            return OptionalDouble.empty();
        }
        double[] closes = known.ownCloses(known.assets().indexOf(asset), bars + 1, known.bar());
        if (closes.length <= bars) {
            return OptionalDouble.empty();
        }
        double sum = 0;
        for (int i = 1; i <= bars; i++) {
            double r = StrictMath.log(closes[i] / closes[i - 1]);
            sum += r * r;
        }
        return sum > 0 ? OptionalDouble.of(0.5 * StrictMath.log(sum / bars)) : OptionalDouble.empty();
    }

    @Override
    public String word() {
        return WORD;
    }

    @Override
    public String column() {
        return "log_realised_volatility_" + bars + "_" + asset;
    }

    @Override
    public boolean aroundZero() {
        return false;
    }

    @Override
    public String inWords() {
        return WORD + " of " + asset + " over " + bars + " bars";
    }
}
