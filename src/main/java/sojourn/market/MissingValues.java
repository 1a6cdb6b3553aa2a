package sojourn.market;

import java.time.LocalDate;
import java.util.Optional;

/** Counts the rows that have a date but no value, which are no rows of the series. */
final class MissingValues {
    private final String name;
    private int count;
    private int firstLine;
    private LocalDate first = LocalDate.MIN;
    private LocalDate last = LocalDate.MIN;

    MissingValues(String name) {
        this.name = name;
    }

    String name() {
        return name;
    }

    int count() {
        return count;
    }

    void add(LocalDate date, int line) {
        if (count == 0) {
            first = date;
            firstLine = line;
        }
        last = date;
        count++;
    }

    Optional<Finding> finding(String file) {
        if (count == 0) {
            return Optional.empty();
        }
        String what = count == 1
                ? "1 row has no " + name + ", that of " + first
                : count + " rows have no " + name + ", the first " + first + ", the last " + last;
        return Optional.of(new Finding(file, firstLine, what, "nothing to do if there was none on those days"));
    }
}
