package sojourn.market;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;

/**
 * Rows that fall away because another series lacks their dates: those outside the range that all series cover, which is
 * ordinary, and those inside it, which may be a fault of a file.
 */
final class FallenRows {
    private final List<PriceSeries> series;
    private final Set<LocalDate> kept;
    private final LocalDate start;
    private final LocalDate end;

    private FallenRows(List<PriceSeries> series, List<LocalDate> days) {
        this.series = series;
        this.kept = new HashSet<>(days);
        this.start = series.stream()
                .map(PriceSeries::first)
                .max(LocalDate::compareTo)
                .orElseThrow();
        this.end =
                series.stream().map(PriceSeries::last).min(LocalDate::compareTo).orElseThrow();
    }

    /** A finding for each series that loses rows when only the common {@code days} are kept. */
    static List<Finding> of(List<PriceSeries> series, List<LocalDate> days) {
        FallenRows fallen = new FallenRows(series, days);
        List<Finding> findings = new ArrayList<>();
        series.forEach(one -> fallen.finding(one).ifPresent(findings::add));
        return findings;
    }

    private Optional<Finding> finding(PriceSeries one) {
        List<LocalDate> gone =
                one.dates().stream().filter(date -> !kept.contains(date)).toList();
        if (gone.isEmpty()) {
            return Optional.empty();
        }
        List<LocalDate> inside = gone.stream()
                .filter(date -> !date.isBefore(start) && !date.isAfter(end))
                .toList();
        int outside = gone.size() - inside.size();
        List<String> parts = new ArrayList<>();
        if (outside > 0) {
            parts.add(outside + beyond(gone) + ", where another series has none");
        }
        if (!inside.isEmpty()) {
            parts.add(inside.size() + " inside the range of all series, " + span(inside) + " (" + lackedBy(inside, one)
                    + ")");
        }
        return Optional.of(new Finding(
                one.file(),
                0,
                gone.size() + " of " + one.size() + " rows of " + one.asset() + " fall away: "
                        + String.join(", and ", parts),
                inside.isEmpty()
                        ? "nothing to do unless the longer history matters"
                        : "use series of the same trading days if the rows inside matter"));
    }

    private String beyond(List<LocalDate> gone) {
        String before = gone.get(0).isBefore(start) ? " before " + start : "";
        String after = gone.get(gone.size() - 1).isAfter(end) ? " after " + end : "";
        return before + (before.isEmpty() || after.isEmpty() ? "" : " or") + after;
    }

    private static String span(List<LocalDate> dates) {
        return dates.size() == 1
                ? "that of " + dates.get(0)
                : "the first " + dates.get(0) + ", the last " + dates.get(dates.size() - 1);
    }

    private String lackedBy(List<LocalDate> gone, PriceSeries one) {
        return series.stream()
                .filter(other -> other != one)
                .filter(other -> lacking(gone, other) > 0)
                .map(other -> other.asset() + " lacks " + lacking(gone, other))
                .collect(Collectors.joining(", "));
    }

    private static long lacking(List<LocalDate> gone, PriceSeries other) {
        Set<LocalDate> has = new HashSet<>(other.dates());
        return gone.stream().filter(date -> !has.contains(date)).count();
    }
}
