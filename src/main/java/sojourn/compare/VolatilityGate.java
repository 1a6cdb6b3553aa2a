package sojourn.compare;

import java.time.LocalDate;
import java.util.List;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.stream.IntStream;
import sojourn.allocate.Decision;
import sojourn.allocate.Policy;
import sojourn.allocate.Situation;
import sojourn.allocate.Stance;
import sojourn.market.Known;
import sojourn.market.PriceTable;
import sojourn.numeric.Quantile;
import sojourn.walk.FitRecord;
import sojourn.walk.Reading;
import sojourn.walk.RegimeTimeline;

/**
 * A strategy's own rule, told its regimes by the volatility of the last 21 bars alone: the regime is k where that volatility lies
 * between two levels, and the levels are the quantiles of its values inside the window of the fit in force that leave to each
 * regime the share that the fit gave it there. So the gate is in storms as often as the model was, and what differs is when.
 * The levels stand until the next fit, as the model's parameters do; a regime stays until the next close (probabilities 0 or 1,
 * no transitions), and the moments of returns that some rules ask for are the fit's. While there is no such volatility: the
 * calmest regime.
 */
final class VolatilityGate implements Policy {
    /** Shares that differ by less from nothing or all are nothing or all: they are sums of probabilities. */
    private static final double ROUNDING = 1e-9;

    private final Policy rule;
    private final TrailingVolatility volatility;
    private final List<double[]> levelsByFit;
    private final double[] staying;

    /**
     * Told by one asset's volatility.
     *
     * @param rule what decides
     * @param timeline its fits; at least two regimes
     * @param volatility of the asset that orders the regimes, on {@code table}
     */
    VolatilityGate(Policy rule, RegimeTimeline timeline, PriceTable table, TrailingVolatility volatility) {
        this.rule = rule;
        this.volatility = volatility;
        this.levelsByFit = timeline.fits().stream()
                .map(fit -> levels(fit, timeline.regimes(), table.knownAt(fit.bar()), volatility))
                .toList();
        int states = timeline.regimes().size();
        this.staying = new double[states * states];
        for (int k = 0; k < states; k++) {
            staying[k * states + k] = 1;
        }
    }

    /** One level below each regime but the calmest: the regime is at least k + 1 where the volatility lies above level k. */
    private static double[] levels(FitRecord fit, List<String> regimes, Known known, TrailingVolatility volatility) {
        if (!fit.fit().outcome().accepted()) {
            return new double[0];
        }
        double[] ascending = IntStream.rangeClosed(firstBar(known, fit.windowStart()), fit.bar())
                .mapToObj(volatility::recent)
                .filter(OptionalDouble::isPresent)
                .mapToDouble(OptionalDouble::getAsDouble)
                .sorted()
                .toArray();
        double[] occupancy = fit.fit().occupancy();
        double[] levels = new double[regimes.size() - 1];
        double share = 0;
        for (int k = 0; k < levels.length; k++) {
            OptionalInt state = fit.state(regimes.get(k));
            share += state.isPresent() ? occupancy[state.getAsInt()] : 0;
            levels[k] = level(ascending, share);
        }
        return levels;
    }

    private static double level(double[] ascending, double share) {
        if (ascending.length == 0 || share >= 1 - ROUNDING) {
            return Double.POSITIVE_INFINITY;
        }
        return share <= ROUNDING ? Double.NEGATIVE_INFINITY : Quantile.ofAscending(ascending, share);
    }

    /** The first bar dated {@code date} or later. */
    private static int firstBar(Known known, LocalDate date) {
        int low = 0;
        int high = known.bar();
        while (low < high) {
            int middle = (low + high) / 2;
            if (known.date(middle).isBefore(date)) {
                low = middle + 1;
            } else {
                high = middle;
            }
        }
        return low;
    }

    @Override
    public Decision at(Situation situation, Stance stance) {
        Situation told = new Situation(
                situation.known(),
                situation.reading().map(reading -> told(reading, situation.bar())),
                situation.regimes(),
                situation.weights(),
                situation.barsAhead());
        return rule.at(told, stance);
    }

    private Reading told(Reading reading, int bar) {
        double[] probabilities = new double[reading.states()];
        double[] levels = levelsByFit.get(reading.fit() - 1);
        OptionalDouble now = volatility.recent(bar);
        int regime = 0;
        while (now.isPresent() && regime < levels.length && now.getAsDouble() > levels[regime]) {
            regime++;
        }
        probabilities[regime] = 1;
        return Reading.of(reading.fit(), probabilities, staying, reading.moments());
    }
}
