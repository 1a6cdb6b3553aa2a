package sojourn.market;

import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalInt;
import sojourn.document.Nearest;

/** Finds columns by name in a table's header; for a name that is not there, the fault says which name is nearest. */
final class CsvColumns {
    private static final int SHORTEST_PART = 3;

    private final CsvTable table;
    private final Faults faults;

    CsvColumns(CsvTable table, Faults faults) {
        this.table = table;
        this.faults = faults;
    }

    /**
     * The column that {@code key} of the strategy file calls {@code name}; -1 and a fault if missing.
     *
     * @param byDefault the name if none is stated; empty if one must be
     */
    int required(String key, String name, String byDefault) {
        OptionalInt column = table.column(name);
        if (column.isEmpty()) {
            String header = "the header has '" + String.join("', '", table.names()) + "'";
            faults.add(table.headerProblem(
                    name.equals(byDefault)
                            ? "there is no column '" + name + "' (" + faults.owner() + "); " + header
                            : faults.owner() + " name the column '" + name + "', " + header,
                    remedy(key, name, byDefault)));
        }
        return column.orElse(-1);
    }

    /** The column stated for {@code key}, which must be there, or else the column of that very name, if there is one. */
    OptionalInt optional(String key, Optional<String> stated) {
        if (stated.isEmpty()) {
            return table.column(key);
        }
        int column = required(key, stated.get(), "");
        return column < 0 ? OptionalInt.empty() : OptionalInt.of(column);
    }

    private String remedy(String key, String name, String byDefault) {
        if (table.names().size() == 1) {
            return "give it a header line of several cells, or say what separates them: separator: …";
        }
        Optional<String> near = near(name);
        if (near.isEmpty()) {
            return "say which column holds it: " + key + ": …";
        }
        return name.equals(byDefault)
                ? "say which column holds it: " + key + ": " + near.get()
                : "did you mean '" + near.get() + "'?";
    }

    /** The name of the header that is spelt most nearly, or else the only one that is part of {@code name} or has it as part. */
    private Optional<String> near(String name) {
        Optional<String> spelt = Nearest.to(name, table.names());
        if (spelt.isPresent()) {
            return spelt;
        }
        String sought = name.toLowerCase(Locale.ROOT);
        List<String> akin = table.names().stream()
                .filter(one -> one.length() >= SHORTEST_PART && name.length() >= SHORTEST_PART)
                .filter(one -> sought.contains(one.toLowerCase(Locale.ROOT))
                        || one.toLowerCase(Locale.ROOT).contains(sought))
                .toList();
        return akin.size() == 1 ? Optional.of(akin.get(0)) : Optional.empty();
    }
}
