package sojourn.world;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.LocalDate;
import java.time.temporal.ChronoUnit;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.NavigableMap;
import java.util.Set;
import java.util.TreeMap;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** The files in demo-data: rebuilt from their world, and read as a stranger would read them. */
class DemoDataTest {
    private static final World SKERRY = Worlds.skerry();

    @Test
    void theFilesAreRebuiltToTheByte() {
        Map<String, String> files = WorldFiles.of(Inventor.invent(SKERRY));
        assertThat(files.keySet())
                .containsExactly(
                        "skerry-stocks.csv",
                        "skerry-bonds.csv",
                        "skerry-gold.csv",
                        "skerry-bills.csv",
                        "skerry-truth.csv");
        // isTrue, not isEqualTo: a failure must not print 300 kB.
        files.forEach((name, text) ->
                assertThat(text.equals(Worlds.text(name))).as(name).isTrue());
    }

    @Test
    void theColumnsAreTheDocumentedOnes() {
        assertThat(Worlds.text("skerry-stocks.csv")).startsWith("date,open,high,low,close,volume\n");
        assertThat(Worlds.text("skerry-gold.csv")).startsWith("date,open,high,low,close,volume\n");
        assertThat(Worlds.text("skerry-bonds.csv")).startsWith("date,close,total_return\n");
        assertThat(Worlds.text("skerry-bills.csv")).startsWith("date,percent_per_year\n");
        assertThat(Worlds.text("skerry-truth.csv")).startsWith("date,state\n");
    }

    @ParameterizedTest
    @ValueSource(strings = {"stocks", "gold"})
    void everyBarIsWellFormed(String asset) {
        for (List<String> row : rows(asset)) {
            assertThat(row).hasSize(6);
            double open = Double.parseDouble(row.get(1));
            double high = Double.parseDouble(row.get(2));
            double low = Double.parseDouble(row.get(3));
            double close = Double.parseDouble(row.get(4));
            assertThat(high).isGreaterThanOrEqualTo(Math.max(open, close));
            assertThat(low).isLessThanOrEqualTo(Math.min(open, close)).isPositive();
            assertThat(Long.parseLong(row.get(5))).isPositive();
        }
    }

    @ParameterizedTest
    @ValueSource(strings = {"stocks", "bonds", "gold"})
    void datesRiseOnTradingDaysOnlyAndNoMoveLooksLikeASplit(String asset) {
        NavigableMap<LocalDate, Double> closes = closes(asset);
        Map<LocalDate, String> truth = truth();
        assertThat(closes.size()).isEqualTo(rows(asset).size());
        assertThat(new ArrayList<>(closes.keySet()))
                .containsExactlyElementsOf(truth.keySet().stream()
                        .filter(day -> !SKERRY.listing(asset).closed().include(day))
                        .toList());
        double last = closes.firstEntry().getValue();
        for (double close : closes.values()) {
            assertThat(close / last - 1).isBetween(-0.4, 0.4);
            last = close;
        }
    }

    @Test
    void someDaysAreNotCommonToAllAssets() {
        Set<LocalDate> common = new LinkedHashSet<>(truth().keySet());
        for (String asset : SKERRY.assetNames()) {
            common.retainAll(closes(asset).keySet());
        }
        // Five own closings a year, of which weekends take two in seven.
        assertThat(truth().size() - common.size()).isBetween(3 * 24 - 12, 5 * 24);
    }

    @Test
    void aRateIsNeverStale() {
        LocalDate last = SKERRY.firstDay();
        for (List<String> row : rows("bills")) {
            LocalDate date = LocalDate.parse(row.get(0));
            assertThat(ChronoUnit.DAYS.between(last, date)).isBetween(0L, 7L);
            assertThat(Double.parseDouble(row.get(1))).isBetween(0.0, 10.0);
            last = date;
        }
        assertThat(ChronoUnit.DAYS.between(last, closes("stocks").lastKey())).isBetween(0L, 7L);
    }

    /** How the seed was chosen, as demo-data/README.md says. */
    @Test
    void sampleMeansLieNearTheStatedOnesInEveryState() {
        Map<LocalDate, String> truth = truth();
        for (String asset : SKERRY.assetNames()) {
            for (String state : SKERRY.stateNames()) {
                Move stated = SKERRY.state(state).move(asset);
                List<Double> found = logReturns(closes(asset), truth, state);
                double mean = found.stream().mapToDouble(r -> r).average().orElseThrow();
                double standardError = stated.volatilityPercentPerYear() / 100 / Math.sqrt(252.0 * found.size());
                double strayed = (mean - stated.driftPercentPerYear() / 100 / 252) / standardError;
                assertThat(Math.abs(strayed))
                        .as(asset + " " + state)
                        .isLessThanOrEqualTo(asset.equals("stocks") ? 0.5 : 1.5);
            }
        }
    }

    @Test
    void stormsAreWildestAndCalmCommonest() {
        Map<LocalDate, String> truth = truth();
        NavigableMap<LocalDate, Double> closes = closes("stocks");
        double calm = volatility(logReturns(closes, truth, "calm"));
        double unsettled = volatility(logReturns(closes, truth, "unsettled"));
        double stormy = volatility(logReturns(closes, truth, "stormy"));
        // 4 standard errors of a sample standard deviation, sqrt((kurtosis - 1) / 4n) with the t distribution's
        // kurtosis.
        assertThat(calm).isBetween(0.095, 0.105);
        assertThat(unsettled).isBetween(0.146, 0.174);
        assertThat(stormy).isBetween(0.263, 0.377);
        assertThat(logReturns(closes, truth, "calm").size()).isGreaterThan(truth.size() / 2);
    }

    /** Log returns between closes on consecutive trading days on which every asset traded, by the later day's state. */
    private static List<Double> logReturns(
            NavigableMap<LocalDate, Double> closes, Map<LocalDate, String> truth, String state) {
        List<Double> found = new ArrayList<>();
        boolean lastCommon = false;
        double last = 1;
        for (Map.Entry<LocalDate, String> day : truth.entrySet()) {
            boolean common = SKERRY.assets().values().stream()
                    .noneMatch(listing -> listing.closed().include(day.getKey()));
            double close = closes.getOrDefault(day.getKey(), 1.0);
            if (common && lastCommon && day.getValue().equals(state)) {
                found.add(StrictMath.log(close / last));
            }
            lastCommon = common;
            last = close;
        }
        return found;
    }

    private static double volatility(List<Double> logReturns) {
        double mean = logReturns.stream().mapToDouble(r -> r).average().orElseThrow();
        double variance = logReturns.stream()
                .mapToDouble(r -> (r - mean) * (r - mean))
                .average()
                .orElseThrow();
        return Math.sqrt(252 * variance);
    }

    private static NavigableMap<LocalDate, Double> closes(String asset) {
        int column = asset.equals("bonds") ? 1 : 4;
        NavigableMap<LocalDate, Double> closes = new TreeMap<>();
        for (List<String> row : rows(asset)) {
            closes.put(LocalDate.parse(row.get(0)), Double.parseDouble(row.get(column)));
        }
        return closes;
    }

    private static Map<LocalDate, String> truth() {
        Map<LocalDate, String> truth = new LinkedHashMap<>();
        rows("truth").forEach(row -> truth.put(LocalDate.parse(row.get(0)), row.get(1)));
        return truth;
    }

    private static List<List<String>> rows(String file) {
        return Worlds.text("skerry-" + file + ".csv")
                .lines()
                .skip(1)
                .map(line -> List.of(line.split(",")))
                .toList();
    }
}
