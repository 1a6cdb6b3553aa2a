package sojourn.world;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;

class CorrelationsTest {
    private static final List<String> ASSETS = List.of("stocks", "bonds", "gold");

    @Test
    void theFactorTimesItsTransposeIsTheMatrixWhicheverWayAPairIsNamed() {
        Correlations correlations =
                new Correlations(Map.of("bonds", Map.of("stocks", -0.4, "gold", 0.25), "stocks", Map.of("gold", -0.1)));
        double[] matrix = {1, -0.4, -0.1, -0.4, 1, 0.25, -0.1, 0.25, 1};
        double[] l = correlations.factor(ASSETS);
        for (int i = 0; i < 3; i++) {
            for (int j = 0; j < 3; j++) {
                double product = 0;
                for (int k = 0; k < 3; k++) {
                    product += l[i * 3 + k] * l[j * 3 + k];
                }
                assertThat(product).isCloseTo(matrix[i * 3 + j], within(1e-15));
            }
        }
        assertThat(new double[] {l[1], l[2], l[5]}).containsOnly(0);
    }

    @Test
    void correlationsThatCannotHoldTogetherAreRefusedWithTheAssetsNamed() {
        // Determinant 1 + 2abc - a² - b² - c² = 1 - 2·0.729 - 3·0.81 < 0.
        Correlations contradictory =
                new Correlations(Map.of("stocks", Map.of("bonds", 0.9, "gold", 0.9), "bonds", Map.of("gold", -0.9)));
        assertThat(contradictory.fault(ASSETS)).get().satisfies(refusal -> {
            assertThat(refusal.key()).isEqualTo("correlations");
            assertThat(refusal.what()).contains("stocks, bonds, gold contradict each other", "not positive definite");
            assertThat(refusal.remedy()).contains("gold closer to 0");
        });
        assertThatThrownBy(() -> contradictory.factor(ASSETS)).hasMessageContaining("not positive definite");
    }

    @Test
    void aPerfectCorrelationIsRefusedForTheFirstTwoAlready() {
        Correlations perfect =
                new Correlations(Map.of("stocks", Map.of("bonds", 1.0, "gold", 0.0), "bonds", Map.of("gold", 0.0)));
        assertThat(perfect.fault(ASSETS))
                .get()
                .satisfies(refusal -> assertThat(refusal.what()).contains("stocks, bonds contradict"));
    }

    @Test
    void everyPairIsStatedOnceByKnownNames() {
        assertThat(what(Map.of("stocks", Map.of("bonds", 0.1, "gold", 0.1)))).contains("bonds and gold is missing");
        assertThat(what(Map.of("stocks", Map.of("stock", 0.1)))).contains("'stock' is not an asset");
        assertThat(what(Map.of("silver", Map.of("bonds", 0.1)))).contains("'silver' is not an asset");
        assertThat(what(Map.of("gold", Map.of("gold", 1.0)))).contains("gold with itself");
        assertThat(what(Map.of("gold", Map.of("bonds", 0.1), "bonds", Map.of("gold", 0.1))))
                .contains("stated twice");
    }

    @Test
    void oneAssetNeedsNone() {
        assertThat(Correlations.none().fault(List.of("stocks"))).isEmpty();
        assertThat(Correlations.none().factor(List.of("stocks"))).containsExactly(1);
    }

    private static String what(Map<String, Map<String, Double>> stated) {
        return new Correlations(stated).fault(ASSETS).orElseThrow().what();
    }
}
