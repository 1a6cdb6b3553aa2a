package sojourn.walk;

import java.util.LinkedHashMap;
import java.util.Map;
import java.util.OptionalDouble;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.market.Known;

/**
 * What the regime model sees of the market at each close: one number, computed from what was known then. A new kind of
 * observation is one record and one line in {@link #shape()}.
 */
public interface Observation {
    /**
     * The number at the close that {@code known} ends with; empty where there is none (a missing observation). A walk does not ask
     * at the file's first bar, on which no asset has a return.
     */
    OptionalDouble at(Known known);

    /** The asset it is computed from, which orders the regimes unless the strategy names another. */
    String asset();

    /** Its word in the strategy file. */
    String word();

    /** Its name in result files: letters, digits and underscores. */
    String column();

    /** Every kind of observation, by its word in the strategy file. */
    static Shape<Observation> shape() {
        Map<String, Shape<? extends Observation>> kinds = new LinkedHashMap<>();
        kinds.put(LogReturn.WORD, LogReturn.SHAPE);
        kinds.put(SimpleReturn.WORD, SimpleReturn.SHAPE);
        return Shapes.oneKey(kinds);
    }
}
