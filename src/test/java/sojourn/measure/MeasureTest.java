package sojourn.measure;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Arrays;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

class MeasureTest {
    /** The columns of comparison.csv that this catalogue fills, in their order there. */
    @Test
    void keysBeginWithTheColumnsOfTheComparisonInTheirOrder() {
        assertThat(Arrays.stream(Measure.values()).map(Measure::key))
                .startsWith(
                        "worst_drawdown",
                        "longest_underwater_bars",
                        "expected_shortfall_95",
                        "volatility_per_year",
                        "growth_per_year",
                        "growth_minus_buy_and_hold",
                        "sharpe_low",
                        "sharpe",
                        "sharpe_high",
                        "turnover_per_year",
                        "switches_per_year",
                        "cost_per_year",
                        "average_exposure",
                        "sortino",
                        "calmar");
    }

    @Test
    void labelsAreUnique() {
        assertThat(Arrays.stream(Measure.values()).map(Measure::label)).doesNotHaveDuplicates();
    }

    @ParameterizedTest
    @EnumSource
    void everyMeasureIsDefinedInOneSentence(Measure measure) {
        assertThat(measure.definition()).endsWith(".").doesNotContain(". ").hasSizeGreaterThan(20);
        assertThat(measure.label()).isNotBlank();
        assertThat(measure.unit().word()).isNotBlank();
    }

    @ParameterizedTest
    @EnumSource
    void aKeyThatSaysPerYearHasAUnitThatDoes(Measure measure) {
        if (measure.key().endsWith("_per_year")) {
            assertThat(measure.unit().annualised()).isTrue();
        }
        assertThat(measure.key()).matches("[a-z][a-z0-9_]*");
    }
}
