package sojourn.walk;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.GivenPrices;
import sojourn.regime.EmissionFamily;
import sojourn.regime.ModelKind;

/**
 * A walk that chooses the number of regimes against walks of each number alone: the choice is made again here from what those say,
 * and what stands in force must be theirs to the bit.
 */
class ChoosingStatesTest {
    private static final int BARS = 500;
    private static final int FIRST_FIT = 150;
    private static final List<String> UNION = List.of("all", "calm", "uneasy", "stormy");

    /** One weather at first, two later: by bic one regime, then more. */
    @ParameterizedTest
    @ValueSource(longs = {21, 22, 23})
    void byBicEachFitTakesTheNumberOfLeastCriterionOnItsWindow(long seed) {
        GivenPrices prices = Walks.changing(seed, BARS);
        RefitSettings refit = Walks.expanding(FIRST_FIT, Walks.every(25));
        RegimeTimeline chosen = Walks.forward(prices, Walks.choosing(StateChoice.By.BIC, new LogReturn("a")), refit);
        List<RegimeTimeline> alone = alone(prices, refit);
        List<Integer> path = new ArrayList<>();
        for (int f = 0; f < chosen.fits().size(); f++) {
            int best = -1;
            double least = Double.POSITIVE_INFINITY;
            for (int c = 0; c < 3; c++) {
                FitRecord one = alone.get(c).fits().get(f);
                if (one.fit().outcome().accepted() && bic(one, c + 1) < least) {
                    least = bic(one, c + 1);
                    best = c;
                }
            }
            path.add(best);
            FitRecord record = chosen.fits().get(f);
            assertThat(record.regimes()).isEqualTo(Walks.COUNTS.get(best));
            assertThat(record.candidates().get(best).bic().orElseThrow()).isCloseTo(least, within(1e-9));
            assertThat(record.candidates())
                    .allSatisfy(one -> assertThat(one.compared()).isEmpty());
        }
        assertThat(path).startsWith(0).contains(1);
        assertInForce(chosen, alone, path);
    }

    /** -2 l + p ln n: p = K (K - 1) transitions, K - 1 initial probabilities, 2 K means and deviations. */
    private static double bic(FitRecord record, int states) {
        int parameters = states * (states - 1) + states - 1 + 2 * states;
        return -2 * record.fit().logLikelihood()
                + parameters * Math.log(record.fit().observations());
    }

    @ParameterizedTest
    @ValueSource(longs = {21, 22, 23, 24})
    void byPredictionEachFitTakesTheNumberWhoseOwnForecastsScoredBestSoFar(long seed) {
        GivenPrices prices = Walks.changing(seed, BARS);
        RefitSettings refit = Walks.expanding(FIRST_FIT, Walks.every(25));
        RegimeTimeline chosen =
                Walks.forward(prices, Walks.choosing(StateChoice.By.PREDICTIVE, new LogReturn("a")), refit);
        List<RegimeTimeline> alone = alone(prices, refit);
        List<Integer> path = new ArrayList<>();
        int byScore = 0;
        for (int f = 0; f < chosen.fits().size(); f++) {
            FitRecord record = chosen.fits().get(f);
            List<Integer> accepted = new ArrayList<>();
            int from = 0;
            for (int c = 0; c < 3; c++) {
                if (alone.get(c).fits().get(f).fit().outcome().accepted()) {
                    accepted.add(c);
                    from = Math.max(from, alone.get(c).firstBar().orElseThrow());
                }
            }
            int best = -1;
            double most = 0;
            for (int c : accepted) {
                double total = 0;
                for (int bar = from + 1; bar <= record.bar(); bar++) {
                    total += alone.get(c).logScore(bar).orElseThrow();
                }
                assertThat(record.candidates().get(c).compared().orElseThrow()).isCloseTo(total, within(1e-9));
                boolean better = best < 0
                        || total > most
                        || (total == most
                                && bic(alone.get(c).fits().get(f), c + 1)
                                        < bic(alone.get(best).fits().get(f), best + 1));
                best = better ? c : best;
                most = better ? total : most;
            }
            byScore += from < record.bar() ? 1 : 0;
            path.add(best);
            assertThat(record.regimes()).as("fit " + f).isEqualTo(Walks.COUNTS.get(best));
        }
        assertThat(byScore).isGreaterThan(5);
        assertInForce(chosen, alone, path);
    }

    /** Probabilities, scores, forecasts and transitions of every bar are those of the number in force; absent regimes have none. */
    private static void assertInForce(RegimeTimeline chosen, List<RegimeTimeline> alone, List<Integer> path) {
        int before = path.get(0);
        for (int bar = chosen.firstBar().orElseThrow(); bar < chosen.endBar(); bar++) {
            int now = path.get(chosen.fitInForce(bar).orElseThrow() - 1);
            RegimeTimeline own = alone.get(now);
            if (bar > chosen.firstBar().getAsInt()) {
                assertThat(chosen.logScore(bar)).isEqualTo(alone.get(before).logScore(bar));
            }
            Reading reading = chosen.reading(bar).orElseThrow();
            double[] next = reading.predicted(1);
            double sum = 0;
            for (int k = 0; k < UNION.size(); k++) {
                int state = Walks.COUNTS.get(now).indexOf(UNION.get(k));
                assertThat(chosen.probability(bar, k)).isEqualTo(state < 0 ? 0 : own.probability(bar, state));
                assertThat(next[k])
                        .isEqualTo(
                                state < 0 ? 0 : own.reading(bar).orElseThrow().predicted(1)[state]);
                sum += chosen.probability(bar, k);
            }
            assertThat(sum).isCloseTo(1, within(1e-12));
            Forecast expected = own.reading(bar).orElseThrow().forecast(1);
            assertThat(reading.forecast(1).mean(0)).isCloseTo(expected.mean(0), within(1e-15));
            assertThat(reading.forecast(1).volatility(0)).isCloseTo(expected.volatility(0), within(1e-15));
            before = now;
        }
    }

    @Test
    void aChangeOfTheNumberIsAnEvent() {
        RegimeTimeline chosen = Walks.forward(
                Walks.changing(21, BARS),
                Walks.choosing(StateChoice.By.BIC, new LogReturn("a")),
                Walks.expanding(FIRST_FIT, Walks.every(25)));
        int changes = 0;
        for (int f = 1; f < chosen.fits().size(); f++) {
            int before = chosen.fits().get(f - 1).regimes().size();
            int now = chosen.fits().get(f).regimes().size();
            changes += before == now ? 0 : 1;
            assertThat(chosen.fits().get(f).events().contains("states " + before + "->" + now))
                    .isEqualTo(before != now);
        }
        assertThat(changes).isPositive();
        assertThat(chosen.fits().get(0).events()).noneMatch(event -> event.startsWith("states"));
    }

    /** Closes that stand still for a while: no number can be fitted, then those that can are chosen among. */
    @ParameterizedTest
    @EnumSource(StateChoice.By.class)
    void aRefusedNumberIsNotChosenAndWhereAllAreRefusedTheReasonsAreTold(StateChoice.By by) {
        GivenPrices weathers = Walks.weathers(13, BARS, 1);
        double[] closes = new double[BARS];
        for (int bar = 0; bar < BARS; bar++) {
            closes[bar] = weathers.close(0, bar >= 230 && bar < 300 ? 230 : bar);
        }
        RegimeTimeline chosen = Walks.forward(
                GivenPrices.closes(closes),
                Walks.choosing(by, new LogReturn("a")),
                Walks.rolling(50, 100, Walks.every(10), RefitSettings.OnFailure.KEEP_PREVIOUS));
        int refused = 0;
        for (FitRecord record : chosen.fits()) {
            boolean any = record.candidates().stream()
                    .anyMatch(one -> one.fit().outcome().accepted());
            assertThat(record.fit().outcome().accepted()).isEqualTo(any);
            if (!any) {
                refused++;
                assertThat(record.explanation())
                        .startsWith(
                                "no number of regimes was accepted; 1: all observations of the window are equal; 2: ");
            }
        }
        assertThat(refused).isPositive();
        for (int bar = chosen.firstBar().orElseThrow(); bar < chosen.endBar(); bar++) {
            assertThat(chosen.fitInForce(bar)).isPresent();
        }
    }

    @Test
    void mixturesChooseAsWell() {
        RegimeSettings mixtures = new RegimeSettings(
                ModelKind.MIXTURE,
                List.of(new LogReturn("a")),
                UNION,
                EmissionFamily.NORMAL,
                Optional.empty(),
                Optional.empty(),
                Optional.empty(),
                Particulars.choosing(new StateChoice(Walks.COUNTS, StateChoice.By.BIC)));
        RegimeTimeline chosen =
                Walks.forward(Walks.changing(25, BARS), mixtures, Walks.expanding(FIRST_FIT, Walks.every(50)));
        assertThat(chosen.firstBar()).isPresent();
        assertThat(chosen.fits()).allSatisfy(record -> {
            OptionalDouble two = record.candidates().get(1).bic();
            if (two.isPresent()) { // K - 1 weights and 2 K means and deviations
                double expected = -2 * record.candidates().get(1).fit().logLikelihood()
                        + 5 * Math.log(record.fit().observations());
                assertThat(two.getAsDouble()).isCloseTo(expected, within(1e-9));
            }
        });
    }

    private static List<RegimeTimeline> alone(GivenPrices prices, RefitSettings refit) {
        return Walks.COUNTS.stream()
                .map(names ->
                        Walks.forward(prices, Walks.observing(new LogReturn("a"), names.toArray(new String[0])), refit))
                .toList();
    }
}
