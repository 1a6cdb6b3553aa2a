package sojourn.evidence;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import sojourn.GivenPrices;
import sojourn.OpenData;
import sojourn.compare.Attempt;
import sojourn.market.PriceTable;
import sojourn.numeric.RandomStream;
import sojourn.regime.EmissionFamily;
import sojourn.regime.ModelKind;
import sojourn.regime.StartRunner;
import sojourn.walk.LogReturn;
import sojourn.walk.RefitSchedule;
import sojourn.walk.RefitSettings;
import sojourn.walk.RegimeSettings;
import sojourn.walk.Walk;

/** Subjects for the tests: walks over drawn and real prices that are quick to fit. */
final class Subjects {
    static final long SEED = 20260101;

    private Subjects() {}

    /** Prices whose volatility changes about every 60 bars between 0.6 % and 2.4 %: two regimes, truly. */
    static GivenPrices twoWeathers(long seed, int bars) {
        RandomStream random = RandomStream.of(seed, "two weathers");
        double[] closes = new double[bars];
        closes[0] = 100;
        boolean storm = false;
        for (int bar = 1; bar < bars; bar++) {
            storm = random.nextDouble() < 1 / 60.0 != storm;
            closes[bar] = closes[bar - 1] * StrictMath.exp(0.0003 + (storm ? 0.024 : 0.006) * random.nextNormal());
        }
        return GivenPrices.closes(closes);
    }

    /** Prices with one volatility throughout. */
    static GivenPrices oneWeather(long seed, int bars) {
        RandomStream random = RandomStream.of(seed, "one weather");
        double[] closes = new double[bars];
        closes[0] = 100;
        for (int bar = 1; bar < bars; bar++) {
            closes[bar] = closes[bar - 1] * StrictMath.exp(0.0003 + 0.01 * random.nextNormal());
        }
        return GivenPrices.closes(closes);
    }

    /** Closes of a file of open data. */
    static GivenPrices real(String file) {
        return GivenPrices.closes(OpenData.column(file, "close"));
    }

    static RegimeSettings hiddenMarkov(EmissionFamily emission) {
        return new RegimeSettings(
                ModelKind.HIDDEN_MARKOV,
                List.of(new LogReturn("a")),
                List.of("calm", "stormy"),
                emission,
                Optional.empty(),
                Optional.empty());
    }

    static RefitSettings expanding(int first, int every) {
        return new RefitSettings(
                first,
                new RefitSchedule.EveryObservations(every),
                OptionalInt.empty(),
                2,
                SEED,
                RefitSettings.OnFailure.KEEP_PREVIOUS);
    }

    static WalkedRegimes walked(GivenPrices prices, RegimeSettings regimes, RefitSettings refit) {
        PriceTable table = prices.table();
        return WalkedRegimes.of(
                table, regimes, refit, Walk.forward(table, regimes, refit, StartRunner.sequential(), bar -> {}));
    }

    /** Normal emissions, two regimes. */
    static WalkedRegimes walked(GivenPrices prices, int first, int every) {
        return walked(prices, hiddenMarkov(EmissionFamily.NORMAL), expanding(first, every));
    }

    /** The rivals of a subject, walked in this thread. */
    static List<Rival> rivals(WalkedRegimes subject) {
        return Rivals.of(subject.regimes()).stream()
                .map(rival -> new Rival(WalkedRegimes.of(
                        subject.table(),
                        rival,
                        subject.refit(),
                        Walk.forward(subject.table(), rival, subject.refit(), StartRunner.sequential(), bar -> {}))))
                .toList();
    }

    /** As if they had been walked without a fault. */
    static Map<String, Attempt<Rival>> attempts(List<Rival> rivals) {
        Map<String, Attempt<Rival>> attempts = new LinkedHashMap<>();
        rivals.forEach(rival -> attempts.put(rival.gauge(), Attempt.at(() -> rival)));
        return attempts;
    }

    static RegimeFindings findings(WalkedRegimes subject) {
        return RegimeEvidence.asked(subject, attempts(rivals(subject)));
    }

    static <T> T found(Answer<T> answer) {
        return answer.found().orElseThrow(() -> new AssertionError(answer.because()));
    }
}
