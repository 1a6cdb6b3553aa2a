package sojourn.walk;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import sojourn.market.Known;
import sojourn.market.PriceTable;
import sojourn.numeric.Check;

/**
 * What was known of the regimes at each close of a history: the fits as they were made, and from the first accepted one on the
 * fit in force and its filtered probabilities. A value that any number of rules share.
 */
public final class RegimeTimeline implements Signal {
    private final List<String> regimes;
    private final List<String> assets;
    private final List<FitRecord> fits;
    private final int firstBar;
    private final LocalDate[] dates;
    private final int[] fitInForce;
    private final double[] filtered;
    private final double[] logScores;
    private final double[] expectedCash;
    private final boolean zeroMean;
    private final List<Integer> impossible;
    private final List<Optional<Reading>> readings;

    private RegimeTimeline(Builder builder) {
        this.regimes = builder.regimes;
        this.assets = builder.assets;
        this.fits = List.copyOf(builder.fits);
        this.firstBar = builder.firstBar;
        this.dates = Arrays.copyOf(builder.dates, builder.bars);
        this.fitInForce = Arrays.copyOf(builder.fitInForce, builder.bars);
        this.filtered = Arrays.copyOf(builder.filtered, builder.bars * regimes.size());
        this.logScores = Arrays.copyOf(builder.logScores, builder.bars);
        this.expectedCash = Arrays.copyOf(builder.expectedCash, builder.bars);
        this.zeroMean = builder.zeroMean;
        this.impossible = List.copyOf(builder.impossible);
        this.readings = made();
    }

    /** Made once, because every rule on this timeline asks for all of them. */
    private List<Optional<Reading>> made() {
        LinkedReadings linked = new LinkedReadings(fits, regimes);
        int states = regimes.size();
        for (int row = 0; row < dates.length; row++) {
            if (fitInForce[row] == 0) {
                linked.none();
            } else {
                double[] now = Arrays.copyOfRange(filtered, row * states, (row + 1) * states);
                Optional<Double> mean = zeroMean ? Optional.of(expectedCash[row]) : Optional.empty();
                linked.add(firstBar + row, fitInForce[row], now, new LinkedReadings.Means(mean));
            }
        }
        return linked.made();
    }

    @Override
    public List<String> regimes() {
        return regimes;
    }

    /** The assets whose returns the forecasts are of. */
    public List<String> assets() {
        return assets;
    }

    /** Every fit, refused ones too, in the order they were made. */
    public List<FitRecord> fits() {
        return fits;
    }

    /** The bar of the first accepted fit; empty if there was none. */
    public OptionalInt firstBar() {
        return dates.length == 0 ? OptionalInt.empty() : OptionalInt.of(firstBar);
    }

    /** One past the last bar walked, or 0 if nothing was ever known. */
    public int endBar() {
        return dates.length == 0 ? 0 : firstBar + dates.length;
    }

    /** The date of a bar from the first accepted fit on. */
    public LocalDate date(int bar) {
        return dates[bar - firstBar];
    }

    /** The number of the fit in force at a bar; empty where the strategy stands aside. */
    public OptionalInt fitInForce(int bar) {
        int fit = fitInForce[bar - firstBar];
        return fit == 0 ? OptionalInt.empty() : OptionalInt.of(fit);
    }

    /** Filtered probability of regime {@code k} at a bar. */
    public double probability(int bar, int k) {
        return filtered[(bar - firstBar) * regimes.size() + k];
    }

    /**
     * ln of the density that the fit in force before this bar gave to this bar's observation: the out-of-sample score. Empty on
     * the first bar, on bars without an observation or with an {@link #impossible()} one, where no fit was in force and for gauges
     * without a likelihood.
     */
    public OptionalDouble logScore(int bar) {
        double score = logScores[bar - firstBar];
        return Double.isNaN(score) ? OptionalDouble.empty() : OptionalDouble.of(score);
    }

    /**
     * The bars whose observation the fit in force before them held for impossible, density 0 in every regime: their score is minus
     * infinity, which no file can hold, and probabilities were left as predicted.
     */
    public List<Integer> impossible() {
        return impossible;
    }

    /** The accepted fit that was made last; there must be one. */
    FitRecord lastAccepted() {
        return fits.stream()
                .filter(record -> record.fit().outcome().accepted())
                .reduce((before, after) -> after)
                .orElseThrow();
    }

    @Override
    public Optional<Reading> at(Known known) {
        return reading(known.bar());
    }

    /** The reading at a bar; empty before the first accepted fit and where the strategy stands aside. */
    public Optional<Reading> reading(int bar) {
        int row = bar - firstBar;
        return row < 0 || row >= readings.size() ? Optional.empty() : readings.get(row);
    }

    /** Takes in bar after bar. */
    static final class Builder {
        private final List<String> regimes;
        private final List<String> assets;
        private final boolean zeroMean;
        private final List<FitRecord> fits = new ArrayList<>();
        private final List<Integer> impossible = new ArrayList<>();
        private int firstBar;
        private int bars;
        private LocalDate[] dates = new LocalDate[64];
        private int[] fitInForce = new int[64];
        private double[] filtered;
        private double[] logScores = new double[64];
        private double[] expectedCash = new double[64];

        Builder(List<String> regimes, List<String> assets, MeanOf meanOf) {
            this.regimes = List.copyOf(regimes);
            this.assets = List.copyOf(assets);
            this.zeroMean = meanOf == MeanOf.CASH;
            this.filtered = new double[64 * regimes.size()];
        }

        /** What a regime's expected return is. */
        enum MeanOf {
            /** The mean of the window. */
            WINDOW,
            /** The cash rate, because the emission fits no mean. */
            CASH
        }

        /** Takes over the fits and bars of a timeline on the first bars of {@code table}; nothing, if no fit was accepted. */
        void takeOver(RegimeTimeline earlier, PriceTable table) {
            Check.that(earlier.regimes.equals(regimes), "the regimes were " + earlier.regimes + ", now " + regimes);
            Check.that(earlier.assets.equals(assets), "the assets were " + earlier.assets + ", now " + assets);
            Check.that(
                    earlier.endBar() <= table.size(),
                    "the timeline ends after bar " + earlier.endBar() + " of " + table.size());
            if (earlier.firstBar().isEmpty()) {
                return;
            }
            fits.addAll(earlier.fits);
            impossible.addAll(earlier.impossible);
            for (int bar = earlier.firstBar; bar < earlier.endBar(); bar++) {
                Known known = table.knownAt(bar);
                int row = bar - earlier.firstBar;
                Check.that(
                        known.date().equals(earlier.dates[row]),
                        "bar " + bar + " was of " + earlier.dates[row] + ", now " + known.date());
                double[] probabilities =
                        Arrays.copyOfRange(earlier.filtered, row * regimes.size(), (row + 1) * regimes.size());
                bar(known, earlier.fitInForce[row], probabilities, earlier.logScore(bar));
            }
        }

        int nextFitNumber() {
            return fits.size() + 1;
        }

        void fit(FitRecord record) {
            fits.add(record);
        }

        /** The observation at the bar that {@code known} ends with was impossible by the fit in force. */
        void impossible(Known known) {
            impossible.add(known.bar());
        }

        /** {@code fitNumber} 0 where the strategy stands aside; {@code probabilities} is not modified. */
        void bar(Known known, int fitNumber, double[] probabilities, OptionalDouble logScore) {
            if (bars == 0) {
                firstBar = known.bar();
            }
            grow();
            dates[bars] = known.date();
            fitInForce[bars] = fitNumber;
            System.arraycopy(probabilities, 0, filtered, bars * regimes.size(), regimes.size());
            logScores[bars] = logScore.orElse(Double.NaN);
            expectedCash[bars] = known.expectedCashReturn();
            bars++;
        }

        RegimeTimeline build() {
            return new RegimeTimeline(this);
        }

        private void grow() {
            if (bars == dates.length) {
                dates = Arrays.copyOf(dates, 2 * bars);
                fitInForce = Arrays.copyOf(fitInForce, 2 * bars);
                filtered = Arrays.copyOf(filtered, 2 * bars * regimes.size());
                logScores = Arrays.copyOf(logScores, 2 * bars);
                expectedCash = Arrays.copyOf(expectedCash, 2 * bars);
            }
        }
    }
}
