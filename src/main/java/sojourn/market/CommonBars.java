package sojourn.market;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.BitSet;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.TreeSet;
import java.util.stream.Collectors;
import sojourn.document.InputException;
import sojourn.document.Problem;
import sojourn.market.PriceTable.Bars;

/**
 * Several series on the dates that all of them have, or on their {@link UnionDays}. Whatever is cut off the end of the series, the bars that remain are the
 * same as without the cut.
 *
 * @param axis the calendar, at least two bars
 * @param bars one entry a series, in their order
 * @param carried bars on which a series has no price of its own
 * @param findings dates that fell away, and the unfinished last period
 */
record CommonBars(TimeAxis axis, List<Bars> bars, Carried carried, List<Finding> findings) {
    CommonBars {
        bars = List.copyOf(bars);
        findings = List.copyOf(findings);
    }

    /** Puts {@code series}, at least one, on the calendar; refuses those with fewer than two bars in common. */
    static CommonBars of(List<PriceSeries> series, Calendar calendar) {
        if (calendar.days() == Calendar.Days.UNION) {
            return union(series, calendar);
        }
        List<LocalDate> days = commonDates(series);
        if (days.size() < 2) {
            throw new InputException(tooFewInCommon(series, days.size()));
        }
        List<Finding> findings = new ArrayList<>(FallenRows.of(series, days));
        List<Bars> daily = new ArrayList<>();
        for (PriceSeries one : series) {
            int[] rows = one.rowsOf(days);
            daily.add(Distributions.at(one.bars(), rows));
        }
        if (calendar.rowLength() == calendar.bars()) {
            return new CommonBars(TimeAxis.of(calendar.bars(), days), daily, Carried.NOTHING, findings);
        }
        PeriodBars periods = new PeriodBars(days, calendar.bars());
        if (periods.dates().size() < 2) {
            throw new InputException(
                    tooFewPeriods(series, days, calendar.bars(), periods.dates().size()));
        }
        findings.add(unfinished(periods.unfinished(), calendar.bars()));
        return new CommonBars(
                TimeAxis.of(calendar.bars(), periods.dates()),
                daily.stream().map(periods::of).toList(),
                Carried.NOTHING,
                findings);
    }

    private static CommonBars union(List<PriceSeries> series, Calendar calendar) {
        UnionDays union = UnionDays.of(series);
        if (union.days().size() < 2) {
            throw new InputException(tooFew(series, union.days().size()));
        }
        List<Finding> findings = new ArrayList<>(FallenRows.of(series, union.days()));
        SortedMap<String, BitSet> carried = new TreeMap<>();
        for (PriceSeries one : series) {
            union.finding(one).ifPresent(findings::add);
            carried.put(one.asset(), union.carried(one));
        }
        return new CommonBars(
                TimeAxis.of(calendar.bars(), union.days()),
                series.stream().map(union::of).toList(),
                Carried.of(carried),
                findings);
    }

    private static List<LocalDate> commonDates(List<PriceSeries> series) {
        Set<LocalDate> common = new TreeSet<>(series.get(0).dates());
        for (PriceSeries one : series) {
            common.retainAll(new HashSet<>(one.dates()));
        }
        return List.copyOf(common);
    }

    private static Problem tooFewInCommon(List<PriceSeries> series, int common) {
        for (PriceSeries one : series) {
            if (one.size() < 2) {
                return new Problem(
                        one.file(),
                        0,
                        0,
                        one.asset() + " has one row only, of " + one.first(),
                        "give at least two rows");
            }
        }
        for (PriceSeries one : series) {
            for (PriceSeries other : series) {
                int shared = commonDates(List.of(one, other)).size();
                if (shared < 2) {
                    return tooFew(List.of(one, other), shared);
                }
            }
        }
        return tooFew(series, common);
    }

    private static Problem tooFew(List<PriceSeries> series, int common) {
        String ranges = series.stream()
                .map(one -> one.asset() + " runs from " + one.first() + " to " + one.last())
                .collect(Collectors.joining(", "));
        return new Problem(
                series.get(series.size() - 1).file(),
                0,
                0,
                ranges + "; they have " + (common == 0 ? "no date" : "one date only") + " in common",
                "use files whose dates overlap, written in the same way");
    }

    private static Problem tooFewPeriods(
            List<PriceSeries> series, List<LocalDate> days, BarLength length, int complete) {
        return new Problem(
                series.get(0).file(),
                0,
                0,
                "the common days from " + days.get(0) + " to " + days.get(days.size() - 1) + " hold " + complete
                        + " complete " + length.period() + (complete == 1 ? "" : "s"),
                "give more days, or shorter bars");
    }

    private static Finding unfinished(List<LocalDate> days, BarLength length) {
        String range = days.size() == 1
                ? "the day " + days.get(0)
                : "the " + days.size() + " days from " + days.get(0) + " to " + days.get(days.size() - 1);
        return new Finding(
                "",
                0,
                range + (days.size() == 1 ? " makes" : " make") + " no bar: no later " + length.period() + " has begun",
                "nothing to do; the bar appears with the first day of the next " + length.period());
    }
}
