package sojourn.trade;

import java.util.Optional;
import sojourn.allocate.Because;
import sojourn.allocate.Weights;

/**
 * A basket waiting to be filled.
 *
 * @param decidedOn the bar at whose close it was decided
 * @param dueOn the bar it fills on, which may lie beyond the last bar there is
 * @param target weights after the fill and its costs
 * @param quantities units to hold after the fill where they are settled before it; otherwise the fill price settles them
 * @param stage whether some of it has been traded already
 */
public record Order(
        int decidedOn, int dueOn, Weights target, Optional<Quantities> quantities, Because because, Stage stage) {
    /** How far an order is. */
    public enum Stage {
        /** Nothing of it has been traded. */
        WHOLE,
        /** What is left of an order that was traded in part. */
        REST
    }

    /** An order whose quantities the fill price settles. */
    public Order(int decidedOn, int dueOn, Weights target, Because because) {
        this(decidedOn, dueOn, target, Optional.empty(), because, Stage.WHOLE);
    }

    /** The same, to hold these units. */
    Order toHold(Quantities units) {
        return new Order(decidedOn, dueOn, target, Optional.of(units), because, stage);
    }

    /** What is left to come to these units, after a part of it was traded. */
    Order restToHold(Quantities units) {
        return new Order(decidedOn, dueOn, target, Optional.of(units), because, Stage.REST);
    }
}
