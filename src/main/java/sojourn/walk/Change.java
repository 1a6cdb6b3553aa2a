package sojourn.walk;

import java.util.OptionalDouble;
import sojourn.document.Shape;
import sojourn.market.Known;

/**
 * close_t - close_{t-1}, in the unit of the series: for what is quoted in points rather than as a price, like rates and spreads;
 * none on the first bar and where its close is carried. A series that nothing else uses may be at or below 0.
 *
 * @param asset the series' name
 */
public record Change(String asset) implements Observation {
    static final String WORD = "change";

    static final Shape<Observation> SHAPE = Observed.shape(
            WORD,
            Change::new,
            "the series whose change is observed: close - previous close, per bar, in its own unit (rates, spreads)");

    @Override
    public OptionalDouble at(Known known) {
        int t = known.bar();
        if (t == 0 || known.carried(asset, t)) {
            return OptionalDouble.empty();
        }
        return OptionalDouble.of(known.close(asset, t) - known.close(asset, t - 1));
    }

    @Override
    public boolean takesReturns() {
        return false;
    }

    @Override
    public String word() {
        return WORD;
    }

    @Override
    public String column() {
        return "change_" + asset;
    }
}
