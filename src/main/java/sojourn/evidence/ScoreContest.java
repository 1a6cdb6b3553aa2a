package sojourn.evidence;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Mean log scores out of sample: ln of the density that each gauge gave, the close before, to what came. Over the bars that all of them scored.
 *
 * @param bars how many
 * @param firstBar the first
 * @param lastBar the last
 * @param rows the strategy's own first
 */
public record ScoreContest(int bars, int firstBar, int lastBar, List<Row> rows) {
    /** Copies the list. */
    public ScoreContest {
        rows = List.copyOf(rows);
    }

    /**
     * One gauge.
     *
     * @param gauge its word
     * @param mean mean log score a bar, in nats
     * @param duel the strategy's own against it; empty for itself
     */
    public record Row(String gauge, double mean, Optional<Duel> duel) {}

    /**
     * The contest.
     *
     * @param scores by gauge, the subject's own first
     */
    static Answer<ScoreContest> of(WalkedRegimes subject, Map<String, PerBar> scores) {
        String own = subject.gauge();
        int[] common = CommonBars.of(List.copyOf(scores.values()));
        if (common.length == 0) {
            return Answer.none("no bar was scored by all of " + String.join(", ", scores.keySet()));
        }
        double[] ownScores = CommonBars.required(scores, own).at(common);
        List<Row> rows = new ArrayList<>();
        scores.forEach((gauge, series) -> {
            double[] others = series.at(common);
            Optional<Duel> duel = Optional.empty();
            if (!gauge.equals(own)) {
                double[] ahead = new double[common.length];
                for (int t = 0; t < ahead.length; t++) {
                    ahead[t] = ownScores[t] - others[t];
                }
                duel = Optional.of(Duel.of(own, gauge, ahead, common, Ground.of(subject, own, gauge)));
            }
            rows.add(new Row(gauge, sojourn.inference.Moments.of(others).mean(), duel));
        });
        return Answer.of(new ScoreContest(common.length, common[0], common[common.length - 1], rows));
    }
}
