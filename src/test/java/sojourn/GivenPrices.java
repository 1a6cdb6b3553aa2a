package sojourn;

import java.time.DayOfWeek;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import sojourn.market.BarLength;
import sojourn.market.CashReturns;
import sojourn.market.PriceTable;
import sojourn.market.TimeAxis;
import sojourn.numeric.RandomStream;

/** Price tables for tests: closes (and opens) by asset and bar, on weekdays, with what cash earns on each bar. */
public final class GivenPrices {
    private static final LocalDate MONDAY = LocalDate.of(2001, 1, 1);

    private final List<LocalDate> dates;
    private final double[][] opens;
    private final double[][] closes;
    private final double[] cash;
    private final Optional<double[][]> volumes;
    private final Optional<double[][]> dividends;
    private final Optional<double[][]> splits;

    private GivenPrices(
            List<LocalDate> dates,
            double[][] opens,
            double[][] closes,
            double[] cash,
            Optional<double[][]> volumes,
            Optional<double[][]> dividends,
            Optional<double[][]> splits) {
        this.dates = dates;
        this.opens = opens;
        this.closes = closes;
        this.cash = cash;
        this.volumes = volumes;
        this.dividends = dividends;
        this.splits = splits;
    }

    private GivenPrices(List<LocalDate> dates, double[][] opens, double[][] closes, double[] cash) {
        this(dates, opens, closes, cash, Optional.empty(), Optional.empty(), Optional.empty());
    }

    private GivenPrices with(double[][] otherOpens, double[] earned, Optional<double[][]> otherVolumes) {
        return new GivenPrices(dates, otherOpens, closes, earned, otherVolumes, dividends, splits);
    }

    /** Closes by asset; opens are the same; cash earns nothing. */
    public static GivenPrices closes(double[]... closes) {
        return new GivenPrices(weekdays(closes[0].length), closes, closes, new double[closes[0].length]);
    }

    /** Assets that all stand at 100 on every bar. */
    public static GivenPrices flat(int bars, int assets) {
        double[][] closes = new double[assets][bars];
        for (double[] one : closes) {
            Arrays.fill(one, 100);
        }
        return closes(closes);
    }

    /** Random walks with about 1 % a bar, opens between closes, cash that earns up to 2 basis points a bar. */
    public static GivenPrices random(long seed, int bars, int assets) {
        RandomStream random = RandomStream.of(seed, "prices");
        double[][] opens = new double[assets][bars];
        double[][] closes = new double[assets][bars];
        double[] cash = new double[bars];
        for (int asset = 0; asset < assets; asset++) {
            double price = 20 + 100 * random.nextDouble();
            for (int bar = 0; bar < bars; bar++) {
                opens[asset][bar] = price * (1 + 0.005 * random.nextNormal());
                price *= StrictMath.exp(0.01 * random.nextNormal());
                closes[asset][bar] = price;
            }
        }
        for (int bar = 1; bar < bars; bar++) {
            cash[bar] = 2e-4 * random.nextDouble();
        }
        return new GivenPrices(weekdays(bars), opens, closes, cash);
    }

    /** The same with other returns of cash. */
    public GivenPrices withCash(double... earned) {
        return with(opens, earned, volumes);
    }

    /** The same with other closes. */
    public GivenPrices withCloses(double[]... by) {
        return new GivenPrices(dates, opens, by, cash, volumes, dividends, splits);
    }

    /** The same with other opens. */
    public GivenPrices withOpens(double[]... by) {
        return with(by, cash, volumes);
    }

    /** The same with volumes; NaN where there is none. */
    public GivenPrices withVolumes(double[]... by) {
        return with(opens, cash, Optional.of(by));
    }

    /** The same prices with what they gave to holders besides: money a unit, and new units for one old. */
    public GivenPrices giving(double[][] money, double[][] ratios) {
        return new GivenPrices(dates, opens, closes, cash, volumes, Optional.of(money), Optional.of(ratios));
    }

    /** The same with random dividends and splits on about one bar in ten; prices fall by neither. */
    public GivenPrices givingAtRandom(long seed) {
        RandomStream random = RandomStream.of(seed, "given to holders");
        double[][] money = new double[closes.length][size()];
        double[][] ratios = new double[closes.length][size()];
        for (int asset = 0; asset < closes.length; asset++) {
            for (int bar = 0; bar < size(); bar++) {
                money[asset][bar] = random.nextInt(10) == 0 ? 0.02 * closes[asset][bar] * random.nextDouble() : 0;
                ratios[asset][bar] = random.nextInt(10) == 0 ? 0.5 + random.nextDouble() : 1;
            }
        }
        return giving(money, ratios);
    }

    /** The same with random volumes of about {@code size} units a bar. */
    public GivenPrices withRandomVolumes(long seed, double size) {
        RandomStream random = RandomStream.of(seed, "volumes");
        double[][] all = new double[closes.length][size()];
        for (double[] one : all) {
            Arrays.setAll(one, bar -> size * (0.2 + 1.6 * random.nextDouble()));
        }
        return withVolumes(all);
    }

    /** The same on other dates. */
    public GivenPrices on(LocalDate... days) {
        return new GivenPrices(List.of(days), opens, closes, cash, volumes, dividends, splits);
    }

    /** Only the first bars. */
    public GivenPrices first(int bars) {
        return new GivenPrices(
                dates.subList(0, bars),
                cut(opens, bars),
                cut(closes, bars),
                Arrays.copyOf(cash, bars),
                volumes.map(all -> cut(all, bars)),
                dividends.map(all -> cut(all, bars)),
                splits.map(all -> cut(all, bars)));
    }

    /** The date of each bar. */
    public List<LocalDate> dates() {
        return dates;
    }

    /** The close of an asset on a bar. */
    public double close(int asset, int bar) {
        return closes[asset][bar];
    }

    /** Number of bars. */
    public int size() {
        return dates.size();
    }

    /** The table; assets are called a, b, c … */
    public PriceTable table() {
        List<String> names = new ArrayList<>();
        List<PriceTable.Bars> bars = new ArrayList<>();
        for (int asset = 0; asset < closes.length; asset++) {
            int index = asset;
            names.add(String.valueOf((char) ('a' + asset)));
            bars.add(new PriceTable.Bars(
                    PriceTable.Column.of(closes[asset]),
                    Optional.of(PriceTable.Column.of(opens[asset])),
                    Optional.empty(),
                    Optional.empty(),
                    volumes.map(all -> PriceTable.Column.of(all[index])),
                    dividends.map(all -> PriceTable.Column.of(all[index])),
                    splits.map(all -> PriceTable.Column.of(all[index]))));
        }
        return PriceTable.of(TimeAxis.of(BarLength.DAILY, dates), names, bars, CashReturns.of(cash, cash));
    }

    private static double[][] cut(double[][] series, int bars) {
        double[][] cut = new double[series.length][];
        Arrays.setAll(cut, i -> Arrays.copyOf(series[i], bars));
        return cut;
    }

    private static List<LocalDate> weekdays(int count) {
        List<LocalDate> days = new ArrayList<>();
        for (LocalDate day = MONDAY; days.size() < count; day = day.plusDays(1)) {
            if (day.getDayOfWeek() != DayOfWeek.SATURDAY && day.getDayOfWeek() != DayOfWeek.SUNDAY) {
                days.add(day);
            }
        }
        return days;
    }
}
