package sojourn.evidence;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import sojourn.inference.Moments;

/**
 * Forecasts of the next bar's squared return, out of sample, over the bars that all of them forecast.
 *
 * @param bars how many
 * @param firstBar the first
 * @param lastBar the last
 * @param rows the strategy's own first
 * @param best the gauge of the least mean QLIKE
 * @param bestAgainstNext the best against the second best, which the same losses chose, so that its p-value is too small; empty if it
 *     is alone
 */
public record ForecastContest(
        int bars, int firstBar, int lastBar, List<Row> rows, String best, Optional<Duel> bestAgainstNext) {
    /** Copies the list. */
    public ForecastContest {
        rows = List.copyOf(rows);
    }

    /**
     * One forecaster.
     *
     * @param gauge its word
     * @param qlike mean of ln h + r^2 / h
     * @param squaredError mean of (r^2 - h)^2 over the square of the mean of r^2
     * @param calibration whether it is right on average and one for one
     * @param byQlike the strategy's own against it; empty for itself
     * @param bySquaredError the same by squared error
     */
    public record Row(
            String gauge,
            double qlike,
            double squaredError,
            Calibration calibration,
            Optional<Duel> byQlike,
            Optional<Duel> bySquaredError) {}

    /**
     * The contest.
     *
     * @param forecasts by gauge, the subject's own first
     */
    static Answer<ForecastContest> of(WalkedRegimes subject, Map<String, PerBar> forecasts) {
        int[] common = CommonBars.of(List.copyOf(forecasts.values()));
        if (common.length == 0) {
            return Answer.none("no bar was forecast by all of " + String.join(", ", forecasts.keySet()));
        }
        double[] squares = subject.returns().at(common);
        for (int t = 0; t < squares.length; t++) {
            squares[t] *= squares[t];
        }
        Map<String, double[]> qlike = new LinkedHashMap<>();
        Map<String, double[]> errors = new LinkedHashMap<>();
        forecasts.forEach((gauge, series) -> {
            qlike.put(gauge, Loss.QLIKE.of(squares, series.at(common)));
            errors.put(gauge, Loss.SQUARED_ERROR.of(squares, series.at(common)));
        });
        List<Row> rows = new ArrayList<>();
        forecasts.forEach((gauge, series) -> rows.add(new Row(
                gauge,
                mean(qlike, gauge),
                mean(errors, gauge),
                Calibration.of(series.at(common), squares),
                duel(subject, gauge, qlike, common),
                duel(subject, gauge, errors, common))));
        List<Row> ranked = new ArrayList<>(rows);
        ranked.sort(Comparator.comparingDouble(Row::qlike)); // stable: ties to the one named first
        String best = ranked.get(0).gauge();
        Optional<Duel> next = ranked.size() < 2
                ? Optional.empty()
                : Optional.of(between(subject, best, ranked.get(1).gauge(), qlike, common));
        return Answer.of(new ForecastContest(common.length, common[0], common[common.length - 1], rows, best, next));
    }

    private static Optional<Duel> duel(WalkedRegimes subject, String gauge, Map<String, double[]> losses, int[] bars) {
        return gauge.equals(subject.gauge())
                ? Optional.empty()
                : Optional.of(between(subject, subject.gauge(), gauge, losses, bars));
    }

    private static Duel between(
            WalkedRegimes subject, String first, String second, Map<String, double[]> losses, int[] bars) {
        return Duel.of(first, second, ahead(first, second, losses), bars, Ground.of(subject, first, second));
    }

    /** How much less the first loses on each bar. */
    private static double[] ahead(String first, String second, Map<String, double[]> losses) {
        double[] one = CommonBars.required(losses, first);
        double[] other = CommonBars.required(losses, second);
        double[] ahead = new double[one.length];
        Arrays.setAll(ahead, t -> other[t] - one[t]);
        return ahead;
    }

    private static double mean(Map<String, double[]> losses, String gauge) {
        return Moments.of(CommonBars.required(losses, gauge)).mean();
    }
}
