package sojourn.evidence;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import sojourn.GivenPrices;
import sojourn.market.Known;
import sojourn.regime.EmissionFamily;
import sojourn.regime.ModelKind;
import sojourn.walk.LogReturn;
import sojourn.walk.Observation;
import sojourn.walk.RegimeSettings;

/** A gauge that watches two series, one of them with gaps: everything is asked of it that is asked of one. */
class SeveralObservationsTest {
    private static WalkedRegimes subject;
    private static RegimeFindings found;

    @BeforeAll
    static void walk() {
        GivenPrices first = Subjects.twoWeathers(31, 800);
        GivenPrices second = Subjects.twoWeathers(32, 800);
        double[][] closes = new double[2][800];
        for (int bar = 0; bar < 800; bar++) {
            closes[0][bar] = first.close(0, bar);
            closes[1][bar] = second.close(0, bar);
        }
        RegimeSettings both = new RegimeSettings(
                ModelKind.HIDDEN_MARKOV,
                List.of(new Gappy(), new LogReturn("b")),
                List.of("calm", "stormy"),
                EmissionFamily.NORMAL,
                Optional.empty(),
                Optional.empty());
        subject = Subjects.walked(GivenPrices.closes(closes), both, Subjects.expanding(500, 60));
        found = Subjects.findings(subject);
    }

    /** The log return of asset a, which nobody observes on every seventh bar. */
    private record Gappy() implements Observation {
        @Override
        public OptionalDouble at(Known known) {
            return known.bar() % 7 == 3 ? OptionalDouble.empty() : new LogReturn("a").at(known);
        }

        @Override
        public String asset() {
            return "a";
        }

        @Override
        public String word() {
            return "gappy";
        }

        @Override
        public String column() {
            return "gappy_a";
        }
    }

    @Test
    void aFrozenFilterSaysWhatTheTimelineSaid() {
        assertThat(subject.stretches()).hasSize(5);
        for (Stretch stretch : subject.stretches()) {
            FrozenFilter filter = FrozenFilter.of(subject, stretch, stretch.end());
            for (int bar = stretch.from(); bar < stretch.end(); bar++) {
                assertThat(filter.probability(bar, 1))
                        .isEqualTo(subject.timeline().probability(bar, 1));
            }
        }
    }

    @Test
    void residualsAreThoseOfTheFirstSeriesWhereItWasSeen() {
        PseudoResiduals residuals = Subjects.found(found.residuals());
        int first = subject.timeline().firstBar().orElseThrow();
        for (int bar = first + 1; bar < 800; bar++) {
            assertThat(residuals.uniform().at(bar).isPresent()).isEqualTo(bar % 7 != 3);
        }
        assertThat(subject.firstOfSeveral()).hasValue("gappy of a");
        assertThat(Subjects.found(found.influence()).bars()).hasSize(800 - first); // the other series is always there
    }

    @Test
    void everyOtherQuestionIsAnsweredToo() {
        assertThat(Subjects.found(found.cards())).hasSize(2);
        assertThat(Subjects.found(found.lineage()).compared()).hasSize(4);
        assertThat(Subjects.found(found.reproduction()).observations()).isBetween(500, 800);
        assertThat(Subjects.found(found.ofObservation()).rows())
                .extracting(ScoreContest.Row::gauge)
                .containsExactly("hidden-markov", "mixture", "one-regime");
        assertThat(Subjects.found(found.ofReturn()).rows()).hasSizeGreaterThanOrEqualTo(4);
    }
}
