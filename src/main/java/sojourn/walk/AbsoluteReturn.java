package sojourn.walk;

import java.util.OptionalDouble;
import sojourn.document.Shape;
import sojourn.market.Known;

/**
 * |ln(close_t / close_{t-1})|, the size of the log return; none on the first bar and where its close is carried, 0 where the close stands still.
 *
 * @param asset the asset's name
 */
public record AbsoluteReturn(String asset) implements Observation {
    static final String WORD = "absolute-return";

    static final Shape<Observation> SHAPE = Observed.shape(
            WORD,
            AbsoluteReturn::new,
            "the asset whose log return is observed in size: |ln(close / previous close)|, per bar");

    @Override
    public OptionalDouble at(Known known) {
        int t = known.bar();
        if (t == 0 || known.carried(asset, t)) {
            return OptionalDouble.empty();
        }
        int index = known.assets().indexOf(asset);
        return OptionalDouble.of(Math.abs(StrictMath.log(known.close(index, t) / known.close(index, t - 1))));
    }

    @Override
    public String word() {
        return WORD;
    }

    @Override
    public String column() {
        return "absolute_return_" + asset;
    }

    @Override
    public boolean aroundZero() {
        return false;
    }
}
