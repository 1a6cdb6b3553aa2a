package sojourn.allocate;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import sojourn.GivenPrices;
import sojourn.GivenProbabilities;
import sojourn.market.Known;
import sojourn.walk.Reading;
import sojourn.walk.Signal;

/** Readings that end again: a fit was refused and the strategy stands aside, in cash, until one is accepted. */
class StandAsideTest {
    private static final int BARS = 12;
    private static final int FROM = 4;
    private static final int TO = 8;
    private static final Switch RULE =
            new Switch("stormy", 0.7, 0.3, Map.of("a", 1.0), Map.of("a", 0.2), ProbabilityKind.FILTERED, 1, 1);

    @Test
    void everythingGoesIntoCashAndComesBackWithTheNextReading() {
        Played played = played(Schedule.AT_EVERY_CLOSE, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1);
        assertThat(played.weight(0)).containsExactly(1, 1, 1, 1, 0, 0, 0, 0, 1, 1, 1, 1);
        assertThat(played.target(0)).containsExactly(1, 1, 1, 1, 0, 0, 0, 0, 1, 1, 1, 1);
        assertThat(played.because(FROM)).contains("the last fit was refused").contains("stands aside");
        assertThat(played.decisions().get(FROM + 1).kind()).isEqualTo(Decision.Kind.KEEP);
        assertThat(played.switches()).isEmpty();
    }

    @Test
    void itIsDecidedOnDecisionBarsLikeEverythingElse() {
        Played played = played(Schedule.FIRST_OF_WEEK, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1);
        // weekdays from Monday 2001-01-01: the first decision is on bar 5, in the gap, so nothing is held before bar 10
        assertThat(played.weight(0)).containsExactly(0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 1, 1);
        Played later = played(Schedule.FIRST_OF_WEEK, 20, 7, 13);
        assertThat(later.weight(0)[5]).isEqualTo(1);
        assertThat(later.weight(0)[9]).isEqualTo(1);
        assertThat(later.weight(0)[10]).isZero();
        assertThat(later.weight(0)[14]).isZero();
        assertThat(later.weight(0)[15]).isEqualTo(1);
    }

    @Test
    void hysteresisGoesOnWhereItWas() {
        Played played = played(Schedule.AT_EVERY_CLOSE, 0.1, 0.8, 0.5, 0.5, 0.5, 0.5, 0.5, 0.5, 0.5, 0.5, 0.2, 0.5);
        assertThat(played.weight(0)).containsExactly(1, 0.2, 0.2, 0.2, 0, 0, 0, 0, 0.2, 0.2, 1, 1);
    }

    @Test
    void beforeTheFirstReadingThereIsNothingToLeave() {
        Played played = played(Schedule.AT_EVERY_CLOSE, 10, 0, 6);
        assertThat(played.decisions().subList(0, 6))
                .allSatisfy(decision -> assertThat(decision.kind()).isEqualTo(Decision.Kind.NONE));
        assertThat(played.target(0)[6]).isEqualTo(1);
    }

    private static Played played(Schedule schedule, double... stormy) {
        assertThat(stormy).hasSize(BARS);
        return played(schedule, GivenProbabilities.stormy(stormy), BARS, FROM, TO);
    }

    private static Played played(Schedule schedule, int bars, int from, int to) {
        return played(schedule, GivenProbabilities.stormy(new double[bars]), bars, from, to);
    }

    private static Played played(Schedule schedule, Signal signal, int bars, int from, int to) {
        Signal interrupted = new Signal() {
            @Override
            public List<String> regimes() {
                return signal.regimes();
            }

            @Override
            public Optional<Reading> at(Known known) {
                return known.bar() >= from && known.bar() < to ? Optional.empty() : signal.at(known);
            }
        };
        RulePolicy policy = RulePolicy.of(RULE, Limits.longOnly(), schedule, 1, 0.05, signal.regimes(), List.of("a"));
        return Played.of(policy, GivenPrices.flat(bars, 1).table(), interrupted);
    }
}
