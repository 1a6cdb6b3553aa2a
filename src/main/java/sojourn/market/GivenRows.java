package sojourn.market;

import java.nio.ByteBuffer;
import java.time.LocalDate;
import java.time.temporal.ChronoUnit;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/** Probabilities of regimes that were computed elsewhere, as given: rows of rising dates, each with the date it became known on. */
final class GivenRows {
    /** A row that nothing newer has replaced for more calendar days than this is stale, on daily bars. */
    private static final int OLDEST_DAYS = 10;

    /** The same in lengths of a bar, where bars are longer. */
    private static final int OLDEST_BARS = 3;

    private final String file;
    private final List<String> states;
    private final List<GivenRow> rows;

    /** Of rows of rising dates, at least one, each with a probability for each of {@code states}. */
    GivenRows(String file, List<String> states, List<GivenRow> rows) {
        this.file = file;
        this.states = List.copyOf(states);
        this.rows = List.copyOf(rows);
    }

    int size() {
        return rows.size();
    }

    LocalDate first() {
        return rows.get(0).date();
    }

    LocalDate last() {
        return rows.get(rows.size() - 1).date();
    }

    /** SHA-256, in hexadecimal, over dates, dates of becoming known and raw bits of every column, by the columns' names. */
    String digest() {
        Digest digest = new Digest();
        ByteBuffer dates = ByteBuffer.allocate(2 * Long.BYTES * size());
        rows.forEach(row ->
                dates.putLong(row.date().toEpochDay()).putLong(row.knownOn().toEpochDay()));
        digest.add("dates", dates.array());
        for (int k = 0; k < states.size(); k++) {
            ByteBuffer column = ByteBuffer.allocate(Long.BYTES * size());
            int state = k;
            rows.forEach(row ->
                    column.putLong(Double.doubleToLongBits(row.probabilities().get(state))));
            digest.add("probability." + states.get(k), column.array());
        }
        return digest.hex();
    }

    /**
     * What was in force at each close: of the rows known on or before its date the one that became known last, of several known
     * on one date the one of the latest date.
     */
    GivenByBar on(TimeAxis axis) {
        List<Optional<GivenRow>> inForce = inForce(axis);
        double[] byBar = new double[axis.size() * states.size()];
        int firstBar = axis.size();
        for (int bar = axis.size() - 1; bar >= 0 && inForce.get(bar).isPresent(); bar--) {
            for (int k = 0; k < states.size(); k++) {
                byBar[bar * states.size() + k] =
                        inForce.get(bar).get().probabilities().get(k);
            }
            firstBar = bar;
        }
        return GivenByBar.of(states.size(), firstBar, byBar);
    }

    private List<Optional<GivenRow>> inForce(TimeAxis axis) {
        List<GivenRow> asKnown = new ArrayList<>(rows);
        asKnown.sort(Comparator.comparing(GivenRow::knownOn).thenComparing(GivenRow::date));
        List<Optional<GivenRow>> inForce = new ArrayList<>();
        int next = 0;
        for (int bar = 0; bar < axis.size(); bar++) {
            while (next < asKnown.size() && !asKnown.get(next).knownOn().isAfter(axis.date(bar))) {
                next++;
            }
            inForce.add(next == 0 ? Optional.empty() : Optional.of(asKnown.get(next - 1)));
        }
        return inForce;
    }

    /** What is odd about them on that calendar. */
    List<Finding> findings(TimeAxis axis) {
        List<Finding> findings = new ArrayList<>();
        stale(axis).ifPresent(findings::add);
        overtaken().ifPresent(findings::add);
        return findings;
    }

    private Optional<Finding> stale(TimeAxis axis) {
        int oldest = axis.bars() == BarLength.DAILY
                ? OLDEST_DAYS
                : (int) Math.ceil(OLDEST_BARS * axis.bars().nominalDays());
        List<Optional<GivenRow>> inForce = inForce(axis);
        int stale = 0;
        int first = -1;
        for (int bar = 0; bar < axis.size(); bar++) {
            Optional<GivenRow> row = inForce.get(bar);
            if (row.isPresent() && ChronoUnit.DAYS.between(row.get().knownOn(), axis.date(bar)) > oldest) {
                first = stale == 0 ? bar : first;
                stale++;
            }
        }
        if (stale == 0) {
            return Optional.empty();
        }
        GivenRow row = inForce.get(first).orElseThrow();
        return Optional.of(new Finding(
                file,
                row.line(),
                "at " + stale + (stale == 1 ? " close" : " closes") + " nothing newer had become known for more than "
                        + oldest + " calendar days, the first on " + axis.date(first) + ": the probabilities of "
                        + row.date() + " still counted",
                "look whether rows are missing, or became known earlier than the file says"));
    }

    private Optional<Finding> overtaken() {
        int count = 0;
        Optional<GivenRow> first = Optional.empty();
        GivenRow latest = rows.get(0);
        for (GivenRow row : rows.subList(1, rows.size())) {
            if (row.replaces(latest)) {
                latest = row;
            } else {
                first = first.isEmpty() ? Optional.of(row) : first;
                count++;
            }
        }
        int overtaken = count;
        return first.map(row -> new Finding(
                file,
                row.line(),
                overtaken + (overtaken == 1 ? " row" : " rows")
                        + " became known before a row of an earlier date did, the" + " first that of " + row.date()
                        + ": the row that became known last is the one that counts",
                "look whether the dates of becoming known are right"));
    }
}
