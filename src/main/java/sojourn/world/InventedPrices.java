package sojourn.world;

import java.util.List;

/**
 * The published prices of one asset.
 *
 * @param asset its name
 * @param listing how it is quoted
 * @param quotes one for each of its trading days, in order
 */
public record InventedPrices(String asset, Listing listing, List<Quote> quotes) {
    /** Copies. */
    public InventedPrices {
        quotes = List.copyOf(quotes);
    }
}
