package sojourn.world;

import sojourn.document.Field;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.numeric.Check;

/**
 * The bill rate of an invented market: it drifts back to its long-run level at a stated half-life (Vasicek 1977, J. Financial
 * Economics 5, 177-188), and is published at even steps of the calendar, holiday or not, never below its floor.
 *
 * @param everyDays calendar days between two published rates, 1 to 10
 * @param firstPercentPerYear the rate on the first day, percent a year
 * @param longRunPercentPerYear the level it drifts back to, percent a year
 * @param halfLifeYears years in which half of the distance is lost
 * @param volatilityPointsPerRootYear standard deviation of its shocks, percentage points over a year
 * @param floorPercentPerYear the lowest rate published, percent a year
 */
public record Bills(
        int everyDays,
        double firstPercentPerYear,
        double longRunPercentPerYear,
        double halfLifeYears,
        double volatilityPointsPerRootYear,
        double floorPercentPerYear) {
    private static final double HIGHEST = 50;
    private static final double LOWEST = -5;

    private static final Field<Integer> EVERY_DAYS = Field.defaulted(
            "every-days",
            Shapes.integer().atLeast(1).atMost(10),
            "7",
            "calendar days between two published rates; a rate older than 10 days would be stale");
    private static final Field<Double> FIRST = Field.required(
            "first-percent-per-year",
            Shapes.number().atLeast(LOWEST).atMost(HIGHEST),
            "the rate on the first day, percent a year");
    private static final Field<Double> LONG_RUN = Field.required(
            "long-run-percent-per-year",
            Shapes.number().atLeast(LOWEST).atMost(HIGHEST),
            "the level the rate drifts back to, percent a year");
    private static final Field<Double> HALF_LIFE = Field.required(
            "half-life-years",
            Shapes.number().atLeast(0.05).atMost(100),
            "years in which half of the distance to that level is lost");
    private static final Field<Double> VOLATILITY = Field.required(
            "volatility-points-per-root-year",
            Shapes.number().atLeast(0).atMost(20),
            "standard deviation of the rate's shocks over a year, percentage points");
    private static final Field<Double> FLOOR = Field.defaulted(
            "floor-percent-per-year",
            Shapes.number().atLeast(LOWEST).atMost(HIGHEST),
            "0",
            "the lowest rate that is published, percent a year");

    /** Reads the section {@code bills}. */
    public static final Shape<Bills> SHAPE = Shapes.object(
            "bills",
            f -> new Bills(
                    f.get(EVERY_DAYS),
                    f.get(FIRST),
                    f.get(LONG_RUN),
                    f.get(HALF_LIFE),
                    f.get(VOLATILITY),
                    f.get(FLOOR)),
            EVERY_DAYS,
            FIRST,
            LONG_RUN,
            HALF_LIFE,
            VOLATILITY,
            FLOOR);

    /** Checks the bounds. */
    public Bills {
        Check.within(everyDays, 1, 10, "everyDays");
        Check.within(firstPercentPerYear, LOWEST, HIGHEST, "firstPercentPerYear");
        Check.within(longRunPercentPerYear, LOWEST, HIGHEST, "longRunPercentPerYear");
        Check.within(halfLifeYears, 0.05, 100, "halfLifeYears");
        Check.within(volatilityPointsPerRootYear, 0, 20, "volatilityPointsPerRootYear");
        Check.within(floorPercentPerYear, LOWEST, HIGHEST, "floorPercentPerYear");
    }
}
