package sojourn.measure;

import java.util.Collections;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.function.Supplier;
import sojourn.numeric.Check;

/**
 * Every measure of one path, in the order of the catalogue. A path without a bar has none of them. Under 365 calendar days nothing
 * is annualised: those measures are undefined, the others stand. After ruin growth is -1 and the ratios are undefined.
 */
public final class Scorecard {
    private static final long DAYS_OF_A_YEAR = 365;

    private final Map<Measure, Measured> measures;
    private final Drawdown drawdown;
    private final CalendarTable calendar;

    private Scorecard(Map<Measure, Measured> measures, Drawdown drawdown, CalendarTable calendar) {
        this.measures = Collections.unmodifiableMap(measures);
        this.drawdown = drawdown;
        this.calendar = calendar;
    }

    /** The measures of a path held against buy-and-hold over the same dates; other dates are refused. */
    public static Scorecard of(EvaluatedPath path, EvaluatedPath buyAndHold) {
        Drawdown drawdown = Drawdown.of(path);
        CalendarTable calendar = CalendarTable.of(path);
        List<Measure> all = List.of(Measure.values());
        return new Scorecard(measured(all, path, buyAndHold, drawdown, () -> calendar), drawdown, calendar);
    }

    /** A few of the same measures, for paths that are many. */
    public static Map<Measure, Measured> some(List<Measure> wanted, EvaluatedPath path, EvaluatedPath buyAndHold) {
        return measured(wanted, path, buyAndHold, Drawdown.of(path), () -> CalendarTable.of(path));
    }

    private static Map<Measure, Measured> measured(
            List<Measure> wanted,
            EvaluatedPath path,
            EvaluatedPath buyAndHold,
            Drawdown drawdown,
            Supplier<CalendarTable> calendar) {
        Check.that(
                path.dates().equals(buyAndHold.dates()),
                "the path and buy-and-hold do not share their dates: " + span(path) + " and " + span(buyAndHold));
        Map<Measure, Measured> measures = new EnumMap<>(Measure.class);
        if (path.bars() == 0) {
            wanted.forEach(measure -> measures.put(measure, Measured.tooFew(0, 1)));
        } else {
            PathFacts facts = new PathFacts(path, buyAndHold, drawdown, calendar);
            wanted.forEach(measure -> measures.put(measure, measured(measure, path, facts)));
        }
        return measures;
    }

    private static Measured measured(Measure measure, EvaluatedPath path, PathFacts facts) {
        if (measure.unit().annualised() && isUnderOneYear(path.calendarDays())) {
            return underOneYear(path.calendarDays());
        }
        return measure.of(facts);
    }

    static boolean isUnderOneYear(long calendarDays) {
        return calendarDays < DAYS_OF_A_YEAR;
    }

    static Measured.Undefined underOneYear(long calendarDays) {
        return new Measured.Undefined(
                Measured.Reason.UNDER_ONE_YEAR,
                "the window spans " + calendarDays + " calendar days, and nothing is annualised under "
                        + DAYS_OF_A_YEAR);
    }

    /** What one measure came to. */
    public Measured get(Measure measure) {
        return Objects.requireNonNull(measures.get(measure), "a scorecard holds every measure");
    }

    /** All measures in the order of the catalogue. Unmodifiable. */
    public Map<Measure, Measured> measures() {
        return measures;
    }

    /** Where the worst drawdown lies, and the depth at every point. */
    public Drawdown drawdown() {
        return drawdown;
    }

    /** Returns by calendar month and year. */
    public CalendarTable calendar() {
        return calendar;
    }

    private static String span(EvaluatedPath path) {
        return path.bars() + " bars from " + path.dates().get(0) + " to "
                + path.dates().get(path.bars());
    }
}
