package sojourn.evidence;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import sojourn.CheckValues;
import sojourn.GivenPrices;
import sojourn.regime.Emission;
import sojourn.regime.EmissionFamily;
import sojourn.regime.ModelKind;
import sojourn.regime.MultivariateNormal;
import sojourn.regime.Normal;
import sojourn.regime.Observations;
import sojourn.regime.StudentT;
import sojourn.walk.FixedParameters;
import sojourn.walk.LogReturn;
import sojourn.walk.RegimeSettings;

class PseudoResidualsTest {
    private static final double INTEGRAL = 1e-9;

    /**
     * The worked case as a walk: its parameters declared, its observations as log returns. The first observation is the window of the first
     * fit, so the forecasts begin with the second.
     */
    @Test
    void agreeWithTheWorkedCase() {
        CheckValues worked = CheckValues.byId("pseudo_residuals_k2");
        double[] x = CheckValues.doubles(worked.input("x"));
        double[] closes = new double[x.length + 1];
        closes[0] = 100;
        for (int t = 0; t < x.length; t++) {
            closes[t + 1] = closes[t] * Math.exp(x[t]);
        }
        WalkedRegimes subject =
                Subjects.walked(GivenPrices.closes(closes), declared(worked), Subjects.expanding(1, 1_000_000));
        PseudoResiduals residuals = Subjects.found(PseudoResiduals.of(subject));
        assertThat(residuals.count()).isEqualTo(x.length - 1);
        assertThat(residuals.clipped()).isZero();
        JsonNode u = worked.expected("u");
        JsonNode z = worked.expected("z");
        for (int t = 1; t < x.length; t++) {
            worked.assertClose("u", residuals.uniform().at(t + 1).orElseThrow(), u.get(t));
            worked.assertClose("z", residuals.normal().at(t + 1).orElseThrow(), z.get(t));
        }
    }

    private static RegimeSettings declared(CheckValues worked) {
        assertThat(worked.input("delta").asText()).isEqualTo("stationary");
        double[][] rows = CheckValues.matrix(worked.input("A"));
        List<Double> means = list(CheckValues.doubles(worked.input("mean")));
        List<Double> deviations = Arrays.stream(CheckValues.doubles(worked.input("variance")))
                .map(Math::sqrt)
                .boxed()
                .toList();
        // the chain of the case stays with 0.95 and 0.90, so its long run is 2/3 and 1/3
        return new RegimeSettings(
                ModelKind.HIDDEN_MARKOV,
                List.of(new LogReturn("a")),
                List.of("calm", "stormy"),
                EmissionFamily.NORMAL,
                Optional.empty(),
                Optional.of(new FixedParameters(
                        List.of(2 / 3.0, 1 / 3.0),
                        List.of(list(rows[0]), list(rows[1])),
                        means,
                        deviations,
                        List.of())));
    }

    private static List<Double> list(double[] values) {
        return Arrays.stream(values).boxed().toList();
    }

    /** Every emission of one number has a distribution function, and it is the integral of its density. */
    @Test
    void distributionFunctionsAreIntegralsOfTheirDensities() {
        List<Emission> emissions = List.of(
                Normal.of(new double[] {0.1, -0.4}, new double[] {0.7, 2.2}),
                StudentT.of(new double[] {0.1, -0.4}, new double[] {0.7, 2.2}, new double[] {2.3, 9}));
        for (Emission emission : emissions) {
            DistributionFunction function = DistributionFunction.of(emission);
            for (int k = 0; k < 2; k++) {
                for (double x : new double[] {-3, -0.4, 0.05, 1, 6}) {
                    double between = function.below(k, x + 0.5) - function.below(k, x);
                    assertThat(between).isCloseTo(simpson(emission, k, x, x + 0.5), within(INTEGRAL));
                }
                assertThat(function.below(k, emission.mean(k, 0))).isCloseTo(0.5, within(1e-15));
                assertThat(function.below(k, -1e200)).isZero();
                assertThat(function.below(k, 1e200)).isEqualTo(1);
            }
        }
    }

    /** The first of two normals by itself, by integrating their joint density over both. */
    @Test
    void theFirstOfSeveralNumbersHasItsOwnDistribution() {
        Emission both = MultivariateNormal.full(2, new double[] {0.1, -0.4}, new double[] {0.5, 0.4, 0.4, 1.2});
        double width = 0.02;
        double sum = 0;
        for (double x = 0.3 + width / 2; x < 0.9; x += width) {
            for (double y = -9; y < 9; y += width) {
                Observations here = Observations.of(2, new double[] {x, y}, new boolean[1]);
                sum += width * width * Math.exp(both.logDensity(here, 0, 0));
            }
        }
        DistributionFunction function = DistributionFunction.of(both);
        // the midpoint rule in x errs by about width^2 / 24 of the integral's curvature
        assertThat(function.below(0, 0.9) - function.below(0, 0.3)).isCloseTo(sum, within(1e-5));
    }

    /** A new kind of emission must be given a distribution function and a mean size. */
    @Test
    void everyKindOfEmissionIsKnownHere() {
        assertThat(Emission.class.getPermittedSubclasses())
                .containsExactlyInAnyOrder(Normal.class, StudentT.class, MultivariateNormal.class);
    }

    private static double simpson(Emission emission, int k, double from, double to) {
        int steps = 2000;
        double width = (to - from) / steps;
        double sum = 0;
        for (int i = 0; i <= steps; i++) {
            int weight = i == 0 || i == steps ? 1 : i % 2 == 1 ? 4 : 2;
            Observations here = Observations.univariate(new double[] {from + i * width});
            sum += weight * Math.exp(emission.logDensity(here, 0, k));
        }
        return sum * width / 3;
    }

    /** Prices drawn from a chain that the model can describe: nothing is left in the residuals. */
    @Test
    void nothingIsLeftWhereTheModelIsRight() {
        PseudoResiduals residuals =
                Subjects.found(PseudoResiduals.of(Subjects.walked(Subjects.twoWeathers(4, 4000), 1500, 500)));
        assertThat(residuals.jarqueBera().pValue().number().orElseThrow()).isGreaterThan(0.01);
        assertThat(residuals.ljungBox().pValue().number().orElseThrow()).isGreaterThan(0.01);
        assertThat(residuals.ljungBoxOfSquares().pValue().number().orElseThrow())
                .isGreaterThan(0.01);
        assertThat(residuals.kolmogorovSmirnov().pValue().number().orElseThrow())
                .isGreaterThan(0.01);
    }

    /** One normal for prices whose volatility changes: its size is forecast by its past, and its tails are too thin. */
    @Test
    void whatAModelMissesIsLeft() {
        RegimeSettings one = new RegimeSettings(
                ModelKind.ONE_REGIME,
                List.of(new LogReturn("a")),
                List.of("any"),
                EmissionFamily.NORMAL,
                Optional.empty(),
                Optional.empty());
        PseudoResiduals residuals = Subjects.found(
                PseudoResiduals.of(Subjects.walked(Subjects.twoWeathers(4, 4000), one, Subjects.expanding(1500, 500))));
        assertThat(residuals.jarqueBera().pValue().number().orElseThrow()).isLessThan(1e-6);
        assertThat(residuals.ljungBoxOfSquares().pValue().number().orElseThrow())
                .isLessThan(1e-6);
        int most = residuals.surprising().get(0);
        assertThat(residuals.surprising())
                .hasSize(residuals.count())
                .allMatch(bar -> residuals.onceIn(bar).orElseThrow()
                        <= residuals.onceIn(most).orElseThrow());
    }
}
