package sojourn.market;

import java.text.DecimalFormat;
import java.text.DecimalFormatSymbols;
import java.time.temporal.ChronoUnit;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import sojourn.market.Calendar.Rows;

/** What looks odd in one series: long gaps, frozen prices, leaps, rows that are no days. Each kind gives one finding. */
final class SeriesFindings {
    /** Calendar days beyond the length of one row's period. */
    private static final int LONG_GAP_DAYS = 10;

    private static final int FROZEN_ROWS = 10;
    private static final double LEAP = 0.40;
    /** New units for one old one that splits have in practice; each also the other way round. Common practice, no source. */
    private static final double[] RATIOS = {1.5, 2, 3, 4, 5, 8, 10, 15, 20, 25, 50, 100};
    /** How far the price of a day of split may move besides, relative. */
    private static final double BESIDES = 0.03;

    private final PriceSeries series;
    private final Calendar calendar;
    private final List<Finding> found = new ArrayList<>();

    private SeriesFindings(PriceSeries series, Calendar calendar) {
        this.series = series;
        this.calendar = calendar;
    }

    static List<Finding> of(PriceSeries series, Calendar calendar) {
        SeriesFindings findings = new SeriesFindings(series, calendar);
        findings.gaps(findings.spacing().orElse(calendar.rowLength()));
        findings.frozen();
        findings.leaps();
        findings.splits();
        return List.copyOf(findings.found);
    }

    /** Of levels only gaps and rows that are no days: a rate may stand still for weeks, and leaps are no returns. */
    static List<Finding> ofLevels(PriceSeries series, Calendar calendar) {
        SeriesFindings findings = new SeriesFindings(series, calendar);
        findings.gaps(findings.spacing().orElse(calendar.rowLength()));
        return List.copyOf(findings.found);
    }

    /** Rows said to be days of which no period holds two are bars already; the length that they have then. */
    private Optional<BarLength> spacing() {
        if ((calendar.rows() == Rows.BARS && calendar.bars() != BarLength.DAILY) || series.size() < 3) {
            return Optional.empty();
        }
        for (BarLength length : List.of(BarLength.MONTHLY, BarLength.WEEKLY)) {
            if (onePerPeriod(length)) {
                add(
                        series.line(0),
                        "no " + length.period() + " has more than one row of " + series.asset()
                                + ", though each row is taken for a day",
                        "write calendar: {bars: " + length.word() + ", rows: bars} if each row is a whole "
                                + length.period());
                return Optional.of(length);
            }
        }
        return Optional.empty();
    }

    private boolean onePerPeriod(BarLength length) {
        for (int row = 1; row < series.size(); row++) {
            if (length.periodStart(series.dates().get(row))
                    .equals(length.periodStart(series.dates().get(row - 1)))) {
                return false;
            }
        }
        return true;
    }

    private void gaps(BarLength rowLength) {
        int limit = LONG_GAP_DAYS + (rowLength == BarLength.DAILY ? 0 : rowLength.longestDays());
        int first = -1;
        int longest = -1;
        int count = 0;
        for (int row = 1; row < series.size(); row++) {
            if (gap(row) > limit) {
                first = first < 0 ? row : first;
                longest = longest < 0 || gap(row) > gap(longest) ? row : longest;
                count++;
            }
        }
        if (count > 0) {
            String which = count == 1
                    ? " from " + span(first)
                    : ", the first from " + span(first) + ", the longest from " + span(longest);
            add(
                    series.line(first),
                    counted(count, "gap") + " of more than " + limit + " calendar days in " + series.asset() + which
                            + " (" + gap(longest) + " days)",
                    "look whether rows are missing");
        }
    }

    private long gap(int row) {
        return ChronoUnit.DAYS.between(
                series.dates().get(row - 1), series.dates().get(row));
    }

    private String span(int row) {
        return series.dates().get(row - 1) + " to " + series.dates().get(row);
    }

    private void frozen() {
        int first = -1;
        int longest = 0;
        int count = 0;
        int start = 0;
        for (int row = 1; row <= series.size(); row++) {
            if (row < series.size() && series.close(row) == series.close(start)) {
                continue;
            }
            if (row - start >= FROZEN_ROWS) {
                first = first < 0 ? start : first;
                longest = Math.max(longest, row - start);
                count++;
            }
            start = row;
        }
        if (count > 0) {
            String from = series.dates().get(first).toString();
            String which = count == 1
                    ? ", from " + from + ", of " + longest + " rows"
                    : ", the first from " + from + ", the longest of " + longest + " rows";
            add(
                    series.line(first),
                    counted(count, "run") + " of at least " + FROZEN_ROWS + " identical closes of " + series.asset()
                            + which,
                    "look whether old prices were carried forward; leave the cell empty where there was no price");
        }
    }

    private void leaps() {
        int first = -1;
        int greatest = -1;
        int count = 0;
        for (int row = 1; row < series.size(); row++) {
            if (Math.abs(change(row)) > LEAP) {
                first = first < 0 ? row : first;
                greatest = greatest < 0 || Math.abs(change(row)) > Math.abs(change(greatest)) ? row : greatest;
                count++;
            }
        }
        if (count > 0) {
            String which = count == 1
                    ? " on " + moved(first)
                    : ", the first on " + moved(first) + ", the greatest on " + moved(greatest);
            add(
                    series.line(first),
                    counted(count, "move") + " of " + series.asset() + " beyond ±40 % from one row to the next" + which,
                    "look for a split that was not adjusted for, or a price that is off by a factor of 100");
        }
    }

    private void splits() {
        int first = -1;
        int count = 0;
        for (int row = 1; row < series.size(); row++) {
            if (splitLike(units(row)) > 0 && !undone(row, row - 1) && !undone(row, row + 1)) {
                first = first < 0 ? row : first;
                count++;
            }
        }
        if (count > 0) {
            String ratio = inWords(splitLike(units(first)));
            add(
                    series.line(first),
                    counted(count, "move") + " of " + series.asset()
                            + " like a split that is not recorded, the first on " + moved(first) + ", near " + ratio,
                    "adjust the prices, or record it in a column: split: … under prices");
        }
    }

    private static String inWords(double ratio) {
        DecimalFormat plain = new DecimalFormat("0.#", DecimalFormatSymbols.getInstance(Locale.ROOT));
        return ratio > 1
                ? plain.format(ratio) + " new units for one old"
                : "one new unit for " + plain.format(1 / ratio) + " old";
    }

    /** Whether a neighbouring move takes a row's move back: a mistyped price, and no split. */
    private boolean undone(int row, int neighbour) {
        return neighbour > 0 && neighbour < series.size() && Math.abs(units(row) * units(neighbour) - 1) <= 2 * BESIDES;
    }

    /** New units for one old one that would explain a row's move. */
    private double units(int row) {
        return 1 / (1 + change(row));
    }

    /** The usual ratio that is near {@code units} new for one old; 0 if none is. */
    private static double splitLike(double units) {
        for (double ratio : RATIOS) {
            for (double either : new double[] {ratio, 1 / ratio}) {
                if (Math.abs(units / either - 1) <= BESIDES) {
                    return either;
                }
            }
        }
        return 0;
    }

    /** From one row to the next, in the units of the one before. */
    private double change(int row) {
        return series.close(row) * series.bars().splitOn(row) / series.close(row - 1) - 1;
    }

    private String moved(int row) {
        return String.format(Locale.ROOT, "%s (%+.1f %%)", series.dates().get(row), 100 * change(row));
    }

    private static String counted(int count, String noun) {
        return count + " " + noun + (count == 1 ? "" : "s");
    }

    private void add(int line, String what, String suggestion) {
        found.add(new Finding(series.file(), line, what, suggestion));
    }
}
