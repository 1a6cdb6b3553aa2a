package sojourn.archive;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.function.Function;
import sojourn.regime.Emission;
import sojourn.regime.Fit;
import sojourn.regime.Gauge;
import sojourn.regime.Jump;
import sojourn.regime.LongRun;
import sojourn.regime.MultivariateNormal;
import sojourn.regime.RegimeModel;
import sojourn.regime.StudentT;
import sojourn.regime.VolatilityThreshold;
import sojourn.walk.CandidateFit;
import sojourn.walk.FitRecord;
import sojourn.walk.RegimeTimeline;

/** What a fits file says of a gauge in numbers: a column a number, empty for a fit that has no such number. */
final class FitColumns {
    private final List<String> regimes;
    private final List<Column> columns = new ArrayList<>();

    /** A column's name, and what stands in it in the row of a fit. */
    record Column(String name, Function<FitRecord, OptionalDouble> cell) {}

    /** A number that a part of a fit has for each state. */
    private interface PerState<T> {
        double of(T part, int state);
    }

    private FitColumns(List<String> regimes) {
        this.regimes = regimes;
    }

    /**
     * The columns of a timeline's gauges; those of a model with a likelihood where nothing could be fitted.
     *
     * @param observed the observed series' column names
     */
    static List<Column> of(RegimeTimeline timeline, List<String> observed) {
        FitColumns all = new FitColumns(timeline.regimes());
        List<Gauge> gauges = timeline.fits().stream()
                .flatMap(record -> record.fit().gauge().stream())
                .toList();
        boolean likelihood = gauges.isEmpty() || gauges.stream().anyMatch(RegimeModel.class::isInstance);
        if (likelihood) {
            all.each("initial.", Fit::model, RegimeModel::initial);
        }
        all.transitions();
        if (likelihood) {
            all.emissions(observed, gauges);
        }
        if (gauges.stream().anyMatch(VolatilityThreshold.class::isInstance)) {
            all.one("storm_above", VolatilityThreshold.class, t -> t.levels().stormAbove());
            all.one("calm_below", VolatilityThreshold.class, t -> t.levels().calmBelow());
        }
        if (gauges.stream().anyMatch(Jump.class::isInstance)) {
            all.centres(observed);
        }
        all.each("order_by.", FitColumns::gauged, (fit, k) -> fit.orderBy()[k]);
        all.stays();
        all.each("occupancy.", FitColumns::gauged, (fit, k) -> fit.occupancy()[k]);
        timeline.fits().stream()
                .map(FitRecord::candidates)
                .filter(candidates -> candidates.size() > 1)
                .findFirst()
                .ifPresent(all::choice);
        return all.columns;
    }

    private void emissions(List<String> observed, List<Gauge> gauges) {
        for (int column = 0; column < observed.size(); column++) {
            int c = column;
            each(
                    "mean." + observed.get(c) + ".",
                    Fit::model,
                    (m, k) -> m.emission().mean(k, c));
        }
        for (int column = 0; column < observed.size(); column++) {
            int c = column;
            each(
                    "sd." + observed.get(c) + ".",
                    Fit::model,
                    (m, k) -> m.emission().standardDeviation(k, c));
        }
        for (int first = 0; first < observed.size(); first++) {
            for (int second = first + 1; second < observed.size(); second++) {
                int a = first;
                int b = second;
                each(
                        "correlation." + observed.get(a) + "." + observed.get(b) + ".",
                        fit -> emission(MultivariateNormal.class, fit),
                        (normal, k) -> normal.correlation(k, a, b));
            }
        }
        if (gauges.stream().anyMatch(gauge -> gauge instanceof RegimeModel m && m.emission() instanceof StudentT)) {
            each("scale." + observed.get(0) + ".", fit -> emission(StudentT.class, fit), StudentT::scale);
            each("dof.", fit -> emission(StudentT.class, fit), StudentT::degreesOfFreedom);
        }
    }

    private void centres(List<String> observed) {
        for (int column = 0; column < observed.size(); column++) {
            int c = column;
            one("scaling." + observed.get(c), Jump.class, jump -> jump.centres().scale(c));
        }
        for (int column = 0; column < observed.size(); column++) {
            int c = column;
            each(
                    "mean." + observed.get(c) + ".",
                    fit -> as(Jump.class, fit),
                    (jump, k) -> jump.centres().centre(k, c));
        }
    }

    private static <E extends Emission> Optional<E> emission(Class<E> kind, Fit fit) {
        return fit.model().map(RegimeModel::emission).filter(kind::isInstance).map(kind::cast);
    }

    private static <G extends Gauge> Optional<G> as(Class<G> kind, Fit fit) {
        return fit.gauge().filter(kind::isInstance).map(kind::cast);
    }

    private static Optional<Fit> gauged(Fit fit) {
        return fit.gauge().map(gauge -> fit);
    }

    private <T> void each(String prefix, Function<Fit, Optional<T>> part, PerState<T> number) {
        for (String regime : regimes) {
            columns.add(new Column(prefix + regime, record -> {
                OptionalInt state = record.state(regime);
                return state.isEmpty()
                        ? OptionalDouble.empty()
                        : number(part.apply(record.fit()), p -> number.of(p, state.getAsInt()));
            }));
        }
    }

    private <G extends Gauge> void one(String name, Class<G> kind, Function<G, Double> number) {
        columns.add(new Column(name, record -> number(as(kind, record.fit()), number)));
    }

    private void transitions() {
        for (String from : regimes) {
            for (String to : regimes) {
                columns.add(new Column("transition." + from + "." + to, record -> {
                    OptionalInt i = record.state(from);
                    OptionalInt j = record.state(to);
                    return i.isEmpty() || j.isEmpty()
                            ? OptionalDouble.empty()
                            : number(record.fit().gauge(), gauge -> gauge.transition(i.getAsInt(), j.getAsInt()));
                }));
            }
        }
    }

    /** Expected bars of a stay in each regime, as {@link LongRun#expectedStay} has it. */
    private void stays() {
        for (String regime : regimes) {
            columns.add(new Column("stay_bars." + regime, record -> {
                OptionalInt k = record.state(regime);
                return k.isEmpty()
                        ? OptionalDouble.empty()
                        : record.fit()
                                .gauge()
                                .map(gauge -> LongRun.expectedStay(gauge, k.getAsInt()))
                                .orElseGet(OptionalDouble::empty);
            }));
        }
    }

    /** Of each number of regimes that a fit chose among: its criterion and the score that was compared. */
    private void choice(List<CandidateFit> candidates) {
        for (int c = 0; c < candidates.size(); c++) {
            int candidate = c;
            int states = candidates.get(c).regimes().size();
            columns.add(new Column(
                    "bic." + states,
                    record -> record.candidates().get(candidate).bic()));
            columns.add(new Column(
                    "score." + states,
                    record -> record.candidates().get(candidate).compared()));
        }
    }

    private static <T> OptionalDouble number(Optional<T> part, Function<T, Double> of) {
        return part.map(p -> OptionalDouble.of(of.apply(p))).orElse(OptionalDouble.empty());
    }
}
