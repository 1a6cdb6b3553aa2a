package sojourn.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import com.fasterxml.jackson.databind.JsonNode;
import java.time.LocalDate;
import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.CheckValues;

class DrawdownTest {
    @Test
    void anUnrecoveredFallAgreesWithTheWorkedCase() {
        CheckValues worked = CheckValues.byId("drawdown_unrecovered");
        Drawdown drawdown =
                Drawdown.of(PerformanceCase.dates(worked.input("dates")), CheckValues.doubles(worked.input("equity")));
        worked.assertExpected("max_drawdown", drawdown.worst());
        worked.assertExpected("ulcer_index", drawdown.ulcer());
        worked.assertExpected("drawdowns", drawdown.depths());
        assertThat(drawdown.longestUnderwaterBars())
                .isEqualTo(worked.expected("longest_underwater_periods").asInt());
        Drawdown.Episode episode = drawdown.episode().orElseThrow();
        assertThat(episode.peak()).isEqualTo(worked.expected("peak_index").asInt());
        assertThat(episode.trough()).isEqualTo(worked.expected("trough_index").asInt());
        assertThat(episode.peakDate()).isEqualTo(worked.expected("peak_date").asText());
        assertThat(episode.troughDate())
                .isEqualTo(worked.expected("trough_date").asText());
        assertThat(episode.barsDown())
                .isEqualTo(worked.expected("periods_peak_to_trough").asInt());
        assertThat(episode.recovery()).isEmpty(); // the case writes -1
        assertThat(episode.recoveryDate()).isEmpty();
        assertThat(episode.barsUp()).isEmpty();
    }

    @ParameterizedTest
    @ValueSource(strings = {"measures_daily", "measures_monthly"})
    void fallsOfWholePathsAgreeWithTheWorkedCases(String id) {
        PerformanceCase one = PerformanceCase.byId(id);
        JsonNode expected = one.worked().expected("drawdown");
        Drawdown drawdown = Drawdown.of(one.path());
        one.worked().assertClose("max_drawdown", drawdown.worst(), expected.get("max_drawdown"));
        one.worked().assertClose("ulcer_index", drawdown.ulcer(), expected.get("ulcer_index"));
        assertThat(drawdown.longestUnderwaterBars())
                .isEqualTo(expected.get("longest_underwater_periods").asInt());
        Drawdown.Episode episode = drawdown.episode().orElseThrow();
        assertThat(episode.peak()).isEqualTo(expected.get("peak_index").asInt());
        assertThat(episode.trough()).isEqualTo(expected.get("trough_index").asInt());
        assertThat(episode.recovery().orElse(-1))
                .isEqualTo(expected.get("recovery_index").asInt());
        assertThat(episode.recoveryDate().map(LocalDate::toString).orElse(""))
                .isEqualTo(expected.get("recovery_date").asText());
        assertThat(episode.barsUp().orElse(-1))
                .isEqualTo(expected.get("periods_trough_to_recovery").asInt());
    }

    @Test
    void wealthThatNeverFallsHasNoEpisode() {
        CheckValues worked = CheckValues.byId("drawdown_monotone");
        Drawdown drawdown =
                Drawdown.of(PerformanceCase.dates(worked.input("dates")), CheckValues.doubles(worked.input("equity")));
        worked.assertExpected("max_drawdown", drawdown.worst());
        worked.assertExpected("ulcer_index", drawdown.ulcer());
        worked.assertExpected("drawdowns", drawdown.depths());
        assertThat(drawdown.longestUnderwaterBars())
                .isEqualTo(worked.expected("longest_underwater_periods").asInt());
        assertThat(drawdown.episode()).isEmpty();
    }

    @Test
    void ofEqualFallsTheEarlierCountsAndThePeakIsTheFirstOfEquals() {
        Drawdown.Episode episode = of(4, 8, 8, 4, 8, 4, 8).episode().orElseThrow();
        assertThat(episode.peak()).isEqualTo(1);
        assertThat(episode.trough()).isEqualTo(3);
        assertThat(episode.recovery()).hasValue(4);
        assertThat(episode.barsUp()).hasValue(1);
    }

    @Test
    void recoveryIsReachingThePeakAndUnderwaterIsStayingBelowIt() {
        Drawdown drawdown = of(10, 9, 9.5, 9.9, 10, 8, 12);
        assertThat(drawdown.longestUnderwaterBars()).isEqualTo(3);
        assertThat(drawdown.episode().orElseThrow().recovery()).hasValue(6);
    }

    @Test
    void ruinIsAFallOfAll() {
        Drawdown drawdown = of(10, 20, 0, 0);
        assertThat(drawdown.worst()).isEqualTo(-1);
        assertThat(drawdown.episode().orElseThrow().recovery()).isEmpty();
    }

    @Test
    void theScaleOfWealthDoesNotMatter() {
        Drawdown small = of(10, 7, 9, 6, 11);
        Drawdown large = of(160, 112, 144, 96, 176); // a power of two: not even the rounding changes
        assertThat(large.depths()).containsExactly(small.depths());
        assertThat(large.ulcer()).isEqualTo(small.ulcer());
        assertThat(large.episode()).isEqualTo(small.episode());
    }

    @Test
    void onePointIsNoFallAndNoPointIsRefused() {
        assertThat(of(5).worst()).isZero();
        assertThat(of(5).episode()).isEmpty();
        assertThatThrownBy(DrawdownTest::of).hasMessageContaining("at least one point");
        assertThatThrownBy(() -> of(5, -1)).hasMessageContaining("wealth 1 is -1.0");
        assertThatThrownBy(() -> of(5, Double.NaN)).hasMessageContaining("wealth 1 is NaN");
    }

    private static Drawdown of(double... wealth) {
        List<LocalDate> dates = IntStream.range(0, wealth.length)
                .mapToObj(i -> LocalDate.of(2024, 1, 1).plusDays(i))
                .toList();
        return Drawdown.of(dates, wealth);
    }
}
