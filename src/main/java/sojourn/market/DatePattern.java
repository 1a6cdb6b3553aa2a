package sojourn.market;

import java.time.DateTimeException;
import java.time.LocalDate;
import java.time.format.DateTimeFormatter;
import java.time.format.DateTimeFormatterBuilder;
import java.time.format.ResolverStyle;
import java.util.Locale;
import java.util.Optional;
import java.util.regex.Pattern;
import sojourn.document.Refusal;
import sojourn.document.Shape;
import sojourn.document.Shapes;

/**
 * How a file writes its dates, in the pattern letters of {@link DateTimeFormatter}, read strictly: 30 February is no date.
 * {@code y} means the plain year, as {@code u} does; names of months are English, in any case.
 */
public final class DatePattern {
    private static final String ISO_TEXT = "yyyy-MM-dd";
    private static final Pattern ISO_DATE = Pattern.compile("\\d{4}-\\d{2}-\\d{2}");
    private static final Pattern SHORT_YEAR = Pattern.compile("(?<!u)u{1,3}(?!u)");
    private static final LocalDate PROBE = LocalDate.of(2001, 10, 23);

    /** {@code yyyy-MM-dd}. */
    public static final DatePattern ISO = new DatePattern(ISO_TEXT, DateTimeFormatter.ISO_LOCAL_DATE);

    /** A pattern that states a whole date. */
    public static final Shape<DatePattern> SHAPE =
            Shapes.text().refuse(DatePattern::refusal).as(DatePattern::of);

    private final String pattern;
    private final DateTimeFormatter formatter;

    private DatePattern(String pattern, DateTimeFormatter formatter) {
        this.pattern = pattern;
        this.formatter = formatter;
    }

    /** From pattern letters that state a whole date; anything else is an {@link IllegalArgumentException}. */
    public static DatePattern of(String pattern) {
        refusal(pattern).ifPresent(refusal -> {
            throw new IllegalArgumentException(refusal.what());
        });
        return pattern.equals(ISO_TEXT) ? ISO : new DatePattern(pattern, formatter(pattern));
    }

    /** The date that {@code text} writes; empty if it does not follow the pattern or is no date of the years 1000 to 9999. */
    Optional<LocalDate> parse(String text) {
        if (pattern.equals(ISO_TEXT) && !ISO_DATE.matcher(text).matches()) {
            return Optional.empty();
        }
        try {
            LocalDate date = formatter.parse(text, LocalDate::from);
            return date.getYear() >= 1000 && date.getYear() <= 9999 ? Optional.of(date) : Optional.empty();
        } catch (DateTimeException notThisPattern) {
            return Optional.empty();
        }
    }

    /** A date of the year 2001 as the pattern writes it, for messages. */
    String example() {
        return formatter.format(PROBE);
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof DatePattern that && that.pattern.equals(pattern);
    }

    @Override
    public int hashCode() {
        return pattern.hashCode();
    }

    /** The pattern letters. */
    @Override
    public String toString() {
        return pattern;
    }

    private static Optional<Refusal> refusal(String pattern) {
        if (SHORT_YEAR.matcher(letters(plainYears(pattern))).find()) {
            return refused(pattern, "has a year of fewer than four digits, which does not say its century");
        }
        try {
            DateTimeFormatter formatter = formatter(pattern);
            if (formatter.parse(formatter.format(PROBE), LocalDate::from).equals(PROBE)) {
                return Optional.empty();
            }
        } catch (IllegalArgumentException | DateTimeException notWhole) {
            return refused(pattern, "does not state a whole date");
        }
        return refused(pattern, "does not state a whole date");
    }

    private static Optional<Refusal> refused(String pattern, String why) {
        return Optional.of(new Refusal(
                "",
                "date-format '" + pattern + "' " + why,
                "write yyyy for the year, MM for the month, dd for the day, and fixed text in quotes, as in dd.MM.yyyy or"
                        + " yyyy-MM-dd' 00:00'"));
    }

    private static DateTimeFormatter formatter(String pattern) {
        return new DateTimeFormatterBuilder()
                .parseCaseInsensitive()
                .appendPattern(plainYears(pattern))
                .toFormatter(Locale.ENGLISH)
                .withResolverStyle(ResolverStyle.STRICT);
    }

    /** Writes {@code u} for {@code y} outside quotes: the year of an era is no date by itself when read strictly. */
    private static String plainYears(String pattern) {
        StringBuilder plain = new StringBuilder(pattern);
        boolean quoted = false;
        for (int i = 0; i < plain.length(); i++) {
            char c = plain.charAt(i);
            quoted ^= c == '\'';
            if (c == 'y' && !quoted) {
                plain.setCharAt(i, 'u');
            }
        }
        return plain.toString();
    }

    private static String letters(String pattern) {
        return pattern.replaceAll("'[^']*'", " ");
    }
}
