package sojourn.job;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.time.LocalDate;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import sojourn.numeric.RandomStream;

/** A rate that falls below 0 is watched by its changes; wherever a return of it would be taken it is refused. */
class RatesBelowZeroTest {
    private static final LocalDate START = LocalDate.of(2010, 1, 4);
    private static final int BARS = 420;

    @TempDir
    private Path temp;

    /** A rate in 64ths, so that its changes are exact, from {@code level} down through 0 and up again. */
    private static String rates(double level) {
        RandomStream random = RandomStream.of(3, "rate");
        StringBuilder csv = new StringBuilder("date,close\n");
        double rate = level;
        for (int bar = 0; bar < BARS; bar++) {
            csv.append(START.plusDays(bar)).append(',').append(rate).append('\n');
            int size = bar / 50 % 2 == 0 ? 2 : 12;
            rate += (random.nextInt(2 * size + 1) - size) / 64.0;
        }
        return csv.toString();
    }

    private JobFolder job(double level) {
        return new JobFolder(temp)
                .with("stocks.csv", DrawnPrices.csv(3, BARS, START))
                .with("rates.csv", rates(level));
    }

    private static StrategyText watching() {
        return StrategyText.named("watching rates")
                .with("prices", "{stocks: {csv: stocks.csv}, rate: {csv: rates.csv}}")
                .with(
                        "regimes",
                        "{observe: [{change: {of: rate, known-after: 1}}], states: [calm, stormy], order-by: stocks}");
    }

    @Test
    void itsChangesAreWatchedWhateverItsLevel() {
        JobFolder low = job(0).with("low.yaml", watching());
        assertThat(low.text("rates.csv")).contains(",-").contains(",0.0\n");
        JobFolder.Ran ran = low.compare("low", "low.yaml");
        assertThat(ran.code()).as(ran.err()).isZero();
        String path = low.text("results/low/watching-rates/path.csv");
        assertThat(path.lines().findFirst().orElseThrow())
                .contains("forecast.mean.stocks")
                .doesNotContain(".rate");
        low.files("results/low")
                .forEach((name, text) -> assertThat(text).as(name).doesNotContain("NaN", "Infinity"));
        JobFolder high = job(64).with("high.yaml", watching());
        high.compare("high", "high.yaml");
        assertThat(high.text("results/high/watching-rates/path.csv")).isEqualTo(path);
    }

    @Test
    void whoeverTakesAReturnOfItIsToldWhereItIsNotAboveZero() {
        JobFolder job = job(0).with("held.yaml", watching().with("judge", "{buy-and-hold: {rate: 1.0}}"))
                .with(
                        "returns.yaml",
                        watching()
                                .with(
                                        "regimes",
                                        "{observe: [{change: rate}, {log-return: rate}], states: [calm, stormy]}"));
        for (String file : new String[] {"held.yaml", "returns.yaml"}) {
            JobFolder.Ran ran = job.compare("refused-" + file, file);
            assertThat(ran.code()).as(file).isEqualTo(2);
            assertThat(job.text("results/refused-" + file + "/comparison.csv"))
                    .as(file)
                    .contains("is not above 0")
                    .contains("rates.csv:");
        }
    }
}
