package sojourn.bench;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import sojourn.allocate.Limits;
import sojourn.allocate.ProbabilityKind;
import sojourn.allocate.RulePolicy;
import sojourn.allocate.Schedule;
import sojourn.allocate.Switch;
import sojourn.market.PriceTable;
import sojourn.regime.EmissionFamily;
import sojourn.regime.ModelKind;
import sojourn.regime.StartRunner;
import sojourn.trade.Costs;
import sojourn.trade.NextClose;
import sojourn.trade.Simulation;
import sojourn.trade.Terms;
import sojourn.trade.Track;
import sojourn.walk.LogReturn;
import sojourn.walk.RefitSchedule;
import sojourn.walk.RefitSettings;
import sojourn.walk.RegimeSettings;
import sojourn.walk.RegimeTimeline;
import sojourn.walk.Walk;

/** The whole of the job on one thread: a walk with first fit after 750, a fit every 21 and 5 starts, and one rule on its timeline. */
final class Job {
    private static final List<String> REGIMES = List.of("calm", "stormy");
    private static final Terms TERMS = new Terms(new NextClose(0), new Costs(5, 5), 1_000_000);

    private final PriceTable table;

    Job(double[] logReturns) {
        this.table = Series.prices(logReturns).table();
    }

    /** Number of bars. */
    int bars() {
        return table.size();
    }

    /** Two regimes, walked forward. */
    RegimeTimeline walk() {
        RegimeSettings regimes = new RegimeSettings(
                ModelKind.HIDDEN_MARKOV,
                List.of(new LogReturn("a")),
                REGIMES,
                EmissionFamily.NORMAL,
                Optional.empty(),
                Optional.empty());
        RefitSettings refit = new RefitSettings(
                750,
                new RefitSchedule.EveryObservations(21),
                OptionalInt.empty(),
                5,
                20260101,
                RefitSettings.OnFailure.KEEP_PREVIOUS);
        return Walk.forward(table, regimes, refit, StartRunner.sequential(), bar -> {});
    }

    /** A rule that steps aside in storms, simulated from its first decision on with costs and its ledger. */
    Track trade(RegimeTimeline timeline, double leaveAbove) {
        Switch rule = new Switch(
                "stormy", leaveAbove, 0.3, Map.of("a", 1.0), Map.of("a", 0.0), ProbabilityKind.FILTERED, 1, 1);
        RulePolicy policy =
                RulePolicy.of(rule, Limits.longOnly(), Schedule.AT_EVERY_CLOSE, 1, 0.02, REGIMES, List.of("a"));
        Track track = Simulation.run(
                        table, timeline, policy, TERMS, timeline.firstBar().orElseThrow())
                .orElseThrow();
        if (track.ledger().isEmpty()) {
            throw new IllegalStateException("the rule never traded");
        }
        return track;
    }
}
