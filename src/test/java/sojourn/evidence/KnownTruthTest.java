package sojourn.evidence;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import sojourn.inference.Estimate;

/** Prices whose truth is stated: what is found must be it. */
class KnownTruthTest {
    private static RegimeFindings two;

    @BeforeAll
    static void walk() {
        two = Subjects.findings(Subjects.walked(Subjects.twoWeathers(17, 4000), 1500, 500));
    }

    @Test
    void whereThereAreTwoRegimesTheChainIsAheadOfOneRegimeAndOfAMixture() {
        for (ScoreContest contest : List.of(Subjects.found(two.ofObservation()), Subjects.found(two.ofReturn()))) {
            Map<String, ScoreContest.Row> rows = byGauge(contest);
            assertThat(rows.keySet()).contains("hidden-markov", "mixture", "one-regime");
            for (String rival : List.of("mixture", "one-regime")) {
                Duel duel = row(rows, rival).duel().orElseThrow();
                assertThat(duel.robust().mean().number().orElseThrow()).isGreaterThan(0.02);
                assertThat(p(duel)).isLessThan(0.001);
            }
        }
        ForecastContest forecasts = Subjects.found(two.forecasts());
        assertThat(forecasts.best()).isEqualTo("hidden-markov");
        Calibration own = forecasts.rows().get(0).calibration();
        assertThat(own.ratio().number()).hasValueCloseTo(1.0, within(0.15));
        assertThat(own.right().pValue().number().orElseThrow()).isGreaterThan(0.01);
    }

    @Test
    void whereThereIsOneRegimeTheChainIsNotAhead() {
        RegimeFindings one = Subjects.findings(Subjects.walked(Subjects.oneWeather(17, 4000), 1500, 500));
        if (one.subject().timeline().firstBar().isEmpty()) {
            assertThat(one.ofObservation().because()).isEqualTo("no fit was accepted");
            return;
        }
        Duel duel = row(byGauge(Subjects.found(one.ofObservation())), "one-regime")
                .duel()
                .orElseThrow();
        double ahead = duel.robust().mean().number().orElseThrow();
        assertThat(ahead < 0 || p(duel) > 0.05)
                .as("ahead by %s, p %s", ahead, p(duel))
                .isTrue();
    }

    /** Calm 0.6 % and stormy 2.4 % a bar, left with probability 1/60 each, half the bars each. */
    @Test
    void theCardsTellTheTruth() {
        List<IdentityCard> cards = Subjects.found(two.cards());
        double root = Math.sqrt(252);
        double[] truth = {0.006 * root, 0.024 * root};
        for (int k = 0; k < 2; k++) {
            IdentityCard card = cards.get(k);
            Annual annual = Annual.of(two.subject(), card.lastFit().returns());
            double volatility = annual.volatility().number().orElseThrow();
            double error = annual.volatilityError().number().orElseThrow();
            assertThat(volatility).isCloseTo(truth[k], within(3 * error));
            // of n = 1950 normal draws: 1 / sqrt(2 n) of the volatility, within a third
            assertThat(error).isCloseTo(truth[k] / Math.sqrt(2 * 1950), within(truth[k] / Math.sqrt(2 * 1950) / 3));
            // about 33 stays of each were seen: 60 within a third
            assertThat(card.lastFit().stay().orElseThrow()).isBetween(40.0, 80.0);
            assertThat(card.asLived().largest()).hasSize(3);
        }
        assertThat(cards.get(0).lastFit().share().orElseThrow()
                        + cards.get(1).lastFit().share().orElseThrow())
                .isCloseTo(1, within(1e-9));
        assertThat(cards.get(0).asLived().mostLikely() + cards.get(1).asLived().mostLikely())
                .isCloseTo(1, within(1e-12));
        assertThat(Math.abs(cards.get(1).asLived().largest().get(0).earned())).isGreaterThan(0.05);
    }

    @Test
    void theModelReproducesWhatItDrew() {
        Reproduction reproduction = Subjects.found(two.reproduction());
        long defined = reproduction.figures().stream()
                .filter(figure -> figure.reproduced().isPresent())
                .count();
        long reproduced = reproduction.figures().stream()
                .filter(figure -> figure.reproduced().orElse(false))
                .count();
        assertThat(defined).isEqualTo(42);
        assertThat(reproduced).isGreaterThanOrEqualTo(36); // 95 % of 42 is 40, and they go together
    }

    @Test
    void theFitsWereToldInFull() {
        FitsTold fits = two.fits();
        assertThat(fits.fits()).isEqualTo(two.subject().timeline().fits().size());
        assertThat(fits.outcomes()).containsEntry("converged", fits.fits());
        assertThat(fits.searched()).isEqualTo(fits.fits());
        assertThat(fits.allAgreed()).isBetween(0, fits.searched());
        assertThat(fits.leastShare()).isBetween(0.0, 1.0);
        assertThat(fits.refused()).isEmpty();
    }

    private static double p(Duel duel) {
        Estimate p = duel.robust().corrected().pValue();
        return p.number().orElseThrow();
    }

    private static Map<String, ScoreContest.Row> byGauge(ScoreContest contest) {
        Map<String, ScoreContest.Row> rows = new java.util.LinkedHashMap<>();
        contest.rows().forEach(row -> rows.put(row.gauge(), row));
        return rows;
    }

    private static ScoreContest.Row row(Map<String, ScoreContest.Row> rows, String gauge) {
        return CommonBars.required(rows, gauge);
    }
}
