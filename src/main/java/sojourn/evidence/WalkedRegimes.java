package sojourn.evidence;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import sojourn.market.Known;
import sojourn.market.PriceTable;
import sojourn.regime.Observations;
import sojourn.walk.FitRecord;
import sojourn.walk.Observation;
import sojourn.walk.RefitSettings;
import sojourn.walk.RegimeSettings;
import sojourn.walk.RegimeTimeline;

/** The regimes of one strategy, as they were known at each close, with what was observed and earned: what is questioned here. */
public final class WalkedRegimes {
    private final PriceTable table;
    private final RegimeSettings regimes;
    private final RefitSettings refit;
    private final RegimeTimeline timeline;
    private final int asset;
    private final List<PerBar> observed;
    private final PerBar returns;
    private final List<Stretch> stretches;

    private WalkedRegimes(PriceTable table, RegimeSettings regimes, RefitSettings refit, RegimeTimeline timeline) {
        this.table = table;
        this.regimes = regimes;
        this.refit = refit;
        this.timeline = timeline;
        this.asset = table.asset(regimes.orderedBy());
        this.observed = regimes.observe().stream().map(this::seen).toList();
        this.returns = PerBar.of(table.size(), this::earned);
        this.stretches = List.copyOf(found());
    }

    /** {@code timeline} is the walk of these settings over these prices. */
    public static WalkedRegimes of(
            PriceTable table, RegimeSettings regimes, RefitSettings refit, RegimeTimeline timeline) {
        return new WalkedRegimes(table, regimes, refit, timeline);
    }

    private PerBar seen(Observation one) {
        return PerBar.of(table.size(), bar -> bar == 0 ? OptionalDouble.empty() : one.at(table.knownAt(bar)));
    }

    private OptionalDouble earned(int bar) {
        if (bar == 0) {
            return OptionalDouble.empty();
        }
        Known known = table.knownAt(bar);
        if (known.carried(asset, bar)) {
            return OptionalDouble.empty();
        }
        return OptionalDouble.of(known.close(asset, bar) / known.close(asset, bar - 1) - 1);
    }

    private List<Stretch> found() {
        List<FitRecord> accepted = timeline.fits().stream()
                .filter(record -> record.fit().outcome().accepted())
                .toList();
        List<Stretch> found = new ArrayList<>();
        for (int j = 0; j < accepted.size(); j++) {
            FitRecord record = accepted.get(j);
            int end = j + 1 < accepted.size() ? accepted.get(j + 1).bar() : timeline.endBar();
            found.add(new Stretch(record, bar(record.windowStart(), record.bar()), record.bar(), end));
        }
        return found;
    }

    /** The bar of a date at or before {@code latest}. */
    private int bar(LocalDate date, int latest) {
        int bar = latest;
        while (table.knownAt(bar).date().isAfter(date)) {
            bar--;
        }
        return bar;
    }

    /** The prices. */
    public PriceTable table() {
        return table;
    }

    /** The section that was walked. */
    public RegimeSettings regimes() {
        return regimes;
    }

    /** The word of the gauge. */
    public String gauge() {
        return regimes.model().word();
    }

    /** When and how it was fitted. */
    public RefitSettings refit() {
        return refit;
    }

    /** What was known of the regimes. */
    public RegimeTimeline timeline() {
        return timeline;
    }

    /** The asset whose returns order the regimes and are forecast here. */
    public String assetName() {
        return regimes.orderedBy();
    }

    int asset() {
        return asset;
    }

    /** How many bars late that asset's closes are known. */
    int barsLate() {
        return regimes.barsLate(regimes.orderedBy());
    }

    /** What the gauge saw at each bar: the first of its observations if there are several. */
    public PerBar observed() {
        return observed.get(0);
    }

    /** The first of several observations, in words, where there are several. */
    public Optional<String> firstOfSeveral() {
        return observed.size() == 1
                ? Optional.empty()
                : Optional.of(regimes.observe().get(0).inWords().replace('-', ' '));
    }

    /** Whether anything was observed on a bar. */
    boolean anyObserved(int bar) {
        return observed.stream().anyMatch(one -> one.has(bar));
    }

    /** Simple return of the asset on each bar but the first and those on which its close is carried. */
    public PerBar returns() {
        return returns;
    }

    /** The stretches of all accepted fits, in order. */
    public List<Stretch> stretches() {
        return stretches;
    }

    /** The date of a bar. */
    public LocalDate date(int bar) {
        return table.knownAt(bar).date();
    }

    /** Bars a year. */
    public double barsPerYear() {
        return table.barLength().periodsPerYear();
    }

    /** The regime of the highest filtered probability at a bar with a fit in force; ties to the lower volatility. */
    int mostLikely(int bar) {
        int best = 0;
        for (int k = 1; k < timeline.regimes().size(); k++) {
            best = timeline.probability(bar, k) > timeline.probability(bar, best) ? k : best;
        }
        return best;
    }

    /** Whether a bar lies at or after the first accepted fit. */
    boolean walked(int bar) {
        return timeline.firstBar().isPresent() && bar >= timeline.firstBar().getAsInt() && bar < timeline.endBar();
    }

    /** Whether a fit was in force at a bar, so that its regimes count. */
    public boolean known(int bar) {
        return walked(bar) && timeline.fitInForce(bar).isPresent();
    }

    /** What was observed from bar {@code from} up to, not including, {@code end}. */
    Observations rows(int from, int end) {
        int numbers = observed.size();
        double[] values = new double[(end - from) * numbers];
        boolean[] missing = new boolean[values.length];
        for (int cell = 0; cell < values.length; cell++) {
            PerBar series = observed.get(cell % numbers);
            int bar = from + cell / numbers;
            missing[cell] = !series.has(bar);
            values[cell] = series.at(bar).orElse(0);
        }
        return Observations.withMissingCells(numbers, values, missing);
    }
}
