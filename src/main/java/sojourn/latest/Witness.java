package sojourn.latest;

import java.util.Optional;
import sojourn.allocate.Decision;
import sojourn.allocate.Policy;
import sojourn.allocate.Situation;
import sojourn.allocate.Stance;

/** Stands beside a policy during one simulation and keeps what it was asked last. */
final class Witness implements Policy {
    private final Policy policy;
    private Optional<Asked> last = Optional.empty();

    Witness(Policy policy) {
        this.policy = policy;
    }

    @Override
    public Decision at(Situation situation, Stance stance) {
        Decision decision = policy.at(situation, stance);
        last = Optional.of(new Asked(situation, stance, decision));
        return decision;
    }

    /** What it was asked at {@code bar}, if that was the last close it was asked at. */
    Optional<Asked> at(int bar) {
        return last.filter(asked -> asked.situation().bar() == bar);
    }
}
