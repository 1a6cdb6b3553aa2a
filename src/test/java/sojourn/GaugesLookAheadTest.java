package sojourn;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.IntFunction;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;
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

    private static final String PRIOR =
            "observe: [{log-return: stocks}], states: [calm, stormy], prior: {stay: 20, variance: window}";

    private static final String BY_BIC = choosing("bic");
    private static final String BY_PREDICTION = choosing("predictive");

    private static String choosing(String by) {
        return "observe: [{log-return: stocks}], states: [all, calm, stormy], choose: {states: [[all], [calm, stormy]], by: "
                + by + "}";
    }

    static List<String> choices() {
        return List.of(BY_BIC, BY_PREDICTION);
    }

    @TempDir
    private Path folder;

    @ParameterizedTest
    @ValueSource(strings = {ROLLING, WEIGHTED, JUMP, PRIOR})
    void everyGaugeSaysTheSameOfEveryBarUpToTheCut(String regimes) {
        WholeJob job = job(regimes);
        PrefixCheck check = check(job);
        assertThat(check.rowsOf("fits")).isGreaterThanOrEqualTo(10);
        assertThat(check.rowsOf("trades")).isGreaterThan(3);
        assertThat(check.differences(CUTS)).isEmpty();
    }

    @ParameterizedTest
    @ValueSource(strings = {ROLLING, WEIGHTED, JUMP, PRIOR})
    void aGaugeWithTheParametersOfTheFullSampleIsCaught(String regimes) {
        WholeJob honest = job(regimes);
        Observation observation = honest.strategy().regimes().observe().get(0);
        PrefixCheck check = check(honest.signalling((table, timeline) -> new Hindsight(table, timeline, observation)));
        assertThat(check.differences(CUTS))
                .isNotEmpty()
                .allSatisfy(difference -> assertThat(difference.column()).isEqualTo("target.stocks"));
    }

    @ParameterizedTest
    @MethodSource("choices")
    void aChosenNumberOfRegimesSaysTheSameOfEveryBarUpToTheCut(String regimes) {
        PrefixCheck check = check(choosingJob(regimes));
        assertThat(check.whole().rows().stream()
                        .filter(row -> row.table().equals("fits"))
                        .map(row -> row.cells().get(row.columns().indexOf("states")))
                        .distinct())
                .containsExactlyInAnyOrder("1", "2");
        assertThat(check.differences(CUTS)).isEmpty();
    }

    @ParameterizedTest
    @MethodSource("choices")
    void aNumberChosenFromTheFullSampleIsCaughtEvenIfItsFitsAndFilterAreHonest(String regimes) {
        PrefixCheck check = check(choosingJob(regimes).signalling(ChosenInHindsight::new));
        assertThat(check.differences(CUTS)).isNotEmpty();
    }

    private WholeJob choosingJob(String regimes) {
        return WholeJob.of(text(regimes).replace("{calm:", "{all: {stocks: 0.5}, calm:"), folder);
    }

    private WholeJob job(String regimes) {
        return WholeJob.of(text(regimes), folder);
    }

    private static String text(String regimes) {
        return """
                strategy: Lean with the odds
                prices: {stocks: {csv: stocks.csv}}
                cash: {percent-per-year: 4}
                regimes: {%s}
                refit: {first-fit-after: 300, every: 50, window: {rolling: 250}, starts: 2, seed: 7}
                allocate: {blend: {weights: {calm: {stocks: 1}, stormy: {stocks: 0}}}}
                judge: {against: [buy-and-hold], buy-and-hold: {stocks: 1}, rank-by: sharpe}
                """.formatted(regimes);
    }

    private PrefixCheck check(WholeJob job) {
        IntFunction<Rows> onRows = rows -> {
            STOCKS.write(folder.resolve("stocks.csv"), rows);
            return job.run(job.read());
        };
        return PrefixCheck.of(onRows, ROWS);
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

    /** At every bar the number of regimes that the last fit of all chose; its own fits and filter are honest. */
    private static final class ChosenInHindsight implements Signal {
        private final RegimeTimeline timeline;
        private final int last;

        ChosenInHindsight(PriceTable table, RegimeTimeline timeline) {
            this.timeline = timeline;
            this.last = timeline.fits().isEmpty()
                    ? 0
                    : timeline.fits().get(timeline.fits().size() - 1).regimes().size();
        }

        @Override
        public List<String> regimes() {
            return timeline.regimes();
        }

        @Override
        public Optional<Reading> at(Known known) {
            return timeline.at(known).map(honest -> {
                double[] own = honest.filtered();
                double[] one = {1, 0, 0};
                double[] two = {0, own[0] == 1 ? 1 : own[1], own[0] == 1 ? 0 : own[2]};
                return Reading.of(
                        honest.fit(),
                        last == 1 ? one : two,
                        new double[] {1, 0, 0, 0, 1, 0, 0, 0, 1},
                        timeline.reading(known.bar()).orElseThrow().moments());
            });
        }
    }
}
