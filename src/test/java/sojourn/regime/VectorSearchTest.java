package sojourn.regime;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.function.Supplier;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import sojourn.OpenData;
import sojourn.numeric.RandomStream;

/** What a fit of several series promises: closed forms, invariances, a true maximum with numbers missing, determinism. */
class VectorSearchTest {
    private static final FitSettings TWO = new FitSettings(ModelKind.HIDDEN_MARKOV, 2, EmissionFamily.NORMAL, 5);
    private static final FitSettings TWO_DIAGONAL =
            new FitSettings(ModelKind.HIDDEN_MARKOV, 2, EmissionFamily.NORMAL_DIAGONAL, 5);
    private static final Observations PAIR = Vectors.daxAndSmi();

    @ParameterizedTest
    @CsvSource({"HIDDEN_MARKOV, FREE", "HIDDEN_MARKOV, STATIONARY", "MIXTURE, FREE"})
    void oneColumnReachesTheMaximumOfTheUnivariateSearch(ModelKind kind, InitialDistribution initial) {
        Observations x = Observations.univariate(OpenData.column("smi/eustock_smi.csv", "log_return"));
        for (EmissionFamily family : List.of(EmissionFamily.NORMAL, EmissionFamily.NORMAL_DIAGONAL)) {
            FitSettings settings = new FitSettings(kind, 2, family, initial, 5);
            SearchEnd many = best(new VectorSearch(settings, x), Vectors.request(x));
            SearchEnd one = best(new ScalarSearch(settings, x), Vectors.request(x));
            assertThat(many.logLikelihood()).isCloseTo(one.logLikelihood(), within(1e-7));
            int[] map = Matching.of(univariate(many.model()), one.model().emission())
                    .newForOld();
            double unit = one.model().emission().standardDeviation(0, 0);
            for (int k = 0; k < 2; k++) {
                assertThat(many.model().emission().mean(k, 0) / unit)
                        .isCloseTo(one.model().emission().mean(map[k], 0) / unit, within(1e-5));
                assertThat(many.model().emission().standardDeviation(k, 0) / unit)
                        .isCloseTo(one.model().emission().standardDeviation(map[k], 0) / unit, within(1e-5));
                assertThat(many.model().transition(k, k))
                        .isCloseTo(one.model().transition(map[k], map[k]), within(1e-5));
            }
        }
    }

    @Test
    void aNewUnitShiftsTheLikelihoodAndNothingElse() {
        double[] dax = OpenData.column("dax/eustock_dax.csv", "log_return");
        double[] smi = OpenData.column("smi/eustock_smi.csv", "log_return");
        Fit fit = Fitter.fit(TWO, Vectors.request(PAIR));
        double[][] factors = {{4, 4}, {1e-3, 1e3}};
        for (double[] c : factors) {
            double[] first = new double[dax.length];
            double[] second = new double[dax.length];
            for (int t = 0; t < dax.length; t++) {
                first[t] = c[0] * dax[t];
                second[t] = c[1] * smi[t];
            }
            Observations scaled = Vectors.columns(first, second);
            Fit other = Fitter.fit(TWO, Vectors.request(scaled));
            double shift = dax.length * (StrictMath.log(c[0]) + StrictMath.log(c[1]));
            assertThat(other.logLikelihood()).isCloseTo(fit.logLikelihood() - shift, within(1e-8));
            FilterState last = FilterState.after(fit.model().orElseThrow(), PAIR);
            FilterState lastScaled = FilterState.after(other.model().orElseThrow(), scaled);
            // equal maxima found along paths that differ in their last bits
            assertThat(lastScaled.probability(0)).isCloseTo(last.probability(0), within(1e-6));
        }
    }

    @Test
    void theOrderOfColumnsChangesNothing() {
        double[] dax = OpenData.column("dax/eustock_dax.csv", "log_return");
        double[] smi = OpenData.column("smi/eustock_smi.csv", "log_return");
        Observations turned = Vectors.columns(smi, dax);
        Companions returns = Companions.of(1, dax);
        for (FitSettings settings : List.of(TWO, TWO_DIAGONAL)) {
            Fit fit = Fitter.fit(settings, FitRequest.of(PAIR, dax, returns, 1, Fixtures.DATE));
            Fit other = Fitter.fit(settings, FitRequest.of(turned, dax, returns, 1, Fixtures.DATE));
            assertThat(other.logLikelihood()).isCloseTo(fit.logLikelihood(), within(1e-8));
            MultivariateNormal a =
                    (MultivariateNormal) fit.model().orElseThrow().emission();
            MultivariateNormal b =
                    (MultivariateNormal) other.model().orElseThrow().emission();
            for (int k = 0; k < 2; k++) {
                assertThat(b.standardDeviation(k, 1) / a.standardDeviation(k, 0))
                        .isCloseTo(1, within(1e-6));
                assertThat(b.correlation(k, 0, 1)).isCloseTo(a.correlation(k, 0, 1), within(1e-6));
            }
        }
    }

    @Test
    void independentColumnsOfOneRegimeAreTwoFits() {
        FitSettings one = new FitSettings(ModelKind.ONE_REGIME, 1, EmissionFamily.NORMAL_DIAGONAL, 1);
        FitSettings scalar = new FitSettings(ModelKind.ONE_REGIME, 1, EmissionFamily.NORMAL, 1);
        Fit both = Fitter.fit(one, Vectors.request(PAIR));
        double sum = 0;
        for (String name : List.of("dax", "smi")) {
            double[] x = OpenData.column(name + "/eustock_" + name + ".csv", "log_return");
            sum += Fitter.fit(scalar, Fixtures.request(x)).logLikelihood();
        }
        assertThat(both.logLikelihood()).isCloseTo(sum, within(1e-8));
        assertThat(both.outcome()).isEqualTo(Outcome.CONVERGED);
    }

    @Test
    void missingNumbersOfOneRegimeHaveTheClosedForm() {
        // Anderson (1957), J. American Statistical Association 52, 200-203: where only the second column has gaps, its
        // moments follow
        // from the regression on the first over the complete rows, put on the first column's moments over all rows
        boolean[] missing = new boolean[2 * PAIR.size()];
        for (int t = 0; t < PAIR.size(); t++) {
            missing[2 * t + 1] = t % 3 == 0 || t < 500;
        }
        Observations x = Vectors.without(PAIR, missing);
        FitSettings one = new FitSettings(ModelKind.ONE_REGIME, 1, EmissionFamily.NORMAL, 1);
        Fit fit = Fitter.fit(one, Vectors.request(x));
        MultivariateNormal normal =
                (MultivariateNormal) fit.model().orElseThrow().emission();
        double[] all = moments(x, false);
        double[] complete = moments(x, true);
        double slope = complete[4] / complete[2];
        double left = complete[3] - slope * complete[4];
        assertThat(normal.mean(0, 0)).isCloseTo(all[0], within(1e-9));
        assertThat(normal.mean(0, 1)).isCloseTo(complete[1] + slope * (all[0] - complete[0]), within(1e-9));
        assertThat(normal.covariance(0, 0, 0) / all[2]).isCloseTo(1, within(1e-7));
        assertThat(normal.covariance(0, 0, 1) / (slope * all[2])).isCloseTo(1, within(1e-7));
        assertThat(normal.covariance(0, 1, 1) / (left + slope * slope * all[2])).isCloseTo(1, within(1e-7));
        assertThat(fit.observations()).isEqualTo(PAIR.size());
    }

    /** Means, variances and covariance with divisor n; of complete rows, or the first column's of all. */
    private static double[] moments(Observations x, boolean complete) {
        double[] m = new double[5];
        double n = 0;
        for (int pass = 0; pass < 2; pass++) {
            n = 0;
            for (int t = 0; t < x.size(); t++) {
                if (complete && x.missing(t, 1)) {
                    continue;
                }
                n++;
                double second = x.missing(t, 1) ? 0 : x.at(t, 1);
                if (pass == 0) {
                    m[0] += x.at(t, 0);
                    m[1] += second;
                } else {
                    m[2] += (x.at(t, 0) - m[0]) * (x.at(t, 0) - m[0]);
                    m[3] += (second - m[1]) * (second - m[1]);
                    m[4] += (x.at(t, 0) - m[0]) * (second - m[1]);
                }
            }
            for (int e = 2 * pass; e < (pass == 0 ? 2 : 5); e++) {
                m[e] /= n;
            }
        }
        return m;
    }

    @ParameterizedTest
    @CsvSource({"NORMAL", "NORMAL_DIAGONAL"})
    void withNumbersMissingNoParameterCanBeMovedForTheBetter(EmissionFamily.Form form) {
        RandomStream random = RandomStream.of(41, "gaps");
        boolean[] missing = new boolean[2 * PAIR.size()];
        for (int e = 0; e < missing.length; e++) {
            missing[e] = random.nextDouble() < (e % 2 == 0 ? 0.1 : 0.4) || e / 2 % 200 == 7;
        }
        Observations x = Vectors.without(PAIR, missing);
        EmissionFamily family =
                form == EmissionFamily.Form.NORMAL ? EmissionFamily.NORMAL : EmissionFamily.NORMAL_DIAGONAL;
        Fit fit = Fitter.fit(new FitSettings(ModelKind.HIDDEN_MARKOV, 2, family, 3), Vectors.request(x));
        assertThat(fit.outcome()).isEqualTo(Outcome.CONVERGED);
        assertThat(fit.observations()).isEqualTo(x.present()).isLessThan(PAIR.size());
        RegimeModel model = fit.model().orElseThrow();
        MultivariateNormal normal = (MultivariateNormal) model.emission();
        boolean full = family.equals(EmissionFamily.NORMAL);
        for (int k = 0; k < 2; k++) {
            for (int i = 0; i < 2; i++) {
                double unit = normal.standardDeviation(k, i);
                int e = 2 * k + i;
                assertFlat(x, model, step -> emission(normal, e, step * unit, -1, 0, full));
                assertFlat(x, model, step -> emission(normal, -1, 0, e, 1 + step, full));
            }
        }
    }

    private interface Moved {
        MultivariateNormal by(double step);
    }

    /** The likelihood falls both ways, and by the same: its slope is nothing beside its curvature. */
    private static void assertFlat(Observations x, RegimeModel model, Moved moved) {
        double here = FilterState.after(model, x).logLikelihood();
        double h = 1e-2;
        double up = FilterState.after(with(model, moved.by(h)), x).logLikelihood();
        double down = FilterState.after(with(model, moved.by(-h)), x).logLikelihood();
        assertThat(up).isLessThan(here);
        assertThat(down).isLessThan(here);
        double small = 1e-4;
        double slope = (FilterState.after(with(model, moved.by(small)), x).logLikelihood()
                        - FilterState.after(with(model, moved.by(-small)), x).logLikelihood())
                / (2 * small);
        assertThat(slope)
                .isCloseTo(0, within(5e-3)); // of curvatures in the hundreds; third derivatives leave 1e-8 of those
    }

    private static RegimeModel with(RegimeModel model, Emission emission) {
        double[] initial = {model.initial(0), model.initial(1)};
        double[] transition = {
            model.transition(0, 0), model.transition(0, 1), model.transition(1, 0), model.transition(1, 1)
        };
        return HiddenMarkov.of(initial, transition, emission);
    }

    /** The same emission with one mean moved by so much, or the spread of one column of one state stretched by a factor. */
    private static MultivariateNormal emission(
            MultivariateNormal normal, int meanEntry, double by, int spreadEntry, double factor, boolean full) {
        double[] means = new double[4];
        double[] sds = new double[4];
        double[] covariances = new double[8];
        for (int e = 0; e < 4; e++) {
            means[e] = normal.mean(e / 2, e % 2) + (e == meanEntry ? by : 0);
            sds[e] = normal.standardDeviation(e / 2, e % 2) * (e == spreadEntry ? factor : 1);
        }
        for (int e = 0; e < 8; e++) {
            int k = e / 4;
            covariances[e] = normal.correlation(k, e / 2 % 2, e % 2) * sds[2 * k + e / 2 % 2] * sds[2 * k + e % 2];
        }
        return full ? MultivariateNormal.full(2, means, covariances) : MultivariateNormal.diagonal(2, means, sds);
    }

    @Test
    void speedingUpEndsNoLowerThanPlainEm() {
        boolean[] missing = new boolean[2 * PAIR.size()];
        for (int e = 0; e < missing.length; e++) {
            missing[e] = e % 7 == 0;
        }
        for (Observations x : List.of(PAIR, Vectors.without(PAIR, missing))) {
            VectorWindow window = VectorWindow.of(x);
            double[] least = {1e-6, 0, 0, 1e-6};
            VectorMaximisation step = new VectorMaximisation(EmissionFamily.NORMAL, InitialDistribution.FREE, least);
            VectorParameters alone = VectorParameters.blank(Parameters.blank(ModelKind.MIXTURE, 1), 2);
            System.arraycopy(new double[] {1, 0.7, 0.7, 1}, 0, alone.covariances(), 0, 4);
            for (VectorParameters start : new VectorStarts(TWO, window, alone).all(Vectors.request(x))) {
                VectorSums sums = new VectorSums(2, 2);
                VectorExpectation expectation = new VectorExpectation(window, 2);
                VectorParameters at = start;
                double before = Double.NEGATIVE_INFINITY;
                for (int n = 0; n < 1000; n++) {
                    assertThat(expectation.fill(at, sums)).isTrue();
                    assertThat(sums.chain.logLikelihood).isGreaterThanOrEqualTo(before - 1e-8);
                    before = sums.chain.logLikelihood;
                    at = step.next(at, sums);
                }
                VectorClimb.Summit summit = VectorClimb.from(start, window, step, InitialDistribution.FREE);
                assertThat(summit.converged()).isTrue();
                assertThat(summit.logLikelihood()).isGreaterThan(before - 1e-6);
                assertThat(summit.evaluations()).isLessThan(200);
            }
        }
    }

    @Test
    void seedsOneToTwentyFindTheSameMaximum() {
        double[] dax = OpenData.column("dax/eustock_dax.csv", "log_return");
        double lowest = Double.POSITIVE_INFINITY;
        double highest = Double.NEGATIVE_INFINITY;
        for (int seed = 1; seed <= 20; seed++) {
            Fit fit = Fitter.fit(TWO, FitRequest.of(PAIR, dax, Companions.of(1, dax), seed, Fixtures.DATE));
            lowest = Math.min(lowest, fit.logLikelihood());
            highest = Math.max(highest, fit.logLikelihood());
        }
        assertThat(highest - lowest).isLessThan(1e-4);
    }

    @Test
    void threadsChangeNoBit() {
        StartRunner parallel = new StartRunner() {
            @Override
            public <T> List<T> run(List<Supplier<T>> starts) {
                return starts.parallelStream().map(Supplier::get).toList();
            }
        };
        FitSettings three = new FitSettings(ModelKind.HIDDEN_MARKOV, 3, EmissionFamily.NORMAL, 4);
        Fit first = Fitter.fit(three, Vectors.request(PAIR));
        FitRequest next = Vectors.request(PAIR).after(first);
        Fit alone = Fitter.fit(three, next);
        Fit together = Fitter.fit(three, next, parallel);
        assertThat(alone.starts()).isEqualTo(5);
        assertThat(alone.logLikelihood()).isGreaterThan(first.logLikelihood() - 1e-6);
        assertThat(together.logLikelihood()).isEqualTo(alone.logLikelihood());
        assertThat(together.occupancy()).isEqualTo(alone.occupancy());
        assertThat(together.events()).isEqualTo(alone.events());
    }

    @Test
    void recoversTheTruthOfThreeSeries() {
        RandomStream random = RandomStream.of(43, "three series");
        double[] means = {0.1, 0, -0.1, -0.2, 0.1, 0};
        double[] covariances = {
            1, 0.3, 0, 0.3, 1, -0.2, 0, -0.2, 0.5, //
            4, 3, 1, 3, 6, 2, 1, 2, 3
        };
        MultivariateNormal truth = MultivariateNormal.full(3, means, covariances);
        HiddenMarkov model = HiddenMarkov.of(new double[] {1, 0}, new double[] {0.97, 0.03, 0.06, 0.94}, truth);
        Observations x = Vectors.simulate(model, 4000, random);
        Fit fit = Fitter.fit(TWO, Vectors.request(x));
        MultivariateNormal found =
                (MultivariateNormal) fit.model().orElseThrow().emission();
        assertThat(fit.logLikelihood())
                .isGreaterThan(FilterState.after(model, x).logLikelihood());
        for (int k = 0; k < 2; k++) {
            double n = fit.occupancy()[k] * x.size();
            for (int i = 0; i < 3; i++) {
                double sd = truth.standardDeviation(k, i);
                // five standard errors of complete data: sd / sqrt(n), sd / sqrt(2 n), (1 - r^2) / sqrt(n)
                assertThat(found.mean(k, i)).isCloseTo(truth.mean(k, i), within(5 * sd / Math.sqrt(n)));
                assertThat(found.standardDeviation(k, i)).isCloseTo(sd, within(5 * sd / Math.sqrt(2 * n)));
                for (int j = 0; j < i; j++) {
                    double r = truth.correlation(k, i, j);
                    assertThat(found.correlation(k, i, j)).isCloseTo(r, within(5 * (1 - r * r) / Math.sqrt(n)));
                }
            }
        }
    }

    @Test
    void familiesOfOneSeriesRefuseSeveral() {
        FitSettings student = new FitSettings(ModelKind.HIDDEN_MARKOV, 2, EmissionFamily.STUDENT_T, 1);
        assertThatIllegalArgumentException()
                .isThrownBy(() -> Fitter.fit(student, Vectors.request(PAIR)))
                .withMessageContaining("student-t")
                .withMessageContaining("2 series");
    }

    private static SearchEnd best(WindowSearch search, FitRequest request) {
        return SearchEnd.best(search.starts(request).stream().map(Supplier::get).toList());
    }

    private static Normal univariate(RegimeModel model) {
        Emission e = model.emission();
        return Normal.of(
                new double[] {e.mean(0, 0), e.mean(1, 0)},
                new double[] {e.standardDeviation(0, 0), e.standardDeviation(1, 0)});
    }
}
