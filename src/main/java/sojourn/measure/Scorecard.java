package sojourn.measure;

import java.util.Collections;
import java.util.EnumMap;
import java.util.Map;
import java.util.Objects;
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
        Check.that(
                path.dates().equals(buyAndHold.dates()),
                "the path and buy-and-hold do not share their dates: " + span(path) + " and " + span(buyAndHold));
        Drawdown drawdown = Drawdown.of(path);
        CalendarTable calendar = CalendarTable.of(path);
        Map<Measure, Measured> measures = new EnumMap<>(Measure.class);
        if (path.bars() == 0) {
            for (Measure measure : Measure.values()) {
                measures.put(measure, Measured.tooFew(0, 1));
            }
        } else {
            PathFacts facts = new PathFacts(path, buyAndHold, drawdown, calendar);
            for (Measure measure : Measure.values()) {
                measures.put(measure, measured(measure, path, facts));
            }
        }
        return new Scorecard(measures, drawdown, calendar);
    }

    private static Measured measured(Measure measure, EvaluatedPath path, PathFacts facts) {
        if (measure.unit().annualised() && path.calendarDays() < DAYS_OF_A_YEAR) {
            return Measured.undefined(
                    Measured.Reason.UNDER_ONE_YEAR,
                    "the window spans " + path.calendarDays() + " calendar days, and nothing is annualised under "
                            + DAYS_OF_A_YEAR);
        }
        return measure.of(facts);
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
