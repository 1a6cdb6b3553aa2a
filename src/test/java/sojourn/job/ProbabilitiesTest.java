package sojourn.job;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.file.Path;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Probabilities and forecasts of {@code path.csv}, worked out again from the parameters in {@code fits.csv} and the price file
 * alone, by the recursions of Hamilton (1989), Econometrica 57(2) (filter) and Rabiner (1989), Proc. IEEE 77(2) (smoother),
 * written down plainly.
 */
class ProbabilitiesTest {
    /** Parameters are written in full; what differs is the order of sums over at most 600 bars. */
    private static final double AGREES = 1e-9;

    private static final String EXPANDING = "expanding-chain";
    private static final String ROLLING = "rolling-chain";
    private static final String MIXTURE = "mixture";
    private static final String ONE = "one-regime";
    private static final String THREE = "three-weathers-without-means";

    @TempDir
    static Path temp;

    private static JobFolder job = new JobFolder(Path.of(""));

    @BeforeAll
    static void compare() {
        job = new JobFolder(temp)
                .with("stocks.csv", DrawnPrices.csv(21, 600, LocalDate.of(2003, 1, 1)))
                .with("a.yaml", StrategyText.named("Expanding chain"))
                .with(
                        "b.yaml",
                        StrategyText.named("Rolling chain")
                                .with("refit", "{first-fit-after: 150, every: month, window: {rolling: 150}, seed: 5}"))
                .with(
                        "c.yaml",
                        StrategyText.named("Mixture")
                                .with(
                                        "regimes",
                                        "{model: mixture, observe: [{log-return: stocks}], states: [calm, stormy]}"))
                .with("d.yaml", StrategyText.alwaysFull("One regime"))
                .with(
                        "e.yaml",
                        StrategyText.named("Three weathers without means")
                                .with(
                                        "regimes",
                                        "{observe: [{log-return: stocks}], states: [calm, fresh, stormy],"
                                                + " emission: normal-zero-mean}"));
        JobFolder.Ran ran = job.compare("p", "a.yaml", "b.yaml", "c.yaml", "d.yaml", "e.yaml");
        assertThat(ran.code()).as(ran.err()).isZero();
    }

    @ParameterizedTest
    @ValueSource(strings = {EXPANDING, ROLLING, MIXTURE, ONE, THREE})
    void probabilitiesFollowFromTheFitInForceAndThePricesSoFar(String variant) {
        Rebuilt one = new Rebuilt(variant);
        for (int row = 0; row < one.path.size(); row++) {
            double[] filtered = one.filteredAt(row);
            double sum = 0;
            for (int k = 0; k < filtered.length; k++) {
                double written = one.path.number(row, "probability." + one.states.get(k));
                assertThat(written)
                        .as(one.states.get(k) + " on " + one.path.text(row, "date"))
                        .isCloseTo(filtered[k], within(AGREES));
                sum += written;
            }
            assertThat(sum).isCloseTo(1, within(1e-12));
        }
    }

    @ParameterizedTest
    @ValueSource(strings = {EXPANDING, ROLLING, MIXTURE, ONE})
    void forecastsMixTheWindowsRegimeMomentsByTheNextProbabilities(String variant) {
        Rebuilt one = new Rebuilt(variant);
        for (int row = 0; row < one.path.size(); row++) {
            double[] next = one.model(row).next(one.filteredAt(row));
            double[][] moments = one.momentsAt(row);
            double mean = 0;
            for (int k = 0; k < next.length; k++) {
                mean += next[k] * moments[k][0];
            }
            double variance = 0;
            for (int k = 0; k < next.length; k++) {
                variance += next[k] * (moments[k][1] + (moments[k][0] - mean) * (moments[k][0] - mean));
            }
            assertThat(one.path.number(row, "forecast.mean.stocks")).isCloseTo(mean, within(AGREES));
            assertThat(one.path.number(row, "forecast.volatility.stocks"))
                    .isCloseTo(Math.sqrt(variance), within(AGREES));
        }
    }

    @Test
    void withoutMeansTheForecastIsWhatCashIsExpectedToEarn() {
        WrittenTable path = job.table("p/" + THREE + "/path.csv");
        double nominalBar = 0.02 * (365.25 / 252) / 365;
        for (int row = 0; row < path.size(); row++) {
            assertThat(path.number(row, "forecast.mean.stocks")).isCloseTo(nominalBar, within(1e-15));
        }
    }

    @ParameterizedTest
    @ValueSource(strings = {EXPANDING, ROLLING, MIXTURE, ONE, THREE})
    void theFitInForceIsTheLatestAcceptedOneMadeByThatClose(String variant) {
        Rebuilt one = new Rebuilt(variant);
        for (int row = 0; row < one.path.size(); row++) {
            String latest = "";
            for (int fit = 0; fit < one.fits.size(); fit++) {
                String used = one.fits.text(fit, "first_used_on");
                boolean inForce = !used.isEmpty() && used.compareTo(one.path.text(row, "date")) <= 0;
                latest = inForce ? one.fits.text(fit, "fit") : latest;
            }
            assertThat(one.path.text(row, "fit")).isEqualTo(latest);
        }
    }

    @Test
    void theTimelineAndThePathTellTheSameProbabilities() {
        WrittenTable path = job.table("p/" + EXPANDING + "/path.csv");
        WrittenTable timeline = job.table("p/timelines/" + timelineOf(EXPANDING) + ".csv");
        for (String column : List.of("date", "fit", "probability.calm", "probability.stormy", "forecast.mean.stocks")) {
            assertThat(timeline.texts(column)).as(column).isEqualTo(path.texts(column));
        }
    }

    private static String timelineOf(String variant) {
        WrittenTable table = job.table("p/comparison.csv");
        return table.text(table.row("variant", variant), "timeline");
    }

    /** Parameters of one fit. */
    private static final class Model {
        private final double[] initial;
        private final double[][] transition;
        private final double[] mean;
        private final double[] sd;

        private Model(int count) {
            initial = new double[count];
            transition = new double[count][count];
            mean = new double[count];
            sd = new double[count];
        }

        double density(int k, double x) {
            double z = (x - mean[k]) / sd[k];
            return StrictMath.exp(-z * z / 2) / (sd[k] * Math.sqrt(2 * StrictMath.PI));
        }

        double[] next(double[] now) {
            double[] next = new double[now.length];
            for (int i = 0; i < now.length; i++) {
                for (int j = 0; j < now.length; j++) {
                    next[j] += now[i] * transition[i][j];
                }
            }
            return next;
        }

        double[] update(double[] predicted, double x) {
            double[] updated = new double[predicted.length];
            double sum = 0;
            for (int k = 0; k < updated.length; k++) {
                updated[k] = predicted[k] * density(k, x);
                sum += updated[k];
            }
            for (int k = 0; k < updated.length; k++) {
                updated[k] /= sum;
            }
            return updated;
        }
    }

    /** What the files say of one variant. */
    private static final class Rebuilt {
        private final WrittenTable path;
        private final WrittenTable fits;
        private final List<String> states = new ArrayList<>();
        private final List<String> dates;
        private final double[] closes;
        private final Map<Integer, double[][]> moments = new HashMap<>();

        Rebuilt(String variant) {
            path = job.table("p/" + variant + "/path.csv");
            fits = job.table("p/timelines/" + timelineOf(variant) + ".fits.csv");
            for (String column : path.header()) {
                if (column.startsWith("probability.")) {
                    states.add(column.substring("probability.".length()));
                }
            }
            WrittenTable prices = WrittenTable.read(job.path("stocks.csv"));
            dates = prices.texts("date");
            closes = prices.numbers("close");
        }

        private int fitRow(int row) {
            return fits.row("fit", path.text(row, "fit"));
        }

        Model model(int row) {
            int fit = fitRow(row);
            int count = states.size();
            Model model = new Model(count);
            for (int i = 0; i < count; i++) {
                model.initial[i] = fits.number(fit, "initial." + states.get(i));
                model.mean[i] = fits.number(fit, "mean.log_return_stocks." + states.get(i));
                model.sd[i] = fits.number(fit, "sd.log_return_stocks." + states.get(i));
                for (int j = 0; j < count; j++) {
                    model.transition[i][j] = fits.number(fit, "transition." + states.get(i) + "." + states.get(j));
                }
            }
            return model;
        }

        private double observation(int bar) {
            return StrictMath.log(closes[bar] / closes[bar - 1]);
        }

        /** From the start of the fit's window to the row's date. */
        double[] filteredAt(int row) {
            Model model = model(row);
            int bar = dates.indexOf(fits.text(fitRow(row), "window_start"));
            int end = dates.indexOf(path.text(row, "date"));
            double[] now = model.update(model.initial, observation(bar));
            while (bar < end) {
                bar++;
                now = model.update(model.next(now), observation(bar));
            }
            return now;
        }

        /** Mean and variance of simple returns in each regime, weighted by smoothed probabilities over the fit's window. */
        double[][] momentsAt(int row) {
            return moments.computeIfAbsent(fitRow(row), fit -> windowMoments(row));
        }

        private double[][] windowMoments(int row) {
            Model model = model(row);
            int first = dates.indexOf(fits.text(fitRow(row), "window_start"));
            int last = dates.indexOf(fits.text(fitRow(row), "window_end"));
            double[][] smoothed = smoothed(model, first, last);
            double[][] weighted = new double[states.size()][2];
            for (int k = 0; k < states.size(); k++) {
                double weight = 0;
                double sum = 0;
                for (int bar = first; bar <= last; bar++) {
                    weight += smoothed[bar - first][k];
                    sum += smoothed[bar - first][k] * (closes[bar] / closes[bar - 1] - 1);
                }
                weighted[k][0] = sum / weight;
                double squares = 0;
                for (int bar = first; bar <= last; bar++) {
                    double apart = closes[bar] / closes[bar - 1] - 1 - weighted[k][0];
                    squares += smoothed[bar - first][k] * apart * apart;
                }
                weighted[k][1] = squares / weight;
            }
            return weighted;
        }

        /** Filter forward, then Kim's backward pass: p(i|T) = p(i|t) sum_j a_ij p(j|T) / p(j|t before x_{t+1}). */
        private double[][] smoothed(Model model, int first, int last) {
            List<double[]> filtered = new ArrayList<>();
            double[] now = model.update(model.initial, observation(first));
            filtered.add(now);
            for (int bar = first + 1; bar <= last; bar++) {
                now = model.update(model.next(now), observation(bar));
                filtered.add(now);
            }
            double[][] smoothed = filtered.toArray(double[][]::new);
            for (int t = smoothed.length - 2; t >= 0; t--) {
                double[] here = filtered.get(t);
                double[] predicted = model.next(here);
                double[] back = new double[here.length];
                for (int i = 0; i < here.length; i++) {
                    for (int j = 0; j < here.length; j++) {
                        back[i] += here[i] * model.transition[i][j] * smoothed[t + 1][j] / predicted[j];
                    }
                }
                smoothed[t] = back;
            }
            return smoothed;
        }
    }
}
