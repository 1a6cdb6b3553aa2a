package sojourn.walk;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.OptionalInt;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import sojourn.GivenPrices;
import sojourn.OpenData;
import sojourn.regime.Fit;

/**
 * On real stock indices, a model that sees only how large moves are calls stormy the regime in which returns are larger. Fitted from
 * the five starts that a strategy has by default: the starts from spread alone can end in a lower maximum, which parts a narrow state
 * from a wide one.
 */
class VolatilityOrdersTest {
    @ParameterizedTest
    @CsvSource({"nyse/nyse_1990_2005.csv", "dax/eustock_dax.csv", "smi/eustock_smi.csv"})
    void theStormyRegimeHasTheLargerReturns(String file) {
        GivenPrices prices = GivenPrices.closes(OpenData.column(file, "close"));
        int bars = prices.size();
        for (Observation observed : new Observation[] {new LogRealisedVolatility("a", 21), new AbsoluteReturn("a")}) {
            RegimeTimeline timeline =
                    Walks.forward(prices, Walks.observing(observed, "calm", "stormy"), fiveStarts(bars / 2, bars / 8));
            assertThat(timeline.fits()).hasSizeGreaterThanOrEqualTo(2).allSatisfy(record -> {
                Fit fit = record.fit();
                assertThat(fit.outcome().accepted()).isTrue();
                // of simple returns, weighted by the regimes' probabilities over the window
                assertThat(fit.orderBy()[1]).isGreaterThan(1.5 * fit.orderBy()[0]);
                // the number that was observed is larger in the stormy regime as well
                assertThat(fit.model().orElseThrow().emission().mean(1, 0))
                        .isGreaterThan(fit.model().orElseThrow().emission().mean(0, 0));
            });
            double[] size = new double[2];
            double[] weight = new double[2];
            for (int bar = timeline.firstBar().orElseThrow(); bar + 1 < bars; bar++) {
                double next = Math.abs(prices.close(0, bar + 1) / prices.close(0, bar) - 1);
                for (int k = 0; k < 2; k++) {
                    size[k] += timeline.probability(bar, k) * next;
                    weight[k] += timeline.probability(bar, k);
                }
            }
            // and so it is a bar later, out of sample
            assertThat(size[1] / weight[1]).isGreaterThan(size[0] / weight[0]);
        }
    }

    private static RefitSettings fiveStarts(int firstFitAfter, int every) {
        return new RefitSettings(
                firstFitAfter,
                Walks.every(every),
                OptionalInt.empty(),
                5,
                Walks.SEED,
                RefitSettings.OnFailure.KEEP_PREVIOUS);
    }
}
