package sojourn.latest;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import sojourn.market.PriceTable;
import sojourn.regime.Gauge;
import sojourn.regime.GaugeFilter;
import sojourn.regime.Observations;
import sojourn.regime.RegimeModel;
import sojourn.walk.FitRecord;
import sojourn.walk.Observation;

/**
 * The filter's step at one bar, by the fit in force at it: posterior_k = predicted_k f_k(x) / sum_j predicted_j f_j(x), with predicted
 * = prior A. Of a fit made at this very bar the filter ran through the window anew, so the prior is by its parameters too. Without
 * an observation the posterior is what was predicted.
 *
 * @param regimes those of the fit
 * @param prior probability of each at the close before; empty if the window begins at this bar
 * @param predicted probability of each before this bar was seen
 * @param observed what was seen, one a series; empty where it is missing
 * @param logDensities ln f_k(x) of each; empty for a gauge that has no densities, and without an observation
 * @param posterior probability of each at this close
 */
public record FilterStep(
        List<String> regimes,
        List<Double> prior,
        List<Double> predicted,
        List<OptionalDouble> observed,
        List<Double> logDensities,
        List<Double> posterior) {
    /** Copies the lists. */
    public FilterStep {
        regimes = List.copyOf(regimes);
        prior = List.copyOf(prior);
        predicted = List.copyOf(predicted);
        observed = List.copyOf(observed);
        logDensities = List.copyOf(logDensities);
        posterior = List.copyOf(posterior);
    }

    /** The step at the last close of {@code table}, by {@code fit}, which is in force there. */
    static FilterStep of(PriceTable table, List<Observation> observe, FitRecord fit) {
        int last = table.size() - 1;
        int start = last;
        while (start > 0 && !table.knownAt(start).date().equals(fit.windowStart())) {
            start--;
        }
        Observations rows = rows(table, observe, start);
        Gauge gauge = fit.fit().gauge().orElseThrow();
        GaugeFilter before = gauge.filterAfter(rows.range(0, rows.size() - 1));
        boolean begins = rows.size() == 1;
        double[] predicted = begins ? initial(gauge) : ahead(before.probabilities(), gauge);
        double[] posterior = before.step(rows, rows.size() - 1).probabilities();
        return new FilterStep(
                fit.regimes(),
                begins ? List.of() : boxed(before.probabilities()),
                boxed(predicted),
                observe.stream().map(one -> one.at(table.knownAt(last))).toList(),
                densities(gauge, rows),
                boxed(posterior));
    }

    private static double[] initial(Gauge gauge) {
        double[] initial = new double[gauge.states()];
        if (gauge instanceof RegimeModel model) {
            Arrays.setAll(initial, model::initial);
        }
        return initial;
    }

    private static double[] ahead(double[] prior, Gauge gauge) {
        double[] next = new double[prior.length];
        for (int i = 0; i < prior.length; i++) {
            for (int j = 0; j < prior.length; j++) {
                next[j] += prior[i] * gauge.transition(i, j);
            }
        }
        return next;
    }

    private static List<Double> densities(Gauge gauge, Observations rows) {
        Optional<RegimeModel> model = gauge instanceof RegimeModel one ? Optional.of(one) : Optional.empty();
        int row = rows.size() - 1;
        List<Double> densities = new ArrayList<>();
        for (int k = 0; k < gauge.states() && model.isPresent() && !rows.missing(row); k++) {
            densities.add(model.get().emission().logDensity(rows, row, k));
        }
        return densities;
    }

    private static Observations rows(PriceTable table, List<Observation> observe, int start) {
        int series = observe.size();
        double[] values = new double[(table.size() - start) * series];
        boolean[] missing = new boolean[values.length];
        for (int cell = 0; cell < values.length; cell++) {
            OptionalDouble value = observe.get(cell % series).at(table.knownAt(start + cell / series));
            values[cell] = value.orElse(0);
            missing[cell] = value.isEmpty();
        }
        return Observations.withMissingCells(series, values, missing);
    }

    private static List<Double> boxed(double[] values) {
        return Arrays.stream(values).boxed().toList();
    }
}
