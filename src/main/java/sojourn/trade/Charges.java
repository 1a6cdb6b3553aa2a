package sojourn.trade;

/**
 * What one leg of an order costs, item by item; money, each at least 0.
 *
 * @param commission in proportion to the traded value, or the minimum fee
 * @param fixedFee the same whatever is traded
 * @param halfSpread lost between the middle and the bid or ask
 * @param stampDuty tax on what is bought
 * @param impact lost because the order itself moves the price
 */
public record Charges(double commission, double fixedFee, double halfSpread, double stampDuty, double impact) {
    /** No charge. */
    public static final Charges NONE = new Charges(0, 0, 0, 0, 0);

    /** The sum of all. */
    public double total() {
        return commission + fixedFee + halfSpread + stampDuty + impact;
    }
}
