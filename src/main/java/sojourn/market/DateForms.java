package sojourn.market;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * Dates that do not follow the pattern of their file, by shape (digits and letters, and what stands between them), and the
 * patterns that every one of a shape follows.
 */
final class DateForms {
    private static final String OTHER = "other";
    private static final Pattern WITH_TIME = Pattern.compile("\\d{4}-\\d{2}-\\d{2}([T ][0-9A-Za-z:.+ -]{1,40})");
    private static final Map<String, List<DatePattern>> KNOWN = known(
            "dd/MM/yyyy",
            "MM/dd/yyyy",
            "d/M/yyyy",
            "M/d/yyyy",
            "yyyy/MM/dd",
            "dd.MM.yyyy",
            "d.M.yyyy",
            "yyyy-MM-dd",
            "dd-MM-yyyy",
            "MM-dd-yyyy",
            "yyyyMMdd",
            "dd-MMM-yyyy",
            "d-MMM-yyyy",
            "dd MMM yyyy",
            "d MMM yyyy");

    private final DatePattern stated;
    private final Map<String, List<DatePattern>> fitting = new LinkedHashMap<>(KNOWN);

    DateForms(DatePattern stated) {
        this.stated = stated;
    }

    /** The shape of {@code text}, one of few. */
    String shape(String text) {
        Matcher time = WITH_TIME.matcher(text);
        if (time.matches()) {
            return "time " + skeleton(time.group(1));
        }
        String skeleton = skeleton(text);
        return KNOWN.containsKey(skeleton) ? skeleton : OTHER;
    }

    /** What to do about {@code text} and those of its shape before it. */
    String remedy(String text) {
        Matcher time = WITH_TIME.matcher(text);
        if (time.matches()) {
            fitting.computeIfAbsent(shape(text), shape -> List.of(withTime(time.group(1))));
        }
        List<DatePattern> fit = fitting.getOrDefault(shape(text), List.of()).stream()
                .filter(pattern -> pattern.parse(text).isPresent())
                .toList();
        fitting.put(shape(text), fit);
        if (!fit.isEmpty()) {
            return chosen(fit);
        }
        return time.matches()
                ? "cut the time of day off, so that dates read " + DatePattern.ISO.example()
                : "write dates as " + stated.example() + ", or say how they are written: date-format: …";
    }

    /** The first that fits, and the same with day and month swapped if that fits as well. */
    private static String chosen(List<DatePattern> fit) {
        String first = fit.get(0).toString();
        String swapped = first.replace('d', '#').replace('M', 'd').replace('#', 'M');
        boolean either =
                fit.stream().skip(1).anyMatch(pattern -> pattern.toString().equals(swapped));
        return "write date-format: " + first
                + (either ? " if the day comes first, " + swapped + " if the month does" : "");
    }

    private static DatePattern withTime(String time) {
        return DatePattern.of("yyyy-MM-dd'" + time + "'");
    }

    private static String skeleton(String text) {
        return text.replaceAll("[0-9]+", "9").replaceAll("[A-Za-z]+", "a");
    }

    private static Map<String, List<DatePattern>> known(String... patterns) {
        Map<String, List<DatePattern>> byShape = new LinkedHashMap<>();
        for (String text : patterns) {
            DatePattern pattern = DatePattern.of(text);
            byShape.computeIfAbsent(skeleton(pattern.example()), shape -> new ArrayList<>())
                    .add(pattern);
        }
        return byShape;
    }
}
