package sojourn.market;

import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.function.UnaryOperator;
import sojourn.numeric.Check;

/**
 * Prices of some assets and the return of cash on one calendar. The table itself shows no price: deciding code asks
 * {@link #knownAt} for what was known at a close, trading code asks {@link #fillPrices}.
 */
public final class PriceTable {
    private final TimeAxis axis;
    private final List<String> assets;
    private final Bars[] bars;
    private final Bars[] reinvested;
    private final CashReturns cash;
    private final Optional<GivenByBar> given;
    private final SortedMap<String, Column> levels;
    private final Carried carried;
    private final Known[] known;

    /**
     * One series' bars, a value a bar in each column. Closes are finite everywhere, those of an asset above 0; the other columns are
     * there or not as a whole, and NaN on a bar means the file had no value there.
     *
     * @param dividend money a unit held at the close before is paid, after the bar's split; 0 on most bars
     * @param split units that one unit becomes before the bar's trading; 1 on most bars
     */
    public record Bars(
            Column close,
            Optional<Column> open,
            Optional<Column> high,
            Optional<Column> low,
            Optional<Column> volume,
            Optional<Column> dividend,
            Optional<Column> split) {
        /** Refuses columns of different lengths and closes that are not finite. */
        public Bars {
            for (int bar = 0; bar < close.size(); bar++) {
                Check.finite(close.at(bar), "close of bar", bar);
            }
            for (Optional<Column> other : List.of(open, high, low, volume, dividend, split)) {
                if (other.isPresent() && other.get().size() != close.size()) {
                    throw new IllegalArgumentException(
                            "a column of " + other.get().size() + " bars beside one of " + close.size());
                }
            }
        }

        /** Prices that need no dividends and splits beside them. */
        public Bars(
                Column close,
                Optional<Column> open,
                Optional<Column> high,
                Optional<Column> low,
                Optional<Column> volume) {
            this(close, open, high, low, volume, Optional.empty(), Optional.empty());
        }

        /** Closes alone, those of an asset. */
        public static Bars ofCloses(double... closes) {
            for (int bar = 0; bar < closes.length; bar++) {
                Check.above(closes[bar], 0, "close of bar", bar);
            }
            return new Bars(Column.of(closes), Optional.empty(), Optional.empty(), Optional.empty(), Optional.empty());
        }

        /** Refuses closes that are not those of an asset. */
        private void refuseLevels() {
            for (int bar = 0; bar < close.size(); bar++) {
                Check.above(close.at(bar), 0, "close of bar", bar);
            }
        }

        /** Every column converted alike. */
        Bars each(UnaryOperator<Column> change) {
            return new Bars(
                    change.apply(close),
                    open.map(change),
                    high.map(change),
                    low.map(change),
                    volume.map(change),
                    dividend.map(change),
                    split.map(change));
        }

        /** The same with these dividends and splits. */
        public Bars giving(Column dividends, Column splits) {
            return new Bars(close, open, high, low, volume, Optional.of(dividends), Optional.of(splits));
        }

        /** Whether there is a column of dividends or of splits. */
        boolean distributes() {
            return dividend.isPresent() || split.isPresent();
        }

        double dividendOn(int bar) {
            return dividend.isPresent() ? dividend.get().at(bar) : 0;
        }

        double splitOn(int bar) {
            return split.isPresent() ? split.get().at(bar) : 1;
        }
    }

    /** An immutable column of doubles. */
    public static final class Column {
        private final double[] values;

        private Column(double[] values) {
            this.values = values;
        }

        /** Copies {@code values}. Not modified. */
        public static Column of(double... values) {
            return new Column(values.clone());
        }

        /** The value of a bar. */
        public double at(int bar) {
            return values[bar];
        }

        /** Number of bars. */
        public int size() {
            return values.length;
        }

        double[] range(int start, int end) {
            return Arrays.copyOfRange(values, start, end);
        }

        /** The values at {@code bars}, in that order. Not modified. */
        Column at(int[] bars) {
            return new Column(
                    Arrays.stream(bars).mapToDouble(bar -> values[bar]).toArray());
        }
    }

    private PriceTable(
            TimeAxis axis,
            List<String> assets,
            Bars[] bars,
            CashReturns cash,
            Optional<GivenByBar> given,
            SortedMap<String, Column> levels,
            Carried carried) {
        this.axis = axis;
        this.assets = assets;
        this.bars = bars;
        this.reinvested = Arrays.stream(bars).map(Distributions::reinvested).toArray(Bars[]::new);
        this.cash = cash;
        this.given = given;
        this.levels = Collections.unmodifiableSortedMap(new TreeMap<>(levels));
        this.carried = carried;
        this.known = new Known[axis.size()];
        Arrays.setAll(known, bar -> new Known(this, bar));
    }

    /** From one {@link Bars} an asset, in the same order as {@code assets}. */
    public static PriceTable of(TimeAxis axis, List<String> assets, List<Bars> bars, CashReturns cash) {
        if (assets.size() != bars.size()) {
            throw new IllegalArgumentException(assets.size() + " names for " + bars.size() + " series");
        }
        for (Bars one : bars) {
            one.refuseLevels();
            if (one.close().size() != axis.size()) {
                throw new IllegalArgumentException(
                        "a series of " + one.close().size() + " bars on a calendar of " + axis.size());
            }
        }
        if (cash.size() != axis.size()) {
            throw new IllegalArgumentException("cash has " + cash.size() + " bars, the calendar " + axis.size());
        }
        return new PriceTable(
                axis,
                List.copyOf(assets),
                bars.toArray(Bars[]::new),
                cash,
                Optional.empty(),
                new TreeMap<>(),
                Carried.NOTHING);
    }

    /** The same with probabilities of regimes that were computed elsewhere, those in force at each close. */
    PriceTable withGiven(GivenByBar probabilities) {
        Check.within(probabilities.bars(), size(), size(), "bars of the given probabilities");
        return new PriceTable(axis, assets, bars, cash, Optional.of(probabilities), levels, carried);
    }

    /** The same with series that are no assets, of any sign: nobody holds them and no return is taken of them. */
    PriceTable withLevels(SortedMap<String, Column> named) {
        named.values().forEach(one -> Check.within(one.size(), size(), size(), "bars of a level"));
        return new PriceTable(axis, assets, bars, cash, given, named, carried);
    }

    /** The same where the last closes of some series are carried over bars on which they have none. */
    PriceTable withCarried(Carried closes) {
        return new PriceTable(axis, assets, bars, cash, given, levels, closes);
    }

    /** Number of bars. */
    public int size() {
        return axis.size();
    }

    /** Length of the bars. */
    public BarLength barLength() {
        return axis.bars();
    }

    /** Asset names, in the order of the strategy file. */
    public List<String> assets() {
        return assets;
    }

    /** Names of the series that are no assets, in alphabetical order. */
    public List<String> levels() {
        return List.copyOf(levels.keySet());
    }

    /** The index of an asset's name; refuses an unknown one. */
    public int asset(String name) {
        int index = assets.indexOf(name);
        if (index < 0) {
            throw new IllegalArgumentException("no asset '" + name + "'; known: " + assets);
        }
        return index;
    }

    /** What was known after the close of {@code bar}. */
    public Known knownAt(int bar) {
        if (bar < 0 || bar >= known.length) {
            throw new IndexOutOfBoundsException("bar " + bar + " of a table of " + known.length);
        }
        return known[bar];
    }

    /** The whole table. Only {@code trade}, and what stands below it, may ask for this. */
    public FillPrices fillPrices() {
        return new FillPrices(this);
    }

    TimeAxis axis() {
        return axis;
    }

    /** As quoted: what is traded and marked. */
    Bars quoted(int asset) {
        return bars[asset];
    }

    /** The closes of an asset, dividends and splits put back, or of a level. */
    Column closes(String name) {
        return Optional.ofNullable(levels.get(name)).orElseGet(() -> reinvested[asset(name)].close());
    }

    /** Dividends and splits put back into the prices: what is observed. The same as quoted where there are none. */
    Bars reinvested(int asset) {
        return reinvested[asset];
    }

    Carried carried() {
        return carried;
    }

    CashReturns cash() {
        return cash;
    }

    Optional<GivenByBar> given() {
        return given;
    }
}
