package sojourn.archive;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import sojourn.market.TimeAxis;
import sojourn.measure.Yardstick;
import sojourn.trade.Track;
import sojourn.walk.Forecast;
import sojourn.walk.Reading;
import sojourn.walk.RegimeTimeline;

/**
 * The columns of {@code path.csv}: a row a bar from the first decision on, each from what was known or done by that bar's close.
 * NaN stands for undefined inside and becomes an empty cell in the file. The variant's digest is taken of these very numbers.
 */
public final class PathFile {
    private final List<LocalDate> dates = new ArrayList<>();
    private final List<String> names = new ArrayList<>();
    private final List<double[]> columns = new ArrayList<>();

    private PathFile() {}

    /**
     * The path of one variant.
     *
     * @param causal yardsticks that could have been traded; each from the same first bar as {@code track}
     */
    public static PathFile of(TimeAxis axis, RegimeTimeline timeline, Track track, Map<Yardstick, Track> causal) {
        PathFile path = new PathFile();
        for (int bar = track.firstBar(); bar <= track.lastBar(); bar++) {
            path.dates.add(axis.date(bar));
        }
        path.addRegimes(timeline, track);
        path.addHoldings(track);
        path.addMoney(track);
        causal.forEach((yardstick, own) -> path.addFrom(track, yardstick.column() + ".wealth", own::wealth));
        return path;
    }

    /** The digest of a variant: its settings and the raw bits of every number of its path. {@code settings} is not modified. */
    public String digest(byte[] settings) {
        Digest digest = Digest.begin().bytes(settings);
        for (LocalDate date : dates) {
            digest.text(date.toString());
        }
        for (int i = 0; i < names.size(); i++) {
            digest.text(names.get(i)).column(columns.get(i));
        }
        return digest.hex();
    }

    /** As a table. */
    public Table table() {
        List<String> header = new ArrayList<>();
        header.add("date");
        header.addAll(names);
        Table table = new Table(header);
        for (int row = 0; row < dates.size(); row++) {
            Table.Row cells = table.row().add(dates.get(row));
            for (int i = 0; i < columns.size(); i++) {
                double value = columns.get(i)[row];
                if (Double.isNaN(value)) {
                    cells.blank();
                } else if (names.get(i).equals("fit")) {
                    cells.add(Integer.toString((int) value));
                } else {
                    cells.add(value);
                }
            }
            cells.end();
        }
        return table;
    }

    private void addRegimes(RegimeTimeline timeline, Track track) {
        int states = timeline.regimes().size();
        int assets = track.assets().size();
        double[] fit = undefined(track);
        double[][] probability = undefined(track, states);
        double[][] mean = undefined(track, assets);
        double[][] volatility = undefined(track, assets);
        for (int row = 0; row < track.size(); row++) {
            Optional<Reading> reading = timeline.reading(track.firstBar() + row);
            if (reading.isEmpty()) {
                continue;
            }
            fit[row] = reading.get().fit();
            Forecast next = reading.get().forecast(1);
            for (int k = 0; k < states; k++) {
                probability[k][row] = reading.get().filtered(k);
            }
            for (int a = 0; a < assets; a++) {
                mean[a][row] = next.mean(a);
                volatility[a][row] = next.volatility(a);
            }
        }
        add("fit", fit);
        addAll("probability.", timeline.regimes(), probability);
        addAll("forecast.mean.", track.assets(), mean);
        addAll("forecast.volatility.", track.assets(), volatility);
    }

    private void addHoldings(Track track) {
        List<String> assets = track.assets();
        for (int a = 0; a < assets.size(); a++) {
            int asset = a;
            addFrom(track, "target." + assets.get(a), bar -> track.target(bar, asset));
        }
        for (int a = 0; a < assets.size(); a++) {
            int asset = a;
            addFrom(track, "weight." + assets.get(a), bar -> track.weight(bar, asset));
        }
        addFrom(track, "weight.cash", track::cashWeight);
        for (int a = 0; a < assets.size(); a++) {
            int asset = a;
            addFrom(track, "units." + assets.get(a), bar -> track.units(bar, asset));
        }
    }

    private void addMoney(Track track) {
        addFrom(track, "interest", bar -> track.interest(bar) - track.marginInterest(bar));
        addFrom(track, "borrow", track::borrowFee);
        addFrom(track, "dividend", track::dividend);
        addFrom(track, "cost", track::cost);
        addFrom(track, "turnover", track::turnover);
        addFrom(track, "wealth", track::wealth);
    }

    /** A number a bar. */
    private interface Column {
        double at(int bar);
    }

    private void addFrom(Track track, String name, Column column) {
        double[] values = new double[track.size()];
        for (int row = 0; row < values.length; row++) {
            values[row] = column.at(track.firstBar() + row) + 0.0; // -0.0 would print as a signed zero
        }
        add(name, values);
    }

    private void addAll(String prefix, List<String> suffixes, double[][] values) {
        for (int i = 0; i < values.length; i++) {
            add(prefix + suffixes.get(i), values[i]);
        }
    }

    private void add(String name, double[] values) {
        names.add(name);
        columns.add(values);
    }

    private static double[] undefined(Track track) {
        double[] column = new double[track.size()];
        Arrays.fill(column, Double.NaN);
        return column;
    }

    private static double[][] undefined(Track track, int count) {
        double[][] columns = new double[count][];
        for (int i = 0; i < count; i++) {
            columns[i] = undefined(track);
        }
        return columns;
    }
}
