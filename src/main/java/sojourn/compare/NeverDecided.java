package sojourn.compare;

import java.util.Optional;
import sojourn.allocate.Decision;
import sojourn.allocate.Situation;
import sojourn.allocate.Stance;
import sojourn.allocate.Weights;
import sojourn.market.Known;
import sojourn.market.PriceTable;
import sojourn.walk.RegimeTimeline;

/** Why a policy that was asked at every close decided at none. */
final class NeverDecided {
    private NeverDecided() {}

    /** What it said where a decision was first due; empty if none ever was. */
    static Optional<String> reason(Prepared.Ready ready, RegimeTimeline timeline) {
        PriceTable table = ready.market().table();
        Weights nothing = Weights.none(table.assets().size());
        int ahead = ready.file().strategy().trade().terms().fill().barsToFirstReturn();
        Stance stance = Stance.first();
        for (int bar = 0; bar < table.size(); bar++) {
            Known known = table.knownAt(bar);
            Situation situation = new Situation(known, timeline.at(known), timeline.regimes(), nothing, ahead);
            Decision decision = ready.policy().at(situation, stance);
            if (decision.kind() == Decision.Kind.UNDEFINED) {
                return Optional.of("the rule had no weights at any decision; at the first, on " + known.date() + ": "
                        + decision.because().sentence());
            }
            stance = decision.next();
        }
        return Optional.empty();
    }
}
