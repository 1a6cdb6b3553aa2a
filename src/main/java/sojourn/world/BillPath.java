package sojourn.world;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import sojourn.numeric.RandomStream;

/**
 * Draws the bill rates: x' = m + (x - m) f + e, the exact steps of a process that loses half its distance to m in h years,
 * f = 2^(-step / h), where e is normal with variance v² (1 - f²) h / (2 ln 2). The path runs on beneath the floor; only what
 * is published is held at it. Source: Vasicek (1977), J. Financial Economics 5, 177-188.
 */
final class BillPath {
    private static final double DAYS_PER_YEAR = 365.25;

    private BillPath() {}

    /** A rate on the first day and then every so many calendar days, to the end of the world. */
    static List<BillRate> draw(World world) {
        Bills bills = world.bills();
        RandomStream random = RandomStream.of(world.seed(), "world-bills");
        double kept = StrictMath.pow(0.5, bills.everyDays() / DAYS_PER_YEAR / bills.halfLifeYears());
        double shock = bills.volatilityPointsPerRootYear()
                * Math.sqrt((1 - kept * kept) * bills.halfLifeYears() / (2 * StrictMath.log(2)));
        LocalDate end = world.firstDay().plusYears(world.years());
        List<BillRate> rates = new ArrayList<>();
        double rate = bills.firstPercentPerYear();
        for (LocalDate day = world.firstDay(); day.isBefore(end); day = day.plusDays(bills.everyDays())) {
            rates.add(
                    new BillRate(day, Decimals.round(Math.max(bills.floorPercentPerYear(), rate), Decimals.OF_RATES)));
            rate = bills.longRunPercentPerYear()
                    + (rate - bills.longRunPercentPerYear()) * kept
                    + shock * random.nextNormal();
        }
        return rates;
    }
}
