package sojourn.walk;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import sojourn.regime.Fit;
import sojourn.regime.FitRequest;
import sojourn.regime.GaugeFilter;
import sojourn.regime.GaugeSettings;
import sojourn.regime.Observations;
import sojourn.regime.StartRunner;

/** One number of regimes on its way through a walk: its last accepted fit, and the filter that goes by it. */
final class Candidate {
    private final List<String> regimes;
    private final GaugeSettings settings;
    private Optional<Fit> accepted = Optional.empty();
    private Optional<GaugeFilter> filter = Optional.empty();

    Candidate(List<String> regimes, GaugeSettings settings) {
        this.regimes = List.copyOf(regimes);
        this.settings = settings;
    }

    List<String> regimes() {
        return regimes;
    }

    /** Whether a fit of it was accepted. */
    boolean stands() {
        return accepted.isPresent();
    }

    /** Its filter at the last bar; there must be one. */
    GaugeFilter filter() {
        return filter.orElseThrow();
    }

    /** One bar on with frozen parameters. */
    void step(Observations x, int row) {
        filter = filter.map(now -> now.step(x, row));
    }

    /** What it gave to the last bar's observation before it was fitted to; empty where there is nothing to score. */
    OptionalDouble score() {
        return filter.map(GaugeFilter::lastLogDensity).orElseGet(OptionalDouble::empty);
    }

    /** Whether it held the last bar's observation for impossible. */
    boolean impossible() {
        return filter.map(GaugeFilter::impossible).orElse(false);
    }

    /** Fits it, its last accepted fit being one more start. */
    Fit fit(FitRequest cold, StartRunner runner) {
        return settings.fit(accepted.map(cold::after).orElse(cold), runner);
    }

    /** Goes by that fit from now on; its filter begins afresh: {@code rows} are those from the start of the fit's window to the last bar. */
    void adopt(Fit fit, Observations rows) {
        accepted = Optional.of(fit);
        filter = Optional.of(fit.gauge().orElseThrow().filterAfter(rows));
    }
}
