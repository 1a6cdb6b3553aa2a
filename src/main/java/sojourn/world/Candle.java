package sojourn.world;

/**
 * What a day of trading left besides its close.
 *
 * @param open the first price
 * @param high the highest, at least open and close
 * @param low the lowest, at most open and close
 * @param volume units traded, at least 1
 */
public record Candle(double open, double high, double low, long volume) {}
