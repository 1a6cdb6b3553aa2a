package sojourn.trade;

import sojourn.allocate.Because;

/**
 * One leg of a filled order.
 *
 * @param decidedOn bar of the decision
 * @param filledOn bar of the fill
 * @param asset index in the price table
 * @param units bought; negative if sold
 * @param price per unit, without costs
 * @param notional traded value, of the sign of the units
 * @param charges what it cost
 * @param weightBefore share of wealth at the fill price before the order
 * @param weightAfter share of wealth at the fill price after the order and its costs
 */
public record Fill(
        int decidedOn,
        int filledOn,
        int asset,
        double units,
        double price,
        double notional,
        Charges charges,
        double weightBefore,
        double weightAfter,
        Because because) {}
