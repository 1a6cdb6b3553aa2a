package sojourn.allocate;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.GivenPrices;
import sojourn.GivenProbabilities;
import sojourn.regime.WindowMoments;

class FormulaTest {
    private static final List<String> REGIMES = List.of("calm", "stormy");
    private static final List<String> ASSETS = List.of("a", "b");
    private static final Limits WIDE = new Limits(10, -10, 10);
    /** Deviations of 1 % and 2 % a bar in both regimes, means 0.001 and 0.002. */
    private static final WindowMoments MOMENTS =
            WindowMoments.of(2, 2, new double[] {0.5, 0.5}, new double[] {0.001, 0.002, 0.001, 0.002}, new double[] {
                1e-4, 0, 0, 4e-4, 1e-4, 0, 0, 4e-4
            });

    private static final double ROUNDING = 1e-12;

    /** Values by hand; operators and their order as in the language's public specification, every number a double. */
    @ParameterizedTest
    @CsvSource(
            delimiter = ';',
            quoteCharacter = '`',
            value = {
                "1 - probability.stormy ; 0.75",
                "probability.calm * 2 - 1 ; 0.5",
                "1/2 ; 0.5",
                "7 - 2 - 1 ; 4",
                "8 / 4 / 2 ; 1",
                "2 + 3 * 2 ; 8",
                "-(2 + 3) ; -5",
                "- 2 + 3 ; 1",
                "0x10 / 8 ; 2",
                "1.5e1 / 3.0 ; 5",
                "probability.stormy > 0.2 && !most_likely.stormy ? 0.3 : 0.6 ; 0.3",
                "probability.stormy > 0.2 || 1/0 > 0 ? 1 : 2 ; 1",
                "probability.stormy == 0.25 ? 1 : 0 ; 1",
                "true ? 1 : 1/0 ; 1",
                "false ? 1 : true ? 2 : 3 ; 2",
                "min(1, 0.005 / forecast.volatility.a) ; 0.5",
                "max(forecast.volatility.b, 0.01) * 100 ; 2",
                "forecast.mean.b * 1000 ; 2",
                "forecast.mean.cash * 100000 ; 3",
                "abs(-3) + sqrt(16) ; 7",
                "log(exp(1.25)) ; 1.25",
                "bars_in_regime ; 1",
                "weight.a + weight.cash ; 1",
                "periods_per_year / 252 ; 1"
            })
    void expressionsGiveWhatTheySay(String expression, double value) {
        assertThat(weight(expression)).isCloseTo(value, within(ROUNDING));
    }

    @Test
    void barsInRegimeCountsClosesOfTheMostLikelyOne() {
        Played played = played(Map.of("a", "bars_in_regime / 10"), WIDE, 0.1, 0.2, 0.9, 0.8, 0.7, 0.3);
        assertThat(played.weight(0)).containsExactly(0.1, 0.2, 0.1, 0.2, 0.3, 0.1);
    }

    @Test
    void weightsHeldAreThoseAsIfOrdersHadFilled() {
        Played played = played(Map.of("a", "weight.a / 2 + 0.25"), WIDE, 0, 0, 0);
        assertThat(played.weight(0)).containsExactly(0.25, 0.375, 0.4375);
    }

    @Test
    void limitsBindWhatItAsksFor() {
        assertThat(played(Map.of("a", "3"), Limits.longOnly(), 0.5).weight(0)).containsExactly(1);
        assertThat(played(Map.of("a", "-1.0e300"), Limits.longOnly(), 0.5).target(0))
                .containsExactly(0);
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = ';',
            quoteCharacter = '`',
            value = {
                "1 / (probability.stormy - 0.25) ; an infinite number",
                "0 / (probability.stormy - 0.25) ; no number",
                "exp(1000) - exp(1000) ; no number",
                "sqrt(-probability.stormy) ; no number (sqrt of -0.25)",
                "log(0 * probability.stormy) < 1 ? 1 : 0 ; no number (log of 0.0)"
            })
    void whatIsNoFiniteNumberIsNoDecisionAndSaysWhy(String expression, String instead) {
        Map<String, String> weights = new LinkedHashMap<>();
        weights.put("a", "0.5");
        weights.put("b", expression);
        Played played = played(weights, WIDE, 0.25);
        assertThat(played.decisions().get(0).kind()).isEqualTo(Decision.Kind.UNDEFINED);
        assertThat(played.because(0)).isEqualTo("the formula of b gives " + instead);
        assertThat(played.decisions().get(0).next().undecided()).isTrue();
    }

    @Test
    void theLastWeightsStayWhereThereIsNoDecision() {
        Played played = played(Map.of("a", "0.1 / (probability.stormy - 0.25)"), WIDE, 0.75, 0.25, 0.5);
        assertThat(played.weight(0)).containsExactly(0.2, 0.2, 0.4);
        assertThat(played.decisions().get(1).next().wanted()).contains(Weights.of(0.2, 0));
    }

    @Test
    void theReasonNamesWhatWentIn() {
        Map<String, String> weights = new LinkedHashMap<>();
        weights.put("a", "most_likely.stormy ? 0 : 1 - probability.stormy");
        weights.put("b", "10 * forecast.volatility.b");
        assertThat(played(weights, WIDE, 0.25).because(0))
                .isEqualTo("the formula asks for a 0.75, b 0.20 at probability.stormy 0.25, forecast.volatility.b 0.02,"
                        + " not most_likely.stormy; first decision");
    }

    @Test
    void probabilitiesAreOfTheRulesKindAndSmoothedIfItSmooths() {
        Manner manner = new Manner(ProbabilityKind.PREDICTED, Optional.of(new Smoothing(1)), 1, 1);
        Formula rule = new Formula(Map.of("a", "probability.stormy"), manner);
        // predicted is 0.1, then 0.9
        assertThat(played(rule, WIDE, 0, 1).weight(0)[1]).isCloseTo(0.5, within(ROUNDING));
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = ';',
            quoteCharacter = '`',
            value = {
                "1 - probability.strmy ; 4 ; formulas know no name 'probability.strmy' ; did you mean 'probability.stormy'?",
                "bars_in_regime % 2 == 1 ? 1 : 0 ; 15 ; formulas know no operator '%' ; known: + - * / <",
                "1 + foo(2) ; 4 ; formulas know no function 'foo' ; known: min, max, abs, sqrt, exp, log",
                "1 - ; 3 ; the formula ends too early ; finish it",
                "1 2 ; 2 ; the formula cannot go on with '2' ; write an operator",
                "probability.stormy > 1 ; 19 ; the formula gives a truth where a number is wanted ; truth ? number : number",
                "1 + (probability.calm && true ? 1 : 0) ; 22 ; '&&' does not go with a number and a truth ; truths for &&",
                "1 + most_likely.calm ; 2 ; '+' does not go with a number and a truth ; numbers for arithmetic",
                "min(1) ; 3 ; 'min' does not go with a number ; numbers",
                "'a' ; 0 ; the formula gives a text where a number is wanted ; number",
                "size('abc') ; 0 ; formulas know no function 'size' ; known",
                "in ; 0 ; the formula cannot go on with 'in' ; leave it out",
                "min(1, 2 $ 3) ; 9 ; the formula cannot go on with '$' ; leave it out"
            })
    void faultsSayWhereWhatAndWhatToDo(String expression, int at, String what, String remedy) {
        List<Misfit> misfits = new Formula(Map.of("a", expression), Manner.plain()).misfits(REGIMES, ASSETS);
        assertThat(misfits).isNotEmpty();
        Misfit first = misfits.get(0);
        assertThat(first.what()).isEqualTo(what);
        assertThat(first.remedy()).contains(remedy);
        assertThat(first.within()).isEqualTo(at);
        assertThat(first.pointer()).isEqualTo("/formula/weights/a");
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "has(a.b)",
                "[1, 2].all(x, x > 0) ? 1 : 0",
                "dyn(1)",
                "1u",
                "b'x'",
                "null",
                "1 % 2",
                "{'a': 1}['a']",
                "1 in [1] ? 1 : 0"
            })
    void theRestOfTheLanguageIsRefused(String expression) {
        assertThat(new Formula(Map.of("a", expression), Manner.plain()).misfits(REGIMES, ASSETS))
                .isNotEmpty();
    }

    @Test
    void lengthAndDepthAreBounded() {
        for (String expression :
                List.of("(".repeat(200) + "1" + ")".repeat(200), "1" + " + 1".repeat(700), "-".repeat(3_000) + "1")) {
            List<Misfit> misfits = new Formula(Map.of("a", expression), Manner.plain()).misfits(REGIMES, ASSETS);
            assertThat(misfits).hasSize(1);
            assertThat(misfits.get(0).what())
                    .startsWith("the formula cannot be read: ")
                    .hasSizeLessThan(200);
        }
    }

    @Test
    void assetsOfExpressionsAreNamedToo() {
        Formula rule = new Formula(
                Map.of("a", "forecast.volatility.b + weight . c - forecast.mean.cash * probability.d"), Manner.plain());
        assertThat(rule.namedAssets()).containsExactly("a", "b", "c");
        assertThat(new Formula(Map.of("z", "1"), Manner.plain()).misfits(REGIMES, ASSETS))
                .extracting(Misfit::pointer)
                .containsExactly("/formula/weights/z");
    }

    private static double weight(String expression) {
        return played(Map.of("a", expression), WIDE, 0.25).target(0)[0];
    }

    private static Played played(Map<String, String> weights, Limits limits, double... stormy) {
        return played(new Formula(weights, Manner.plain()), limits, stormy);
    }

    private static Played played(Formula rule, Limits limits, double... stormy) {
        assertThat(rule.misfits(REGIMES, ASSETS)).isEmpty();
        RulePolicy policy = RulePolicy.of(rule, limits, Schedule.AT_EVERY_CLOSE, 1, 0, REGIMES, ASSETS);
        GivenProbabilities signal = GivenProbabilities.stormy(stormy).meaning(MOMENTS);
        double[] cash = new double[stormy.length];
        Arrays.fill(cash, 3e-5);
        return Played.of(
                policy, GivenPrices.flat(stormy.length, 2).withCash(cash).table(), signal);
    }
}
