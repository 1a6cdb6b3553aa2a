package sojourn.world;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import sojourn.numeric.RandomStream;

class DayTradingTest {
    private static final int DAYS = 20_000;
    private static final double VOLATILITY = 0.01;

    /** At this many decimals and a price near 1000, rounding is far below a day's move. */
    private static final int DECIMALS = 6;

    private static final double SIGMAS = 4;

    @Test
    void theMeanRangeIsThatOfBrownianMotion() {
        RandomStream random = RandomStream.of(3, "range test");
        DayTrading days = new DayTrading(new Trading(0, 1000, 0), VOLATILITY, RandomStream.of(3, "range test days"));
        double sum = 0;
        double squares = 0;
        for (int i = 0; i < DAYS; i++) {
            Candle candle = days.next(logPrice(1000), VOLATILITY * random.nextNormal(), VOLATILITY, DECIMALS);
            double range = StrictMath.log(candle.high() / candle.low()) / VOLATILITY;
            sum += range;
            squares += range * range;
        }
        double mean = sum / DAYS;
        double standardError = Math.sqrt((squares / DAYS - mean * mean) / DAYS);
        double expected = Math.sqrt(8 / Math.PI); // Feller (1951), Ann. Math. Statist. 22, 427-432
        assertThat(standardError).isLessThan(0.005);
        assertThat(mean).isCloseTo(expected, within(SIGMAS * standardError));
    }

    @Test
    void theNightTakesItsShareOfTheVarianceAndIsUncorrelatedWithTheDay() {
        double share = 0.3;
        RandomStream random = RandomStream.of(4, "night test");
        DayTrading days = new DayTrading(new Trading(share, 1000, 0), VOLATILITY, RandomStream.of(4, "night days"));
        double nights = 0;
        double products = 0;
        for (int i = 0; i < DAYS; i++) {
            double move = VOLATILITY * random.nextNormal();
            Candle candle = days.next(logPrice(1000), move, VOLATILITY, DECIMALS);
            double night = (StrictMath.log(candle.open()) - logPrice(1000)) / VOLATILITY;
            double day = move / VOLATILITY - night;
            nights += night * night;
            products += night * day;
        }
        // Variance of a squared normal: 2 share². Variance of a product of independent normals: share (1 - share).
        assertThat(nights / DAYS).isCloseTo(share, within(SIGMAS * share * Math.sqrt(2.0 / DAYS)));
        assertThat(products / DAYS).isCloseTo(0, within(SIGMAS * Math.sqrt(share * (1 - share) / DAYS)));
    }

    @Test
    void everyBarIsWellFormedEvenWhereRoundingIsCoarse() {
        RandomStream random = RandomStream.of(5, "coarse test");
        DayTrading days = new DayTrading(new Trading(0.4, 1, 1), VOLATILITY, RandomStream.of(5, "coarse days"));
        for (int i = 0; i < DAYS; i++) {
            double move = VOLATILITY * random.nextNormal();
            Candle candle = days.next(logPrice(7), move, VOLATILITY, 1);
            double close = Decimals.price(StrictMath.exp(logPrice(7) + move), 1);
            assertThat(candle.high()).isGreaterThanOrEqualTo(Math.max(candle.open(), close));
            assertThat(candle.low())
                    .isLessThanOrEqualTo(Math.min(candle.open(), close))
                    .isPositive();
            assertThat(candle.volume()).isPositive();
        }
    }

    @Test
    void volumeRisesWithVolatilityByItsElasticity() {
        double ordinary = meanLogVolume(VOLATILITY);
        double wild = meanLogVolume(3 * VOLATILITY);
        // Same draws, so the surprises cancel but for rounding to whole units of about 1e6.
        assertThat(wild - ordinary).isCloseTo(0.7 * StrictMath.log(3), within(1e-5));
        // Stationary standard deviation of the mood 0.2 / sqrt(1 - 0.36) = 0.25; its mean over n days varies by 0.2 /
        // 0.4 / sqrt(n).
        assertThat(ordinary).isCloseTo(StrictMath.log(1e6), within(SIGMAS * 0.5 / Math.sqrt(DAYS)));
    }

    private static double meanLogVolume(double volatility) {
        DayTrading days = new DayTrading(new Trading(0.2, 1e6, 0.7), VOLATILITY, RandomStream.of(6, "volume days"));
        double sum = 0;
        for (int i = 0; i < DAYS; i++) {
            sum += StrictMath.log(
                    (double) days.next(logPrice(1000), 0, volatility, DECIMALS).volume());
        }
        return sum / DAYS;
    }

    private static double logPrice(double price) {
        return StrictMath.log(price);
    }
}
