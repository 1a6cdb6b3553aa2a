package sojourn.market;

import java.util.Optional;
import java.util.OptionalInt;
import sojourn.document.Nearest;

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
                    "there is no column '" + name + "'; the header has '" + String.join("', '", table.names()) + "'",
                    remedy(key, name)));
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

    private String remedy(String key, String name) {
        if (table.names().size() == 1) {
            return "give it a header line of several cells, or say what separates them: separator: …";
        }
        return Nearest.to(name, table.names())
                .map(near -> "say which column holds it: " + key + ": " + near)
                .orElse("say which column holds it: " + key + ": …");
    }
}
