package sojourn.allocate;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import sojourn.GivenPrices;
import sojourn.market.Known;
import sojourn.regime.WindowMoments;
import sojourn.walk.Reading;
import sojourn.walk.Signal;

/** An order at a close with a refit says whether the refit moved it or the market. Expected sentences: worked by hand. */
class RefitReasonTest {
    private static final double[] CHAIN = {0.9, 0.1, 0.1, 0.9};
    private static final Map<String, Map<String, Double>> ALL_OR_NOTHING =
            Map.of("calm", Map.of("a", 1.0), "stormy", Map.of("a", 0.0));

    /** Stormy 0.2, 0.9, 0.9; on bar 1 there is a refit, without which it would be {@code unmoved}. */
    private record Refitted(double unmoved) implements Signal {
        @Override
        public List<String> regimes() {
            return List.of("calm", "stormy");
        }

        @Override
        public Optional<Reading> at(Known known) {
            if (known.bar() == 0) {
                return Optional.of(stormy(0.2));
            }
            Reading reading = stormy(0.9).following(stormy(known.bar() == 1 ? 0.2 : 0.9));
            return Optional.of(
                    known.bar() == 1 ? reading.refitted(stormy(unmoved).following(stormy(0.2))) : reading);
        }

        private static Reading stormy(double p) {
            WindowMoments still = WindowMoments.of(2, 1, new double[2], new double[2], new double[2]);
            return Reading.of(1, new double[] {1 - p, p}, CHAIN, still);
        }
    }

    @Test
    void aSwitchThatOnlyTheRefitMadeSaysSo() {
        assertThat(played(stepAside(), 0.42).because(1))
                .isEqualTo("stormy 0.90 rose above 0.70; it was 0.20 the bar before; the refit at this close made the"
                        + " difference: without it stormy 0.42 lies below 0.70, stays in");
    }

    @Test
    void aSwitchThatTheMarketMadeSaysSo() {
        assertThat(played(stepAside(), 0.75).because(1))
                .isEqualTo("stormy 0.90 rose above 0.70; it was 0.20 the bar before; the refit at this close made no"
                        + " difference: without it stormy 0.75 is above 0.70");
    }

    @Test
    void withoutAnOrderOrARefitNothingIsSaidOfIt() {
        assertThat(played(stepAside(), 0.42).because(0)).doesNotContain("refit");
        assertThat(played(stepAside(), 0.42).because(2)).doesNotContain("refit");
    }

    @Test
    void aTableSaysIt() {
        assertThat(played(new Table(ALL_OR_NOTHING, ProbabilityKind.FILTERED, 1, 1), 0.4)
                        .because(1))
                .isEqualTo(
                        "stormy 0.90 is the most likely regime; the bar before calm was, with 0.80; the refit at this"
                                + " close made the difference: without it calm 0.60 is the most likely regime");
    }

    @Test
    void aContinuousRuleSaysWhatItWouldHaveBeen() {
        Blend blend = new Blend(ALL_OR_NOTHING, ProbabilityKind.FILTERED, 1, 1);
        assertThat(played(blend, 0.4).because(1))
                .isEqualTo(
                        "weights averaged by calm 0.10, stormy 0.90; the bar before by calm 0.80, stormy 0.20; without"
                                + " the refit at this close it would be a 0.60");
        assertThat(played(blend, 0.2).because(1))
                .endsWith("; the refit at this close made the difference: without it there would be no order");
    }

    /** 0.1 with the refit, 0.0996 without it: the same two decimals. */
    @Test
    void aContinuousRuleIsSilentWhereThePrintedFiguresAreTheSame() {
        Blend blend = new Blend(ALL_OR_NOTHING, ProbabilityKind.FILTERED, 1, 1);
        assertThat(played(blend, 0.9004).because(1)).doesNotContain("refit");
        assertThat(played(blend, 0.89).because(1)).endsWith("; without the refit at this close it would be a 0.11");
    }

    private static Rule stepAside() {
        return new Switch("stormy", 0.7, 0.3, Map.of("a", 1.0), Map.of("a", 0.0), ProbabilityKind.FILTERED, 1, 1);
    }

    private static Played played(Rule rule, double unmoved) {
        Refitted signal = new Refitted(unmoved);
        RulePolicy policy =
                RulePolicy.of(rule, Limits.longOnly(), Schedule.AT_EVERY_CLOSE, 1, 0, signal.regimes(), List.of("a"));
        return Played.of(policy, GivenPrices.flat(3, 1).table(), signal);
    }
}
