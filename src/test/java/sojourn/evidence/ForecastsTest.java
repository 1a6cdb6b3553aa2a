package sojourn.evidence;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import sojourn.CheckValues;
import sojourn.GivenPrices;
import sojourn.regime.WindowMoments;
import sojourn.walk.Reading;

class ForecastsTest {
    private static final double ROUNDING = 1e-12;

    @Test
    void theExponentialVolatilityAgreesWithTheWorkedCase() {
        CheckValues worked = CheckValues.byId("ewma_vol");
        double[] tail = CheckValues.doubles(worked.input("returns"));
        double start = Math.sqrt(worked.input("init_variance").asDouble());
        assertThat(worked.input("lam").asDouble()).isEqualTo(PlainVolatility.DECAY);
        // 21 returns of the size of the case's first variance, so that the average it begins with is that variance
        double[] returns = new double[1 + 21 + tail.length + 1];
        for (int bar = 1; bar <= 21; bar++) {
            returns[bar] = bar % 2 == 0 ? start : -start;
        }
        System.arraycopy(tail, 0, returns, 22, tail.length);
        PerBar forecasts = PlainVolatility.exponential(series(returns));
        assertThat(forecasts.at(21)).isEmpty();
        double[] volatility = new double[tail.length];
        for (int t = 0; t < tail.length; t++) {
            volatility[t] =
                    Math.sqrt(forecasts.at(23 + t).orElseThrow()); // known at bar 22 + t, so it stands at the next
        }
        worked.assertExpected("vol", volatility);
    }

    /** Returns a, -a, a, ... (21 of them): mean a/21, squared deviations 21 a^2 - a^2/21, divisor 20. */
    @Test
    void theRollingForecastAgreesWithAnExampleOnPaper() {
        double a = 0.01;
        double[] returns = new double[24];
        for (int bar = 1; bar < returns.length; bar++) {
            returns[bar] = bar % 2 == 1 ? a : -a;
        }
        PerBar forecasts = PlainVolatility.rolling(series(returns));
        double expected = (21 * a * a - a * a / 21) / 20 + a * a / 441;
        assertThat(forecasts.at(21)).isEmpty();
        assertThat(forecasts.at(22)).hasValueCloseTo(expected, within(1e-17));
        assertThat(forecasts.at(23)).hasValueCloseTo(expected, within(1e-17));
    }

    @Test
    void whatARegimeGaugeForecastsIsTheMixtureOfItsWindowMoments() {
        WalkedRegimes subject = Subjects.walked(Subjects.twoWeathers(2, 700), 500, 100);
        ReturnForecasts forecasts = ReturnForecasts.of(subject);
        int first = subject.timeline().firstBar().orElseThrow();
        assertThat(forecasts.secondMoment().at(first)).isEmpty();
        assertThat(forecasts.logScore().present()).hasSize(700 - first - 1);
        for (int bar = first + 1; bar < 700; bar++) {
            Reading before = subject.timeline().reading(bar - 1).orElseThrow();
            WindowMoments moments = before.moments();
            double[] q = before.predicted(1);
            double square = 0;
            double density = 0;
            double r = subject.returns().at(bar).orElseThrow();
            for (int k = 0; k < 2; k++) {
                double m = moments.mean(k, 0);
                double v = moments.covariance(k, 0, 0);
                square += q[k] * (v + m * m);
                density += q[k] * Math.exp(-(r - m) * (r - m) / (2 * v)) / Math.sqrt(2 * Math.PI * v);
            }
            assertThat(forecasts.secondMoment().at(bar)).hasValueCloseTo(square, within(ROUNDING * square));
            assertThat(forecasts.logScore().at(bar)).hasValueCloseTo(Math.log(density), within(ROUNDING));
        }
    }

    @Test
    void theTruthLosesLeastOnAverage() {
        // r^2 is 1 or 9 with equal odds, so its mean is 5: both losses are least there (Patton 2011, propositions 1 and
        // 2)
        double[] squares = {1, 9};
        for (Loss loss : Loss.values()) {
            double least = mean(loss.of(squares, new double[] {5, 5}));
            for (double h : new double[] {2, 4.9, 5.1, 8}) {
                assertThat(mean(loss.of(squares, new double[] {h, h}))).isGreaterThan(least);
            }
        }
        // ln 5 + (1 + 9) / (2 * 5); ((1 - 5)^2 + (9 - 5)^2) / 2 / 5^2
        assertThat(mean(Loss.QLIKE.of(squares, new double[] {5, 5}))).isCloseTo(Math.log(5) + 1, within(ROUNDING));
        assertThat(mean(Loss.SQUARED_ERROR.of(squares, new double[] {5, 5}))).isCloseTo(16 / 25.0, within(ROUNDING));
    }

    @Test
    void forecastsHalfAsHighAsWhatCameHaveTheRatioTwo() {
        double[] forecasts = {1, 2, 3, 1.5, 2.5, 0.5};
        double[] squares = {2, 4, 6, 3, 5, 1};
        Calibration calibration = Calibration.of(forecasts, squares);
        assertThat(calibration.ratio().number()).hasValueCloseTo(2.0, within(ROUNDING));
        assertThat(calibration.slope().number()).hasValueCloseTo(2.0, within(ROUNDING));
        assertThat(calibration.intercept().number()).hasValueCloseTo(0.0, within(ROUNDING));
        assertThat(calibration.explained().number()).hasValueCloseTo(1.0, within(ROUNDING));
    }

    @Test
    void aContestIsHeldOnTheBarsThatAllForecast() {
        WalkedRegimes subject = Subjects.walked(Subjects.twoWeathers(2, 700), 500, 100);
        Map<String, PerBar> forecasts = new LinkedHashMap<>();
        forecasts.put("hidden-markov", ReturnForecasts.of(subject).secondMoment());
        forecasts.put("late", PerBar.of(700, bar -> bar < 600 ? OptionalDouble.empty() : OptionalDouble.of(1e-4)));
        ForecastContest contest = Subjects.found(ForecastContest.of(subject, forecasts));
        assertThat(contest.bars()).isEqualTo(100);
        assertThat(contest.firstBar()).isEqualTo(600);
        assertThat(contest.lastBar()).isEqualTo(699);
        Duel duel = contest.rows().get(1).byQlike().orElseThrow();
        double ahead = contest.rows().get(1).qlike() - contest.rows().get(0).qlike();
        assertThat(duel.robust().mean().number()).hasValueCloseTo(ahead, within(ROUNDING));
        assertThat(contest.best()).isEqualTo(ahead > 0 ? "hidden-markov" : "late");
        forecasts.put("never", PerBar.of(700, bar -> OptionalDouble.empty()));
        assertThat(ForecastContest.of(subject, forecasts).because()).contains("late, never");
    }

    /** A rival that speaks late would leave few bars to compare the others on; it is named, with its forecasts in the file all the same. */
    @Test
    void whoForecastLessThanHalfIsNotCompared() {
        GivenPrices prices = Subjects.twoWeathers(2, 700);
        WalkedRegimes own = Subjects.walked(prices, 300, 200);
        WalkedRegimes late = Subjects.walked(prices, Rivals.of(own.regimes()).get(0), Subjects.expanding(600, 200));
        Contenders contenders = Contenders.of(own, Subjects.attempts(List.of(new Rival(late))));
        assertThat(contenders.absent().get(late.gauge())).contains("99 bars of the 399");
        assertThat(contenders.secondMoments()).containsKey(late.gauge());
        ForecastContest contest = Subjects.found(contenders.ofSquaredReturn());
        assertThat(contest.bars()).isEqualTo(399);
        assertThat(contest.rows())
                .extracting(ForecastContest.Row::gauge)
                .containsExactly("hidden-markov", RegimeEvidence.EXPONENTIAL, RegimeEvidence.ROLLING);
    }

    @Test
    void everyTestSaysWhatItStandsOn() {
        GivenPrices prices = Subjects.twoWeathers(2, 700);
        WalkedRegimes expanding = Subjects.walked(prices, 500, 100);
        assertThat(Ground.of(expanding, "hidden-markov", "mixture")).isEqualTo(Ground.EXPANDING_NESTED);
        assertThat(Ground.of(expanding, "one-regime", "mixture")).isEqualTo(Ground.EXPANDING_NESTED);
        assertThat(Ground.of(expanding, "hidden-markov", RegimeEvidence.EXPONENTIAL))
                .isEqualTo(Ground.EXPANDING);
        assertThat(Ground.EXPANDING_NESTED.words()).contains("rough guide");
    }

    private static PerBar series(double[] returns) {
        return PerBar.of(returns.length, bar -> bar == 0 ? OptionalDouble.empty() : OptionalDouble.of(returns[bar]));
    }

    private static double mean(double[] values) {
        return java.util.Arrays.stream(values).average().orElseThrow();
    }
}
