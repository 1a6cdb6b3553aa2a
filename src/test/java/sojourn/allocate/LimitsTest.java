package sojourn.allocate;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import sojourn.CheckValues;
import sojourn.numeric.RandomStream;

class LimitsTest {
    @Test
    void weightsAreClippedThenScaled() {
        CheckValues check = CheckValues.byId("caps");
        Limits limits = new Limits(
                check.input("max_gross").asDouble(),
                check.input("min_weight").asDouble(),
                check.input("max_weight").asDouble());
        Weights bound = limits.bind(Weights.of(CheckValues.doubles(check.input("weights"))));
        check.assertExpected("weights", new double[] {bound.at(0), bound.at(1), bound.at(2)});
    }

    @Test
    void boundWeightsKeepTheLimitsAndBindingThemAgainChangesNothing() {
        RandomStream random = RandomStream.of(11, "limits");
        for (int trial = 0; trial < 2_000; trial++) {
            Limits limits = new Limits(0.1 + 2 * random.nextDouble(), -random.nextDouble(), random.nextDouble());
            Weights bound = limits.bind(Weights.of(random.nextNormal(), random.nextNormal(), random.nextNormal()));
            assertThat(bound.gross()).as("trial %d", trial).isLessThanOrEqualTo(limits.gross() + 1e-12);
            for (int i = 0; i < 3; i++) {
                assertThat(bound.at(i)).as("trial %d", trial).isBetween(limits.low(), limits.high());
            }
            assertThat(limits.bind(bound)).as("trial %d", trial).isEqualTo(bound);
        }
    }

    @Test
    void weightsWithinTheLimitsComeBackAsTheyAre() {
        Weights full = Weights.of(0.7, 0.2, 0.1); // adds up to a little less than 1 in binary
        assertThat(Limits.longOnly().bind(full)).isSameAs(full);
    }

    @Test
    void statedWeightsBeyondTheLimitsAreMisfits() {
        Switch leveraged =
                new Switch("stormy", 0.7, 0.3, Map.of("a", 1.5), Map.of("a", -0.5), ProbabilityKind.FILTERED, 1, 1);
        List<Misfit> misfits = Limits.longOnly().misfits(leveraged);
        assertThat(misfits).extracting(Misfit::pointer).containsExactly("/switch/in/a", "/switch/in", "/switch/out/a");
        assertThat(misfits.get(0).what()).contains("1.5").contains("[0, 1]");
        assertThat(misfits.get(1).what()).contains("1.5").contains("gross 1");
        assertThat(misfits.get(2).remedy()).contains("shorts");
        assertThat(new Limits(1.5, -0.5, 1.5).misfits(leveraged)).isEmpty();
    }

    @Test
    void aPolicyBeyondItsLimitsIsRefused() {
        Switch leveraged = new Switch("stormy", 0.7, 0.3, Map.of("a", 1.5), Map.of(), ProbabilityKind.FILTERED, 1, 1);
        assertThatThrownBy(() -> RulePolicy.of(
                        leveraged,
                        Limits.longOnly(),
                        Schedule.AT_EVERY_CLOSE,
                        1,
                        0,
                        List.of("calm", "stormy"),
                        List.of("a")))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("1.5");
    }

    @Test
    void aRangeWithoutZeroIsRefused() {
        assertThatThrownBy(() -> new Limits(1, 0.1, 1)).hasMessageContaining("0.1");
        assertThatThrownBy(() -> new Limits(1, -1, -0.1)).hasMessageContaining("-0.1");
        assertThatThrownBy(() -> new Limits(Double.NaN, 0, 1)).hasMessageContaining("NaN");
    }
}
