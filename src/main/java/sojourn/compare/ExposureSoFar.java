package sojourn.compare;

import sojourn.allocate.Because;
import sojourn.allocate.Decision;
import sojourn.allocate.Policy;
import sojourn.allocate.Situation;
import sojourn.allocate.Stance;
import sojourn.allocate.Weights;
import sojourn.trade.Track;

/**
 * Orders at each close the mean of a strategy's weights from its first fill to that close; nothing before. The means are taken in
 * the order of the bars, so that the one at t rests on nothing later.
 */
final class ExposureSoFar implements Policy {
    private static final Because FOLLOWS = Because.of("brought to the strategy's mean weights so far");

    private final int firstBar;
    private final Weights[] means;

    ExposureSoFar(Track strategy) {
        this.firstBar = strategy.firstBar();
        this.means = new Weights[strategy.size()];
        int assets = strategy.assets().size();
        int firstFill = strategy.firstFill().orElse(strategy.lastBar() + 1);
        double[] sum = new double[assets];
        for (int row = 0; row < means.length; row++) {
            int bar = firstBar + row;
            double[] mean = new double[assets];
            for (int asset = 0; bar >= firstFill && asset < assets; asset++) {
                sum[asset] += strategy.weight(bar, asset);
                mean[asset] = sum[asset] / (bar - firstFill + 1);
            }
            means[row] = Weights.of(mean);
        }
    }

    @Override
    public Decision at(Situation situation, Stance stance) {
        Weights mean = means[situation.bar() - firstBar];
        return Decision.order(mean, stance, FOLLOWS, Decision.Change.SAME);
    }
}
