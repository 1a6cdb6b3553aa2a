package sojourn;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.function.IntFunction;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import sojourn.PrefixCheck.Difference;
import sojourn.PrefixCheck.Rows;
import sojourn.archive.TimelineFiles;
import sojourn.market.Market;
import sojourn.numeric.RandomStream;
import sojourn.regime.StartRunner;
import sojourn.walk.RegimeTimeline;
import sojourn.walk.TimelineAddress;
import sojourn.walk.Walk;

/**
 * No look-ahead with probabilities that were computed elsewhere: on files cut at a date (prices by their dates, probabilities by the
 * dates on which they became known) every bar up to the cut is as on the whole files. Taking a row by its own date is caught.
 */
class GivenLookAheadTest {
    private static final PriceHistory STOCKS = PriceHistory.stocks();
    private static final int ROWS = 500;
    private static final int FIRST_FIT = 120;
    private static final int[] CUTS = {2, 30, 124, 125, 126, 127, 161, 200, 233, 300, 333, 410, ROWS - 1};
    private static final byte[] SETTINGS = {1};

    @TempDir
    private Path folder;

    /** One row. */
    private record Given(LocalDate date, LocalDate knownOn, double stormy) {}

    /** Every third bar a probability of stormy, known one to nine days later, so that some overtake others. */
    private static List<Given> given() {
        RandomStream random = RandomStream.of(11, "given");
        List<Given> rows = new ArrayList<>();
        for (int row = 3; row < ROWS; row += 3) {
            LocalDate date = STOCKS.date(row);
            rows.add(new Given(date, date.plusDays(1 + random.nextInt(9)), random.nextInt(1001) / 1000.0));
        }
        return rows;
    }

    @Test
    void everyBarUpToTheCutIsAsOnTheWholeFiles() {
        PrefixCheck check = check("known");
        assertThat(check.rowsOf("fits")).isEqualTo((ROWS - FIRST_FIT) / 40 + 1);
        assertThat(check.rowsOf("trades")).isGreaterThan(30);
        assertThat(check.differences(CUTS)).isEmpty();
    }

    @Test
    void aRowTakenByItsOwnDateIsCaught() {
        List<Difference> differences = check("date").differences(CUTS);
        assertThat(differences).hasSizeGreaterThan(CUTS.length / 2);
        assertThat(differences)
                .extracting(Difference::column)
                .contains("probability.calm")
                .doesNotContain("log_score");
    }

    @Test
    void nothingIsDecidedBeforeTheFirstRowIsKnownAndAFitIsDue() {
        WholeJob job = job("known");
        write(ROWS);
        RegimeTimeline timeline = job.walk(job.read());
        int firstKnown = 0;
        Market market = job.read();
        while (market.table().knownAt(firstKnown).given(0, firstKnown).isEmpty()) {
            firstKnown++;
        }
        assertThat(firstKnown).isGreaterThan(1);
        assertThat(timeline.firstBar()).hasValue(firstKnown + FIRST_FIT - 1);
    }

    @Test
    void atEachCloseTheProbabilitiesAreThoseOfTheRowThatBecameKnownLast() {
        WholeJob job = job("known");
        write(ROWS);
        Market market = job.read();
        RegimeTimeline timeline = job.walk(market);
        for (int bar = timeline.firstBar().orElseThrow(); bar < ROWS; bar++) {
            LocalDate today = market.table().knownAt(bar).date();
            Given last = given().get(0);
            for (Given row : given()) {
                boolean known = !row.knownOn().isAfter(today);
                boolean later = row.knownOn().isAfter(last.knownOn())
                        || (row.knownOn().equals(last.knownOn()) && row.date().isAfter(last.date()));
                last = known && later ? row : last;
            }
            assertThat(timeline.probability(bar, 1)).as(today.toString()).isEqualTo(last.stormy());
        }
    }

    @Test
    void goingOnWithNewBarsEqualsAFreshWalkToTheBitAndTheAddressIsAChain() {
        WholeJob job = job("known");
        write(ROWS);
        Market whole = job.read();
        String fresh = text(job.walk(whole));
        for (int cut : CUTS) {
            write(cut);
            Market part = job.read();
            RegimeTimeline onward = Walk.onward(
                    job.walk(part),
                    whole.table(),
                    job.strategy().regimes(),
                    job.strategy().refit(),
                    StartRunner.sequential(),
                    bar -> {});
            assertThat(text(onward)).as("from bar " + cut).isEqualTo(fresh);
            assertThat(TimelineAddress.of(
                            SETTINGS, part.table(), job.strategy().regimes().observe()))
                    .isEqualTo(TimelineAddress.at(
                            SETTINGS, whole.table(), job.strategy().regimes().observe(), cut - 1));
        }
    }

    @Test
    void theAddressTakesInWhatCountedAtEachBar() {
        WholeJob job = job("known");
        write(ROWS);
        String address = address(job);
        List<Given> rows = given();
        Given tenth = rows.get(10);
        rows.set(10, new Given(tenth.date(), tenth.knownOn(), 1 - tenth.stormy()));
        write(rows);
        assertThat(address(job)).isNotEqualTo(address);
    }

    private static String address(WholeJob job) {
        return TimelineAddress.of(
                SETTINGS, job.read().table(), job.strategy().regimes().observe());
    }

    private static String text(RegimeTimeline timeline) {
        List<String> columns = List.of("given_calm", "given_stormy");
        return TimelineFiles.bars(timeline).csv()
                + TimelineFiles.fits(timeline, columns).csv();
    }

    private WholeJob job(String knownOn) {
        return WholeJob.of("""
                strategy: Follow the gauge
                prices: {stocks: {csv: stocks.csv}}
                cash: {percent-per-year: 4}
                regimes: {given: {csv: given.csv, known-on: %s}, states: [calm, stormy], order-by: stocks}
                refit: {first-fit-after: 120, every: 40, seed: 7}
                allocate: {blend: {weights: {calm: {stocks: 1}, stormy: {stocks: 0}}}}
                judge: {against: [buy-and-hold], buy-and-hold: {stocks: 1}, rank-by: sharpe}
                """.formatted(knownOn), folder);
    }

    private PrefixCheck check(String knownOn) {
        WholeJob job = job(knownOn);
        IntFunction<Rows> onRows = rows -> {
            write(rows);
            return job.run(job.read());
        };
        return PrefixCheck.of(onRows, ROWS);
    }

    /** The files as they stood after the close of the last of so many price rows. */
    private void write(int rows) {
        STOCKS.write(folder.resolve("stocks.csv"), rows);
        LocalDate today = STOCKS.date(rows - 1);
        List<Given> known =
                given().stream().filter(row -> !row.knownOn().isAfter(today)).toList();
        write(known.isEmpty() ? given().subList(0, 1) : known); // a file without any row is refused
    }

    private void write(List<Given> rows) {
        StringBuilder text = new StringBuilder("date,calm,stormy,known\n");
        for (Given row : rows) {
            text.append(row.date()).append(',').append(Math.round(1000 - 1000 * row.stormy()) / 1000.0);
            text.append(',')
                    .append(row.stormy())
                    .append(',')
                    .append(row.knownOn())
                    .append('\n');
        }
        try {
            Files.writeString(folder.resolve("given.csv"), text);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
