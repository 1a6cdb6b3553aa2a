package sojourn;

import java.time.LocalDate;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.function.IntFunction;

/**
 * The proof of no look-ahead: a job on a history cut short must say of every bar up to the cut exactly what the same job says on
 * the whole history. Cells are compared as text; numbers are written as the shortest decimals that read back to the same double,
 * so equal cells are equal bits.
 */
final class PrefixCheck {
    private final IntFunction<Rows> job;
    private final Rows whole;

    private PrefixCheck(IntFunction<Rows> job, Rows whole) {
        this.job = job;
        this.whole = whole;
    }

    /** A check of {@code job}, from the number of price rows that it may see to what it says, against its run on {@code size}. */
    static PrefixCheck of(IntFunction<Rows> job, int size) {
        return new PrefixCheck(job, job.apply(size));
    }

    /**
     * One row of one of a job's tables.
     *
     * @param table the table's name
     * @param knownOn the date at whose close the row can be written, by the job's own account
     */
    record Row(String table, LocalDate knownOn, List<String> columns, List<String> cells) {
        private String name() {
            return table + " of " + knownOn;
        }
    }

    /**
     * All that a job says.
     *
     * @param through the date of its last bar
     * @param rows table after table, each in the order of dates
     */
    record Rows(LocalDate through, List<Row> rows) {
        private List<Row> until(LocalDate last) {
            return rows.stream().filter(row -> !row.knownOn().isAfter(last)).toList();
        }
    }

    /** Where a cut run first says something else. */
    record Difference(int cut, String row, String column, String inWhole, String inCut) {}

    /** The job on all rows. */
    Rows whole() {
        return whole;
    }

    /** The first difference between the run on {@code cut} price rows and the whole run up to the cut run's last bar. */
    Optional<Difference> difference(int cut) {
        return difference(cut, job.apply(cut));
    }

    /** As {@link #difference(int)}, of a run that is at hand. */
    Optional<Difference> difference(int cut, Rows part) {
        List<Row> expected = whole.until(part.through());
        List<Row> got = part.rows();
        for (int i = 0; i < Math.min(expected.size(), got.size()); i++) {
            Optional<Difference> difference = between(cut, expected.get(i), got.get(i));
            if (difference.isPresent()) {
                return difference;
            }
        }
        if (expected.size() > got.size()) {
            Row missing = expected.get(got.size());
            return Optional.of(
                    new Difference(cut, missing.name(), "", missing.cells().toString(), "no row"));
        }
        if (got.size() > expected.size()) {
            Row extra = got.get(expected.size());
            return Optional.of(new Difference(
                    cut, extra.name(), "", "no row", extra.cells().toString()));
        }
        return Optional.empty();
    }

    /** The first difference of each cut that has one. */
    List<Difference> differences(int... cuts) {
        return Arrays.stream(cuts)
                .mapToObj(this::difference)
                .flatMap(Optional::stream)
                .toList();
    }

    /** How many rows of a table the job says on all rows. */
    long rowsOf(String table) {
        return whole.rows().stream().filter(row -> row.table().equals(table)).count();
    }

    private static Optional<Difference> between(int cut, Row expected, Row got) {
        if (!expected.name().equals(got.name()) || !expected.columns().equals(got.columns())) {
            return Optional.of(new Difference(cut, expected.name(), "", expected.name(), got.name()));
        }
        for (int i = 0; i < expected.cells().size(); i++) {
            String inWhole = expected.cells().get(i);
            String inCut = got.cells().get(i);
            if (!inWhole.equals(inCut)) {
                return Optional.of(
                        new Difference(cut, expected.name(), expected.columns().get(i), inWhole, inCut));
            }
        }
        return Optional.empty();
    }
}
