package sojourn.world;

import java.time.LocalDate;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * One row of an asset's price file, rounded as it is published.
 *
 * @param date the trading day
 * @param close the close, without coupons
 * @param candle the day's trading, if the asset has any
 * @param totalReturn an index that puts coupons back into the asset, if it pays any
 */
public record Quote(LocalDate date, double close, Optional<Candle> candle, OptionalDouble totalReturn) {}
