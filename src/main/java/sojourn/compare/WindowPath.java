package sojourn.compare;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import sojourn.market.FillPrices;
import sojourn.market.PriceTable;
import sojourn.measure.EvaluatedPath;
import sojourn.trade.Track;

/** Cuts tracks on one price table to the window in which they are judged. */
final class WindowPath {
    private final Window window;
    private final List<LocalDate> dates = new ArrayList<>();
    private final double[] cash;
    private final double periodsPerYear;

    WindowPath(PriceTable table, Window window) {
        FillPrices prices = table.fillPrices();
        this.window = window;
        this.cash = new double[window.last() - window.base()];
        this.periodsPerYear = prices.axis().bars().periodsPerYear();
        dates.add(prices.axis().date(window.base()));
        for (int i = 0; i < cash.length; i++) {
            int bar = window.base() + 1 + i;
            dates.add(prices.axis().date(bar));
            cash[i] = prices.cashReturn(bar);
        }
    }

    /** Wealth alone. */
    EvaluatedPath wealthOf(Track track) {
        return EvaluatedPath.of(dates, track.wealth(window.base(), window.last()), cash, periodsPerYear);
    }

    /** Wealth, trading, what was held, and switches. */
    EvaluatedPath of(Track track) {
        int bars = cash.length;
        double[] turnover = new double[bars];
        double[] cost = new double[bars];
        double[] net = new double[bars];
        double[] gross = new double[bars];
        int[] switches = new int[bars];
        for (int i = 0; i < bars; i++) {
            int bar = window.base() + 1 + i;
            turnover[i] = track.turnover(bar);
            cost[i] = track.cost(bar);
            switches[i] = track.switched(bar) ? 1 : 0;
            for (int asset = 0; asset < track.assets().size(); asset++) {
                double weight = track.weight(bar - 1, asset);
                net[i] += weight;
                gross[i] += Math.abs(weight);
            }
        }
        return wealthOf(track)
                .withTrading(turnover, cost)
                .withExposure(net, gross)
                .withSwitches(switches);
    }
}
