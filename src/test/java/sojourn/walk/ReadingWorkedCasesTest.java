package sojourn.walk;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.CheckValues;
import sojourn.regime.WindowMoments;

/** Forecasts some bars ahead against worked cases computed by an independent implementation (plain numpy). */
class ReadingWorkedCasesTest {
    @ParameterizedTest
    @ValueSource(strings = {"horizon_k2", "horizon_k3"})
    void forecastsOfOneAssetAgree(String id) {
        CheckValues check = CheckValues.byId(id);
        double[] filtered = CheckValues.doubles(check.input("filtered"));
        int states = filtered.length;
        WindowMoments moments = WindowMoments.of(
                states,
                1,
                new double[states],
                CheckValues.doubles(check.input("mean")),
                CheckValues.doubles(check.input("variance")));
        Reading reading = Reading.of(1, filtered, transition(check), moments);
        int bars = check.input("H").asInt();
        double sum = 0;
        for (int h = 1; h <= bars; h++) {
            double[] predicted = reading.predicted(h);
            for (int k = 0; k < states; k++) {
                check.assertClose(
                        "state_probs",
                        predicted[k],
                        check.expected("state_probs").get(h - 1).get(k));
            }
            Forecast forecast = reading.forecast(h);
            check.assertClose("mean", forecast.mean(0), check.expected("mean").get(h - 1));
            check.assertClose(
                    "variance",
                    forecast.covariance(0, 0),
                    check.expected("variance").get(h - 1));
            sum += forecast.mean(0);
        }
        check.assertExpected("sum_mean", sum);
    }

    @Test
    void forecastOfTwoAssetsAgrees() {
        CheckValues check = CheckValues.byId("predictive_cov");
        double[] means = new double[4];
        double[] covariances = new double[8];
        for (int k = 0; k < 2; k++) {
            for (int a = 0; a < 2; a++) {
                means[2 * k + a] = check.input("mean").get(k).get(a).asDouble();
                for (int b = 0; b < 2; b++) {
                    covariances[4 * k + 2 * a + b] =
                            check.input("covariance").get(k).get(a).get(b).asDouble();
                }
            }
        }
        WindowMoments moments = WindowMoments.of(2, 2, new double[2], means, covariances);
        Reading reading = Reading.of(1, CheckValues.doubles(check.input("filtered")), transition(check), moments);
        check.assertExpected("state_probs", reading.predicted(1));
        Forecast forecast = reading.forecast(1);
        check.assertExpected("mean", new double[] {forecast.mean(0), forecast.mean(1)});
        check.assertExpected("covariance", new double[][] {
            {forecast.covariance(0, 0), forecast.covariance(0, 1)},
            {forecast.covariance(1, 0), forecast.covariance(1, 1)}
        });
    }

    private static double[] transition(CheckValues check) {
        double[][] rows = CheckValues.matrix(check.input("A"));
        double[] flat = new double[rows.length * rows.length];
        for (int i = 0; i < rows.length; i++) {
            System.arraycopy(rows[i], 0, flat, i * rows.length, rows.length);
        }
        return flat;
    }
}
