package sojourn.regime;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** Finds what is worth telling about the states of a fit. Nothing here changes their order. */
final class StateEvents {
    private static final double NEAR_TIE = 1.1;
    private static final double COLLAPSED = 0.01;
    /** Squared Hellinger distance of two zero-mean normals whose standard deviations differ by a tenth. */
    private static final double DUPLICATED = 0.00227;

    private static final double ABSORBING = 1e-6;
    /** Degrees of freedom as near to the lower bound as this are held by it. */
    private static final double AT_BOUND = 1e-6;

    private StateEvents() {}

    /** All events of a model in role order, previous fit compared where it has as many states. */
    static List<String> of(Described described, Optional<RegimeModel> previous) {
        List<String> events = new ArrayList<>(described.events());
        RegimeModel model = described.model().orElseThrow();
        int states = model.states();
        previous.filter(p -> p.states() == states)
                .ifPresent(p -> swaps(Matching.of(p.emission(), model.emission()), events));
        volatilities(described, events);
        if (model.emission() instanceof StudentT student) {
            for (int k = 0; k < states; k++) {
                if (student.degreesOfFreedom(k) <= EmissionFamily.LEAST_DEGREES_OF_FREEDOM + AT_BOUND) {
                    events.add("tails-at-bound {" + k + "}");
                }
            }
        }
        for (int k = 0; states > 1 && k < states; k++) {
            collapsed(described.orderBy(), k, events);
            for (int j = k + 1; j < states; j++) {
                if (Matching.squaredHellinger(model.emission(), k, model.emission(), j) < DUPLICATED) {
                    events.add(pair("duplicated", k, j));
                }
            }
            if (model instanceof HiddenMarkov && model.transition(k, k) >= 1 - ABSORBING) {
                events.add("absorbing {" + k + "}");
            }
        }
        return events;
    }

    /** All events of a gauge without a likelihood, in role order; its states may be matched to those of the previous fit. */
    static List<String> ofGauge(Described described, Optional<Matching> matching) {
        List<String> events = new ArrayList<>(described.events());
        matching.ifPresent(m -> swaps(m, events));
        volatilities(described, events);
        for (int k = 0; described.states() > 1 && k < described.states(); k++) {
            collapsed(described.orderBy(), k, events);
        }
        return events;
    }

    private static void volatilities(Described described, List<String> events) {
        for (int k = 0; k + 1 < described.states(); k++) {
            double now = described.orderBy().deviation(k);
            double next = described.orderBy().deviation(k + 1);
            if (next < now) {
                events.add(pair("not-ascending", k, k + 1));
            }
            if (StrictMath.max(now, next) <= NEAR_TIE * StrictMath.min(now, next)) {
                events.add(pair("near-tie", k, k + 1));
            }
        }
    }

    private static void collapsed(StateWeights weights, int k, List<String> events) {
        double occupancy = weights.occupancy()[k];
        if (occupancy < COLLAPSED) {
            events.add(String.format(Locale.ROOT, "collapsed {%d} occupancy %.4f", k, occupancy));
        }
    }

    private static void swaps(Matching matching, List<String> events) {
        int[] newForOld = matching.newForOld();
        for (int old = 0; old < newForOld.length; old++) {
            if (newForOld[old] != old) {
                events.add("swap {" + old + "}->{" + newForOld[old] + "}");
            }
        }
    }

    private static String pair(String word, int a, int b) {
        return word + " {" + a + "}/{" + b + "}";
    }
}
