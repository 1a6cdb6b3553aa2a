package sojourn.world;

import java.util.List;

/**
 * An invented market: its truth and what it published.
 *
 * @param world what was stated
 * @param truth the true state of every trading day
 * @param prices the prices of each asset, in the world's order
 * @param bills the bill rates
 */
public record InventedMarket(World world, WorldTruth truth, List<InventedPrices> prices, List<BillRate> bills) {
    /** Copies the lists. */
    public InventedMarket {
        prices = List.copyOf(prices);
        bills = List.copyOf(bills);
    }
}
