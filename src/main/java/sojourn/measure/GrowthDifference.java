package sojourn.measure;

import java.time.temporal.ChronoUnit;
import java.util.EnumMap;
import java.util.Map;
import sojourn.market.FillPrices;
import sojourn.numeric.CompensatedSum;
import sojourn.trade.LedgerKind;
import sojourn.trade.Track;

/**
 * The difference of log growth between a strategy and buy-and-hold over a window, in parts. On each bar, as fractions of the wealth
 * at the close before, let g be the strategy's gains on prices, splits and dividends included, i its interest, k its costs, so that its return is r = g + i - k; the
 * same with a prime for buy-and-hold. With m_a the mean over the window's bars of the strategy's weight of asset a at their start,
 * R_a what a holder of the asset gains and M = sum_a m_a R_a, exactly
 *
 * <pre>r - r' = (M - g') + (g - M) + (i - i') - (k - k'): exposure, timing, cash, costs.</pre>
 *
 * <p>Each part of a bar times (ln(1 + r) - ln(1 + r')) / (r - r'), summed over the bars, makes parts that add up to the difference
 * of log growth. This linking is that of Cariño (1999), J. Performance Measurement 3(4), 5-14 (from memory); the parts are ours,
 * derived here. Times (R - R') / (ln(1 + R) - ln(1 + R')) they add up to the difference of total returns, or of growth per year.
 * Weights that never change have no timing, but for what is traded inside a bar. Undefined once either wealth is gone.
 */
public final class GrowthDifference {
    private static final Measured.Undefined RUIN =
            new Measured.Undefined(Measured.Reason.RUIN, "wealth reached 0, and the growth to nothing has no parts");
    private static final double DAYS_PER_YEAR = 365.25;

    private final CompensatedSum exposure = new CompensatedSum();
    private final CompensatedSum timing = new CompensatedSum();
    private final CompensatedSum cash = new CompensatedSum();
    private final Map<LedgerKind, CompensatedSum> costs = new EnumMap<>(LedgerKind.class);
    private final double ownLogGrowth;
    private final double heldLogGrowth;

    private GrowthDifference(Track strategy, Track held, FillPrices prices, int base, int last) {
        BarReturns own = new BarReturns(strategy, base, last);
        BarReturns other = new BarReturns(held, base, last);
        double[] mean = meanWeights(strategy, base, last);
        for (int bar = base + 1; bar <= last; bar++) {
            add(own, other, bar - base - 1, moved(mean, prices, bar));
        }
        ownLogGrowth = StrictMath.log(strategy.wealth(last) / strategy.wealth(base));
        heldLogGrowth = StrictMath.log(held.wealth(last) / held.wealth(base));
    }

    /**
     * The parts of the difference of total returns over the bars from {@code base} + 1 to {@code last}.
     *
     * @param held buy-and-hold, on the same prices
     */
    public static Attribution overTheWindow(Track strategy, Track held, FillPrices prices, int base, int last) {
        return ruined(strategy, held, last)
                ? Attribution.undefined(RUIN)
                : new GrowthDifference(strategy, held, prices, base, last).scaled(1);
    }

    /** The parts of the difference of growth per year; undefined under 365 days. */
    public static Attribution perYear(Track strategy, Track held, FillPrices prices, int base, int last) {
        long days =
                ChronoUnit.DAYS.between(prices.axis().date(base), prices.axis().date(last));
        if (Scorecard.isUnderOneYear(days)) {
            return Attribution.undefined(Scorecard.underOneYear(days));
        }
        return ruined(strategy, held, last)
                ? Attribution.undefined(RUIN)
                : new GrowthDifference(strategy, held, prices, base, last).scaled(DAYS_PER_YEAR / days);
    }

    private static boolean ruined(Track strategy, Track held, int last) {
        return !(strategy.wealth(last) > 0 && held.wealth(last) > 0);
    }

    private static double[] meanWeights(Track strategy, int base, int last) {
        double[] mean = new double[strategy.assets().size()];
        for (int asset = 0; asset < mean.length; asset++) {
            CompensatedSum sum = new CompensatedSum();
            for (int bar = base; bar < last; bar++) {
                sum.add(strategy.weight(bar, asset));
            }
            mean[asset] = sum.value() / (last - base);
        }
        return mean;
    }

    private static double moved(double[] weights, FillPrices prices, int bar) {
        double moved = 0;
        for (int asset = 0; asset < weights.length; asset++) {
            moved += weights[asset] * prices.holdersReturn(asset, bar);
        }
        return moved;
    }

    private void add(BarReturns own, BarReturns held, int i, double mix) {
        double link = link(own.total(i), held.total(i));
        exposure.add(link * (mix - held.gain(i)));
        timing.add(link * (own.gain(i) - mix));
        cash.add(link * (own.interest(i) - held.interest(i)));
        for (LedgerKind kind : LedgerKind.values()) {
            double more = own.cost(kind, i) - held.cost(kind, i);
            if (more != 0) {
                costs.computeIfAbsent(kind, unused -> new CompensatedSum()).add(-link * more);
            }
        }
    }

    /** (ln(1 + r) - ln(1 + r')) / (r - r'), written so that returns that are nearly or wholly the same divide well. */
    private static double link(double own, double held) {
        double apart = (own - held) / (1 + held);
        return (apart == 0 ? 1 : StrictMath.log1p(apart) / apart) / (1 + held);
    }

    /** (e^(p l) - e^(p l')) / (l - l') for the log growths l, l', in the same manner; p is the part of it that is told. */
    private Attribution scaled(double part) {
        double own = part * ownLogGrowth;
        double held = part * heldLogGrowth;
        double apart = own - held;
        double growth = apart == 0 ? 1 : StrictMath.expm1(apart) / apart;
        double scale = part * growth * StrictMath.exp(held);
        Map<LedgerKind, Measured> paid = new EnumMap<>(LedgerKind.class);
        costs.forEach((kind, sum) -> paid.put(kind, Measured.of(scale * sum.value())));
        return new Attribution(
                Measured.of(StrictMath.expm1(own) - StrictMath.expm1(held)),
                Measured.of(scale * exposure.value()),
                Measured.of(scale * timing.value()),
                Measured.of(scale * cash.value()),
                paid);
    }
}
