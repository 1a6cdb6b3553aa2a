package sojourn.market;

import java.util.Locale;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.stream.Collectors;

/** Finds columns by name in a table's header; for a name that is not there, the fault says which name is nearest. */
final class CsvColumns {
    private final CsvTable table;
    private final Faults faults;

    CsvColumns(CsvTable table, Faults faults) {
        this.table = table;
        this.faults = faults;
    }

    /** The column that {@code key} of the strategy file, stated or by default, calls {@code name}; -1 and a fault if missing. */
    int required(String key, String name) {
        OptionalInt column = table.column(name);
        if (column.isEmpty()) {
            faults.add(table.headerProblem(
                    "there is no column '" + name + "'; the header has "
                            + table.names().stream().collect(Collectors.joining(", ")),
                    "name the right one in the strategy file, perhaps " + key + ": " + nearest(name)));
        }
        return column.orElse(-1);
    }

    /** The column stated for {@code key}, which must be there, or else the column of that very name, if there is one. */
    OptionalInt optional(String key, Optional<String> stated) {
        if (stated.isEmpty()) {
            return table.column(key);
        }
        int column = required(key, stated.get());
        return column < 0 ? OptionalInt.empty() : OptionalInt.of(column);
    }

    private String nearest(String name) {
        return table.names().stream()
                .min((a, b) -> Integer.compare(distance(name, a), distance(name, b)))
                .orElse(name);
    }

    /** Letters to change, add or drop, case aside: Levenshtein (1966). */
    private static int distance(String left, String right) {
        String a = left.toLowerCase(Locale.ROOT);
        String b = right.toLowerCase(Locale.ROOT);
        int[] row = new int[b.length() + 1];
        for (int j = 0; j <= b.length(); j++) {
            row[j] = j;
        }
        for (int i = 1; i <= a.length(); i++) {
            int diagonal = row[0];
            row[0] = i;
            for (int j = 1; j <= b.length(); j++) {
                int above = row[j];
                int swap = diagonal + (a.charAt(i - 1) == b.charAt(j - 1) ? 0 : 1);
                row[j] = Math.min(swap, 1 + Math.min(above, row[j - 1]));
                diagonal = above;
            }
        }
        return row[b.length()];
    }
}
