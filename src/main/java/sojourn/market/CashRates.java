package sojourn.market;

import java.nio.ByteBuffer;
import java.time.LocalDate;
import java.time.temporal.ChronoUnit;
import java.util.List;
import sojourn.document.InputException;
import sojourn.document.Problem;
import sojourn.document.Problems;

/**
 * Rates of interest, percent a year, each in force from its date until the next; or one rate for all time. A rate file never
 * decides which days are bars.
 */
public final class CashRates {
    /** A rate older than this many calendar days at a close is refused. */
    public static final int OLDEST_DAYS = 10;

    private static final LocalDate ALWAYS = LocalDate.MIN;

    private final String file;
    private final List<LocalDate> dates;
    private final double[] percentPerYear;
    private final int[] lines;
    private final DayCount dayCount;

    private CashRates(String file, List<LocalDate> dates, double[] percentPerYear, int[] lines, DayCount dayCount) {
        this.file = file;
        this.dates = dates;
        this.percentPerYear = percentPerYear;
        this.lines = lines;
        this.dayCount = dayCount;
    }

    /** One rate for all time. */
    public static CashRates constant(double percentPerYear, DayCount dayCount) {
        return new CashRates(AssetName.CASH, List.of(ALWAYS), new double[] {percentPerYear}, new int[1], dayCount);
    }

    /** From strictly increasing dates, at least one, and as many rates. Not modified. */
    public static CashRates dated(List<LocalDate> dates, double[] percentPerYear, DayCount dayCount) {
        return inFile(AssetName.CASH, dates, percentPerYear, new int[dates.size()], dayCount);
    }

    /** As {@link #dated}, and where each rate stands. Not modified. */
    static CashRates inFile(
            String file, List<LocalDate> dates, double[] percentPerYear, int[] lines, DayCount dayCount) {
        if (dates.isEmpty() || dates.size() != percentPerYear.length || dates.size() != lines.length) {
            throw new IllegalArgumentException(
                    dates.size() + " dates, " + percentPerYear.length + " rates, " + lines.length + " lines");
        }
        for (int row = 1; row < dates.size(); row++) {
            if (!dates.get(row).isAfter(dates.get(row - 1))) {
                throw new IllegalArgumentException(
                        "date " + dates.get(row) + " of a rate does not come after " + dates.get(row - 1));
            }
        }
        return new CashRates(file, List.copyOf(dates), percentPerYear.clone(), lines.clone(), dayCount);
    }

    /**
     * What cash earned on each bar t ≥ 1: the last rate dated at or before bar t − 1, in percent / 100, × calendar days from bar
     * t − 1 to bar t / days of the year. Simple interest; a weekend counts its days. At every close the rate in force must be
     * there and at most {@link #OLDEST_DAYS} old, otherwise an {@link InputException} names the first bar for which it is not.
     */
    public CashReturns on(TimeAxis axis) {
        int[] inForce = inForce(axis);
        refuseGaps(axis, inForce);
        double[] earned = new double[axis.size()];
        double[] expectedNext = new double[axis.size()];
        for (int bar = 0; bar < axis.size(); bar++) {
            if (bar > 0) {
                earned[bar] = dayCount.interest(percentPerYear[inForce[bar - 1]], axis.calendarDays(bar - 1, bar));
            }
            expectedNext[bar] =
                    dayCount.interest(percentPerYear[inForce[bar]], axis.bars().nominalDays());
        }
        return CashReturns.of(earned, expectedNext).countedBy(dayCount);
    }

    /** SHA-256, in hexadecimal, over dates and raw bits of the rates: the same for the same numbers, however written. */
    public String digest() {
        ByteBuffer rows = ByteBuffer.allocate(2 * Long.BYTES * dates.size());
        for (int row = 0; row < dates.size(); row++) {
            rows.putLong(dates.get(row).toEpochDay()).putLong(Double.doubleToLongBits(percentPerYear[row]));
        }
        Digest digest = new Digest();
        digest.add("percent-per-year", rows.array());
        return digest.hex();
    }

    /** The row in force at each close; -1 where there is none yet. */
    private int[] inForce(TimeAxis axis) {
        int[] inForce = new int[axis.size()];
        int row = -1;
        for (int bar = 0; bar < inForce.length; bar++) {
            while (row + 1 < dates.size() && !dates.get(row + 1).isAfter(axis.date(bar))) {
                row++;
            }
            inForce[bar] = row;
        }
        return inForce;
    }

    private void refuseGaps(TimeAxis axis, int[] inForce) {
        Problems problems = new Problems();
        if (inForce[0] < 0) {
            problems.add(noRateYet(axis.date(0)));
        }
        int firstStale = -1;
        int staleBars = 0;
        for (int bar = 0; bar < inForce.length; bar++) {
            if (inForce[bar] >= 0 && age(axis, bar, inForce[bar]) > OLDEST_DAYS) {
                firstStale = firstStale < 0 ? bar : firstStale;
                staleBars++;
            }
        }
        if (staleBars > 0) {
            problems.add(stale(axis, firstStale, inForce[firstStale], staleBars));
        }
        problems.throwIfAny();
    }

    private long age(TimeAxis axis, int bar, int row) {
        return dates.get(row).equals(ALWAYS) ? 0 : ChronoUnit.DAYS.between(dates.get(row), axis.date(bar));
    }

    private Problem noRateYet(LocalDate firstBar) {
        return new Problem(
                file,
                lines[0],
                0,
                "the first rate is of " + dates.get(0) + ", after the first bar, " + firstBar,
                "add rates from " + firstBar + " on, start the price files at " + dates.get(0)
                        + ", or write cash: {percent-per-year: …} instead");
    }

    private Problem stale(TimeAxis axis, int bar, int row, int bars) {
        return new Problem(
                file,
                lines[row],
                0,
                "at the close of bar " + axis.date(bar) + " the last rate, of " + dates.get(row) + ", is "
                        + age(axis, bar, row) + " calendar days old, more than " + OLDEST_DAYS
                        + (bars == 1 ? "" : " (and too old on " + (bars - 1) + " of the bars after it)"),
                "add rates after " + dates.get(row) + ", at least one in " + OLDEST_DAYS
                        + " days, or write cash: {percent-per-year: …} instead");
    }
}
