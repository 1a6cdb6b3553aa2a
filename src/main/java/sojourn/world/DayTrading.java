package sojourn.world;

import sojourn.numeric.RandomStream;

/**
 * Splits a bar's log return into the night and the day and draws the day's extremes: between two closes the log price is a
 * Brownian bridge, the night being the first share s of its variance v. Hence the move until the open is normal with mean
 * s r and variance s (1 - s) v, given the return r; and given the day's move d of variance w = (1 - s) v, its highest point
 * lies (d + sqrt(d² - 2 w ln U)) / 2 above the open, and its lowest likewise below, U being uniform. High and low are drawn
 * independently of each other, each with its exact distribution. Source: Glasserman (2004), Monte Carlo Methods in
 * Financial Engineering, section 6.4.
 */
final class DayTrading {
    /** How much of one day's surprise in log volume is left the next day, and the surprise's standard deviation. */
    private static final double VOLUME_MEMORY = 0.6;

    private static final double VOLUME_SURPRISE = 0.2;

    private final Trading trading;
    private final double ordinaryVolatility;
    private final RandomStream random;
    private double volumeMood;

    /** {@code ordinaryVolatility}: the volatility of a bar at which the typical volume trades. */
    DayTrading(Trading trading, double ordinaryVolatility, RandomStream random) {
        this.trading = trading;
        this.ordinaryVolatility = ordinaryVolatility;
        this.random = random;
    }

    /** The next day, from the log price at the last close, the bar's log return and the volatility it was drawn with. */
    Candle next(double logPrevious, double logReturn, double volatility, int decimals) {
        double share = trading.overnightShare();
        double night = share * logReturn + Math.sqrt(share * (1 - share)) * volatility * random.nextNormal();
        double day = logReturn - night;
        double dayVariance = (1 - share) * volatility * volatility;
        double up = (day + Math.sqrt(day * day - 2 * dayVariance * logUniform())) / 2;
        double down = (day - Math.sqrt(day * day - 2 * dayVariance * logUniform())) / 2;
        double logOpen = logPrevious + night;
        double open = price(logOpen, decimals);
        double close = price(logPrevious + logReturn, decimals);
        double high = Math.max(price(logOpen + up, decimals), Math.max(open, close));
        double low = Math.min(price(logOpen + down, decimals), Math.min(open, close));
        return new Candle(open, high, low, volume(volatility));
    }

    private long volume(double volatility) {
        volumeMood = VOLUME_MEMORY * volumeMood + VOLUME_SURPRISE * random.nextNormal();
        double wildness = StrictMath.log(volatility / ordinaryVolatility);
        double log = StrictMath.log(trading.typicalVolume()) + trading.volumeElasticity() * wildness + volumeMood;
        return Math.max(1, Math.round(StrictMath.exp(log)));
    }

    /** The logarithm of a uniform on (0, 1]. */
    private double logUniform() {
        return StrictMath.log(1 - random.nextDouble());
    }

    private static double price(double logPrice, int decimals) {
        return Decimals.price(StrictMath.exp(logPrice), decimals);
    }
}
