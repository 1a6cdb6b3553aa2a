package sojourn.evidence;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import sojourn.regime.ModelKind;
import sojourn.walk.RegimeSettings;

/** The gauges that a strategy's own is held against: every kind but its own, seeing the same and fitted at the same closes. */
final class Rivals {
    private static final List<String> TWO = List.of("lower", "higher");

    private Rivals() {}

    /** The section of each rival. */
    static List<RegimeSettings> of(RegimeSettings own) {
        List<RegimeSettings> rivals = new ArrayList<>();
        for (ModelKind kind : ModelKind.values()) {
            if (kind != own.model()) {
                rivals.add(new RegimeSettings(
                        kind, own.observe(), states(kind, own), own.emission(), own.orderBy(), Optional.empty()));
            }
        }
        return List.copyOf(rivals);
    }

    /** As many regimes as the strategy's own, two if it has but one. */
    private static List<String> states(ModelKind kind, RegimeSettings own) {
        if (kind == ModelKind.ONE_REGIME) {
            return List.of("any");
        }
        return own.states().size() > 1 ? own.states() : TWO;
    }
}
