package sojourn.trade;

import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import sojourn.GivenProbabilities;
import sojourn.allocate.Because;
import sojourn.allocate.Blend;
import sojourn.allocate.Decision;
import sojourn.allocate.Limits;
import sojourn.allocate.Policy;
import sojourn.allocate.ProbabilityKind;
import sojourn.allocate.Rule;
import sojourn.allocate.RulePolicy;
import sojourn.allocate.Schedule;
import sojourn.allocate.Switch;
import sojourn.allocate.Weights;
import sojourn.numeric.RandomStream;

/** Policies for tests. */
final class Policies {
    static final Because WHY = Because.of("a test says so");
    static final List<String> REGIMES = List.of("calm", "stormy");

    private Policies() {}

    /** Orders the same weights at every close, whatever is held. */
    static Policy always(double... weights) {
        Weights target = Weights.of(weights);
        return (situation, stance) -> Decision.order(target, stance, WHY, Decision.Change.SAME);
    }

    /** Orders weights at some bars only. */
    static Policy at(Map<Integer, Weights> orders) {
        return (situation, stance) -> {
            Weights target = orders.get(situation.bar());
            return target == null
                    ? Decision.none(stance, WHY)
                    : Decision.order(target, stance, WHY, Decision.Change.SAME);
        };
    }

    /** Orders random weights, long and short, at about every third close; the weights of a bar depend on the seed alone. */
    static Policy random(long seed, int bars, int assets, double size) {
        RandomStream random = RandomStream.of(seed, "orders");
        Map<Integer, Weights> orders = new TreeMap<>();
        for (int bar = 2; bar < bars; bar++) {
            double[] weights = new double[assets];
            for (int i = 0; i < assets; i++) {
                weights[i] = random.nextInt(4) == 0 ? 0 : size * (2 * random.nextDouble() - 1);
            }
            if (bar == 2 || random.nextInt(3) == 0) {
                orders.put(bar, Weights.of(weights));
            }
        }
        return at(orders);
    }

    /** All in the first asset while calm, all in the last (or in cash, if there is but one) while stormy. */
    static Policy stepAside(List<String> assets) {
        Map<String, Double> out = assets.size() == 1 ? Map.of("a", 0.0) : Map.of(assets.get(assets.size() - 1), 1.0);
        return policy(
                new Switch("stormy", 0.7, 0.3, Map.of("a", 1.0), out, ProbabilityKind.FILTERED, 1, 1),
                Schedule.AT_EVERY_CLOSE,
                0.02,
                assets);
    }

    /** Half in the first asset when calm, half of everything in the last when stormy, averaged, weekly, half way each time. */
    static Policy mixed(List<String> assets) {
        Map<String, Map<String, Double>> weights =
                Map.of("calm", Map.of("a", 0.9), "stormy", Map.of(assets.get(assets.size() - 1), 0.5));
        return policy(new Blend(weights, ProbabilityKind.PREDICTED, 1, 0.5), Schedule.FIRST_OF_WEEK, 0, assets);
    }

    /** The signal that goes with {@link #stepAside} and {@link #mixed}. */
    static GivenProbabilities signal(long seed, int bars) {
        return GivenProbabilities.random(seed, bars).startingAt(3);
    }

    private static Policy policy(Rule rule, Schedule schedule, double band, List<String> assets) {
        return RulePolicy.of(rule, Limits.longOnly(), schedule, 1, band, REGIMES, assets);
    }
}
