package sojourn.world;

import java.time.LocalDate;
import java.time.MonthDay;
import java.time.format.DateTimeParseException;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import sojourn.document.Refusal;
import sojourn.document.Shape;
import sojourn.document.Shapes;

/**
 * Named days of the year on which a market is closed. One that falls on a weekend is lost, not moved; 29 February exists in
 * leap years only.
 *
 * @param days the day of each, by name
 */
public record Holidays(Map<String, MonthDay> days) {
    private static final Shape<MonthDay> MONTH_DAY = Shapes.textLike("[0-9]{2}-[0-9]{2}", "a day of the year as mm-dd")
            .refuse(Holidays::dateFault)
            .as(Holidays::monthDay);

    /** Reads {@code {Herring Day: 02-11}}. */
    public static final Shape<Holidays> SHAPE =
            Shapes.named(Shapes.text(), MONTH_DAY).as(Holidays::new);

    /** Copies. */
    public Holidays {
        days = Collections.unmodifiableMap(new LinkedHashMap<>(days));
    }

    /** None at all. */
    public static Holidays none() {
        return new Holidays(Map.of());
    }

    /** Whether {@code date} is one of them. */
    public boolean include(LocalDate date) {
        return days.containsValue(MonthDay.from(date));
    }

    private static Optional<Refusal> dateFault(String text) {
        try {
            monthDay(text);
            return Optional.empty();
        } catch (DateTimeParseException e) {
            return Optional.of(new Refusal(
                    "", "'" + text + "' is not a day of the year", "write month and day as mm-dd, e.g. 06-21"));
        }
    }

    private static MonthDay monthDay(String text) {
        return MonthDay.parse("--" + text);
    }
}
