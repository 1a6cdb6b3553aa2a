package sojourn;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.IntFunction;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.PrefixCheck.Difference;
import sojourn.PrefixCheck.Rows;
import sojourn.market.Known;
import sojourn.market.PriceTable;
import sojourn.regime.Gauge;
import sojourn.regime.GaugeFilter;
import sojourn.regime.Observations;
import sojourn.walk.Observation;
import sojourn.walk.Reading;
import sojourn.walk.RegimeTimeline;
import sojourn.walk.Signal;

/** No look-ahead with any kind of gauge, through the whole job on closes of the NYSE composite; and a gauge that does is caught. */
class GaugesLookAheadTest {
    private static final PriceHistory STOCKS = PriceHistory.stocks();
    private static final int ROWS = 800;
    private static final int FIRST_FIT = 300;
    /** Around the first fit, between fits, around one on a multiple of 50, and the last bar but one. */
    private static final int[] CUTS = {
        2, FIRST_FIT, FIRST_FIT + 1, FIRST_FIT + 2, 330, 351, 352, 450, 451, 452, 555, 700, ROWS - 1
    };

    private static final String ROLLING =
            "model: volatility-threshold, states: [calm, stormy], observe: [{log-return: stocks}],"
                    + " threshold: {volatility: {rolling: 21}, storm-above: 0.8, calm-below: 0.6}";
    private static final String WEIGHTED = "model: volatility-threshold, states: [calm, stormy],"
            + " observe: [{simple-return: stocks}], threshold: {volatility: {ewma: 0.94}, storm-above: 0.7}";

    private static final String JUMP =
            "model: jump, states: [calm, stormy], observe: [{absolute-return: stocks}], penalty: 8";

    @TempDir
    private Path folder;

    @ParameterizedTest
    @ValueSource(strings = {ROLLING, WEIGHTED, JUMP})
    void everyGaugeSaysTheSameOfEveryBarUpToTheCut(String regimes) {
        WholeJob job = job(regimes);
        PrefixCheck check = check(job);
        assertThat(rowsOf("fits", check)).isGreaterThanOrEqualTo(10);
        assertThat(rowsOf("trades", check)).isGreaterThan(3);
        assertThat(differences(check)).isEmpty();
    }

    @ParameterizedTest
    @ValueSource(strings = {ROLLING, WEIGHTED, JUMP})
    void aGaugeWithTheParametersOfTheFullSampleIsCaught(String regimes) {
        WholeJob honest = job(regimes);
        Observation observation = honest.strategy().regimes().observe().get(0);
        PrefixCheck check = check(honest.signalling((table, timeline) -> new Hindsight(table, timeline, observation)));
        assertThat(differences(check))
                .isNotEmpty()
                .allSatisfy(difference -> assertThat(difference.column()).isEqualTo("target.stocks"));
    }

    private WholeJob job(String regimes) {
        return WholeJob.of("""
                strategy: Lean with the odds
                prices: {stocks: {csv: stocks.csv}}
                cash: {percent-per-year: 4}
                regimes: {%s}
                refit: {first-fit-after: 300, every: 50, window: {rolling: 250}, starts: 2, seed: 7}
                allocate: {blend: {weights: {calm: {stocks: 1}, stormy: {stocks: 0}}}}
                judge: {against: [buy-and-hold], buy-and-hold: {stocks: 1}, rank-by: sharpe}
                """.formatted(regimes), folder);
    }

    private PrefixCheck check(WholeJob job) {
        IntFunction<Rows> onRows = rows -> {
            STOCKS.write(folder.resolve("stocks.csv"), rows);
            return job.run(job.read());
        };
        return PrefixCheck.of(onRows, ROWS);
    }

    private static List<Difference> differences(PrefixCheck check) {
        List<Difference> found = new ArrayList<>();
        for (int cut : CUTS) {
            check.difference(cut).ifPresent(found::add);
        }
        return found;
    }

    private static long rowsOf(String table, PrefixCheck check) {
        return check.whole().rows().stream()
                .filter(row -> row.table().equals(table))
                .count();
    }

    /** The gauge of the last fit of all, over everything there is; its filter is honest. */
    private static final class Hindsight implements Signal {
        private final RegimeTimeline timeline;
        private final List<double[]> probabilities = new ArrayList<>();

        Hindsight(PriceTable table, RegimeTimeline timeline, Observation observation) {
            this.timeline = timeline;
            if (timeline.fits().isEmpty()) {
                return;
            }
            Gauge last = timeline.fits()
                    .get(timeline.fits().size() - 1)
                    .fit()
                    .gauge()
                    .orElseThrow();
            GaugeFilter filter = last.filter();
            for (int bar = 1; bar < table.size(); bar++) {
                double x = observation.at(table.knownAt(bar)).orElseThrow();
                filter = filter.step(Observations.univariate(new double[] {x}), 0);
                probabilities.add(filter.probabilities());
            }
        }

        @Override
        public List<String> regimes() {
            return timeline.regimes();
        }

        @Override
        public Optional<Reading> at(Known known) {
            return timeline.at(known)
                    .map(honest -> Reading.of(
                            honest.fit(),
                            probabilities.get(known.bar() - 1),
                            new double[] {1, 0, 0, 1},
                            timeline.fits().get(0).fit().moments().orElseThrow()));
        }
    }
}
