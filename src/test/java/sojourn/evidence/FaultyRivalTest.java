package sojourn.evidence;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import sojourn.compare.LocalWorkers;
import sojourn.compare.Progress;
import sojourn.market.Known;
import sojourn.regime.EmissionFamily;
import sojourn.regime.ModelKind;
import sojourn.walk.LogReturn;
import sojourn.walk.Observation;
import sojourn.walk.RegimeSettings;

/** A fault of the program in one rival's walk costs that rival, not the answers about the others. */
class FaultyRivalTest {
    /** Fails at one bar, as a bug would. */
    private record Faulty() implements Observation {
        @Override
        public OptionalDouble at(Known known) {
            if (known.bar() == 400) {
                throw new IllegalStateException("bar 400 is too much");
            }
            return new LogReturn("a").at(known);
        }

        @Override
        public String asset() {
            return "a";
        }

        @Override
        public String word() {
            return "faulty";
        }

        @Override
        public String column() {
            return "faulty_a";
        }
    }

    private static RegimeSettings rival(ModelKind kind, Observation observation, List<String> states) {
        return new RegimeSettings(
                kind, List.of(observation), states, EmissionFamily.NORMAL, Optional.empty(), Optional.empty());
    }

    @Test
    void theOthersAreComparedAndTheFaultIsTold() {
        WalkedRegimes subject = Subjects.walked(Subjects.twoWeathers(5, 600), 300, 100);
        RegimeFindings found;
        try (LocalWorkers workers = new LocalWorkers(1)) {
            found = RegimeEvidence.of(
                    subject,
                    List.of(
                            rival(ModelKind.MIXTURE, new Faulty(), List.of("calm", "stormy")),
                            rival(ModelKind.ONE_REGIME, new LogReturn("a"), List.of("any"))),
                    workers,
                    Progress.silent());
        }
        assertThat(found.absent()).containsOnlyKeys("mixture");
        assertThat(found.absent().get("mixture"))
                .contains("a fault of the program, not of your input")
                .contains("bar 400 is too much");
        assertThat(found.faults()).hasSize(1);
        assertThat(Subjects.found(found.ofObservation()).rows())
                .extracting(ScoreContest.Row::gauge)
                .containsExactly("hidden-markov", "one-regime");
    }
}
