package sojourn.compare;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Objects;
import java.util.OptionalDouble;
import java.util.stream.IntStream;
import sojourn.document.Problem;
import sojourn.market.FillPrices;
import sojourn.market.PriceSource;
import sojourn.market.PriceTable;
import sojourn.strategy.Strategy;
import sojourn.trade.FillTime;
import sojourn.walk.BarColumn;
import sojourn.walk.Observation;

/**
 * Whether the opens that a strategy uses are those of its closes. Bought at an open as quoted and marked at a close with dividends put
 * back in, a position would gain at once what nobody gained.
 */
final class OpensBesideCloses {
    /** The median distance of opens from the close before, in medians of what closes move, beyond which scales differ. Ours. */
    private static final double FAR = 10;
    /** Distances below this are never far, logarithms. Ours. */
    private static final double NEAR = 0.02;

    private final Strategy strategy;
    private final PriceTable table;
    private final List<Problem> problems = new ArrayList<>();

    private OpensBesideCloses(Strategy strategy, PriceTable table) {
        this.strategy = strategy;
        this.table = table;
    }

    /** One problem for each asset and use of its opens. */
    static List<Problem> problems(Strategy strategy, PriceTable table) {
        OpensBesideCloses check = new OpensBesideCloses(strategy, table);
        for (Observation one : strategy.regimes().observe()) {
            if (one.reads().contains(BarColumn.OPEN)) {
                check.use(one.asset(), one.word(), "observe something else");
            }
        }
        if (strategy.trade().fill() == FillTime.NEXT_OPEN) {
            String use = "fill: " + FillTime.NEXT_OPEN.word();
            strategy.tradedAssets().forEach(asset -> check.use(asset, use, "trade without " + use));
        }
        return check.problems;
    }

    private void use(String asset, String use, String otherwise) {
        PriceSource source = Objects.requireNonNull(strategy.prices().get(asset), asset);
        FillPrices prices = table.fillPrices();
        int index = table.asset(asset);
        double[] gaps = IntStream.range(1, table.size())
                .filter(bar -> prices.open(index, bar).isPresent())
                .mapToDouble(bar -> gap(prices, index, bar))
                .toArray();
        if (gaps.length == 0) {
            return;
        }
        double[] moves = IntStream.range(1, table.size())
                .mapToDouble(bar -> size(prices.close(index, bar) * prices.split(index, bar), prices, index, bar))
                .toArray();
        String remedy =
                "name the column of opens that belong to these closes under prices (open: ...), or " + otherwise;
        if (source.onlyCloseNamed()) {
            tell(
                    source,
                    "closes of " + asset + " are read from " + source.close()
                            + ", its opens from a column that is not named, and " + use + " needs both on one scale",
                    remedy);
        } else if (median(gaps) > Math.max(NEAR, FAR * median(moves))) {
            tell(
                    source,
                    String.format(
                            Locale.ROOT,
                            "opens of %s lie %.1f %% from the close before on the median bar, while closes move %.1f %%: they are"
                                    + " on different scales, and %s needs both on one",
                            asset,
                            100 * StrictMath.expm1(median(gaps)),
                            100 * StrictMath.expm1(median(moves)),
                            use),
                    remedy);
        }
    }

    private void tell(PriceSource source, String what, String remedy) {
        problems.add(new Problem(source.layout().csv(), 1, 1, what, remedy));
    }

    private static double gap(FillPrices prices, int asset, int bar) {
        OptionalDouble open = prices.open(asset, bar);
        return size(open.orElseThrow() * prices.split(asset, bar), prices, asset, bar);
    }

    /** |ln| of a price in the units of the bar before, over the close of the bar before. */
    private static double size(double price, FillPrices prices, int asset, int bar) {
        return Math.abs(StrictMath.log(price / prices.close(asset, bar - 1)));
    }

    /** The middle one, the upper of two. */
    private static double median(double[] values) {
        double[] sorted = values.clone();
        Arrays.sort(sorted);
        return sorted[sorted.length / 2];
    }
}
