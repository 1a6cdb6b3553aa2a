package sojourn.trade;

import sojourn.allocate.Because;
import sojourn.allocate.Weights;

/**
 * A basket waiting to be filled.
 *
 * @param decidedOn the bar at whose close it was decided
 * @param dueOn the bar it fills on, which may lie beyond the last bar there is
 * @param target weights after the fill and its costs
 */
public record Order(int decidedOn, int dueOn, Weights target, Because because) {}
