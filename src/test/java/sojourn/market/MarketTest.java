package sojourn.market;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static sojourn.market.Fixture.dates;

import java.nio.file.Path;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import sojourn.market.PriceTable.Bars;

class MarketTest {
    private static final CashRates NO_INTEREST = CashRates.constant(0, DayCount.ACTUAL_365);

    @TempDir
    Path folder = Path.of("");

    @Test
    void datesThatAnotherSeriesLacksFallAwayAndAreReported() {
        Market market = Market.of(
                List.of(
                        series("a", "2020-01-02", "2020-01-03", "2020-01-06", "2020-01-07"),
                        series("b", "2020-01-03", "2020-01-06", "2020-01-07", "2020-01-08"),
                        series("c", "2020-01-02", "2020-01-03", "2020-01-07", "2020-01-08")),
                Calendar.DAILY,
                NO_INTEREST);
        assertThat(market.table().size()).isEqualTo(2);
        assertThat(market.table().knownAt(1).date()).isEqualTo("2020-01-07");
        assertThat(market.findings().stream().map(Finding::toString))
                .containsExactly(
                        "a: 2 of 4 rows of a fall away: 1 before 2020-01-03, where another series has none, and 1 inside the"
                                + " range of all series, that of 2020-01-06 (c lacks 1); use series of the same trading days if the"
                                + " rows inside matter",
                        "b: 2 of 4 rows of b fall away: 1 after 2020-01-07, where another series has none, and 1 inside the"
                                + " range of all series, that of 2020-01-06 (c lacks 1); use series of the same trading days if the"
                                + " rows inside matter",
                        "c: 2 of 4 rows of c fall away: 2 before 2020-01-03 or after 2020-01-07, where another series has"
                                + " none; nothing to do unless the longer history matters");
    }

    @Test
    void seriesThatHardlyOverlapAreRefusedWithTheirRanges() {
        List<PriceSeries> series = List.of(
                series("a", "2020-01-02", "2020-01-03"),
                series("b", "2020-01-02", "2020-01-03"),
                series("c", "2020-01-03", "2020-01-06"));
        assertThat(Fixture.faults(() -> Market.of(series, Calendar.DAILY, NO_INTEREST)))
                .containsExactly(
                        "c: a runs from 2020-01-02 to 2020-01-03, c runs from 2020-01-03 to 2020-01-06; they have one"
                                + " date only in common; use files whose dates overlap, written in the same way");
    }

    @Test
    void seriesThatOverlapInPairsOnlyAreRefused() {
        List<PriceSeries> series = List.of(
                series("a", "2020-01-02", "2020-01-03", "2020-01-06", "2020-01-07"),
                series("b", "2020-01-02", "2020-01-03"),
                series("c", "2020-01-06", "2020-01-07", "2020-01-08"));
        assertThat(Fixture.faults(() -> Market.of(series.subList(0, 2), Calendar.DAILY, NO_INTEREST)))
                .isEmpty();
        assertThat(Fixture.faults(() -> Market.of(series, Calendar.DAILY, NO_INTEREST)))
                .containsExactly(
                        "c: b runs from 2020-01-02 to 2020-01-03, c runs from 2020-01-06 to 2020-01-08; they have no"
                                + " date in common; use files whose dates overlap, written in the same way");
    }

    @Test
    void onlyUsedAssetsDefineBars() {
        Fixture.write(folder, "a.csv", "date,close\n2020-01-02,2\n2020-01-03,2.5\n");
        Fixture.write(folder, "b.csv", "date,close\n2019-01-02,1\n");
        Map<String, PriceSource> sources = new LinkedHashMap<>();
        sources.put("b", PriceSource.of("b.csv"));
        sources.put("a", PriceSource.of("a.csv"));
        Market market = PriceReader.read(folder, sources, Calendar.DAILY, CashSource.NOTHING, List.of("a"));
        assertThat(market.table().assets()).containsExactly("a");
        assertThat(market.files().stream().map(InputFile::role)).containsExactly("b", "a");
        assertThat(market.findings().stream().map(Finding::toString))
                .containsExactly(
                        "nothing uses b: it is neither observed nor held nor compared with, and stands in no table;"
                                + " remove it from prices, or use it");
        assertThatThrownBy(() -> PriceReader.read(folder, sources, Calendar.DAILY, CashSource.NOTHING, List.of("gold")))
                .hasMessage("used assets [gold] must be some of [b, a]");
    }

    @Test
    void theContentDigestIgnoresHowAFileIsWritten() {
        Fixture.write(folder, "a.csv", "date,close,volume\n2020-01-02,10.50,\n2020-01-03,1e1,7\n");
        Fixture.write(folder, "b.csv", "\ufeffTag;Preis;volume\r\n02.01.2020;10.5;\r\n03.01.2020;10;7.0\r\n");
        Fixture.write(folder, "c.csv", "date,close\n2020-01-02,10.50\n2020-01-03,10\n");
        Map<String, PriceSource> sources = new LinkedHashMap<>();
        sources.put("a", PriceSource.of("a.csv"));
        CsvLayout layout = new CsvLayout("b.csv", "Tag", DatePattern.of("dd.MM.yyyy"), Optional.empty());
        PriceSource plain = PriceSource.of("b.csv").withClose("Preis");
        sources.put(
                "b", new PriceSource(layout, plain.close(), plain.open(), plain.high(), plain.low(), plain.volume()));
        sources.put("c", PriceSource.of("a.csv").withCsv("c.csv"));
        List<InputFile> files = PriceReader.read(
                        folder, sources, Calendar.DAILY, CashSource.NOTHING, List.of("a", "b", "c"))
                .files();
        assertThat(files.get(1).contentDigest()).isEqualTo(files.get(0).contentDigest());
        assertThat(files.get(1).sha256()).isNotEqualTo(files.get(0).sha256());
        assertThat(files.get(2).contentDigest())
                .as("without the column of volumes")
                .isNotEqualTo(files.get(0).contentDigest());
        assertThat(files.get(0).rows()).isEqualTo(2);
        assertThat(files.get(0).first()).isEqualTo("2020-01-02");
        assertThat(files.get(0).last()).isEqualTo("2020-01-03");
    }

    @Test
    void gapsFrozenPricesAndLeapsAreReported() {
        List<LocalDate> dates = new ArrayList<>();
        double[] closes = new double[40];
        for (int row = 0; row < closes.length; row++) {
            dates.add(LocalDate.of(2020, 1, 1).plusDays(row + (row >= 20 ? 10 : 0) + (row >= 30 ? 20 : 0)));
            closes[row] = row >= 5 && row < 15 ? 100 : row == 25 ? 1 : 100 + 0.1 * row;
        }
        Market market =
                Market.of(List.of(PriceSeries.of("a", dates, Bars.ofCloses(closes))), Calendar.DAILY, NO_INTEREST);
        assertThat(market.findings().stream().map(Finding::toString))
                .containsExactly(
                        "a: 2 gaps of more than 10 calendar days in a, the first from 2020-01-20 to 2020-01-31, the longest"
                                + " from 2020-02-09 to 2020-03-01 (21 days); look whether rows are missing",
                        "a: 1 run of at least 10 identical closes of a, from 2020-01-06, of 10 rows; look"
                                + " whether old prices were carried forward; leave the cell empty where there was no price",
                        "a: 2 moves of a beyond ±40 % from one row to the next, the first on 2020-02-05 (-99.0 %), the greatest"
                                + " on 2020-02-06 (+10160.0 %); look for a split that was not adjusted for, or a price that is"
                                + " off by a factor of 100");
    }

    @Test
    void nothingOddMeansNoFinding() {
        Market market = Market.of(
                List.of(Fixture.invented("a", LocalDate.of(2020, 1, 1), 300, 5)), Calendar.DAILY, NO_INTEREST);
        assertThat(market.findings()).isEmpty();
    }

    @Test
    void rowsThatAreBarsAlreadyAreRecognised() {
        List<String> monthly = Market.of(
                        List.of(series("a", "2020-01-02", "2020-02-03", "2020-03-02")), Calendar.DAILY, NO_INTEREST)
                .findings()
                .stream()
                .map(Finding::toString)
                .toList();
        assertThat(monthly)
                .first()
                .isEqualTo(
                        "a: no month has more than one row of a, though each row is taken for a day; write calendar: {bars:"
                                + " monthly, rows: bars} if each row is a whole month");
        Calendar weeks = new Calendar(BarLength.WEEKLY, Calendar.Days.COMMON, Calendar.Rows.DAYS);
        List<Finding> weekly = Market.of(
                        List.of(series("a", "2020-01-03", "2020-01-10", "2020-01-17", "2020-01-24")),
                        weeks,
                        NO_INTEREST)
                .findings();
        assertThat(weekly.get(0).suggestion())
                .isEqualTo("write calendar: {bars: weekly, rows: bars} if each row is a whole week");
    }

    @Test
    void seriesThatMakeNoSenseAreRefused() {
        assertThatThrownBy(() -> PriceSeries.of("a", dates("2020-01-02"), Bars.ofCloses(1, 2)))
                .hasMessage("1 dates, 2 closes and 1 lines of a");
        assertThatThrownBy(() -> PriceSeries.of("a", dates("2020-01-02", "2020-01-02"), Bars.ofCloses(1, 2)))
                .hasMessage("date 2020-01-02 of a does not come after 2020-01-02");
        assertThatThrownBy(() -> Bars.ofCloses(1, Double.NaN)).hasMessage("close of bar 1 is NaN, must be above 0.0");
        assertThatThrownBy(() -> Market.of(List.of(), Calendar.DAILY, NO_INTEREST))
                .hasMessage("a market needs at least one series");
    }

    private static PriceSeries series(String asset, String... dates) {
        double[] closes = new double[dates.length];
        for (int row = 0; row < closes.length; row++) {
            closes[row] = 100 + row;
        }
        return PriceSeries.of(asset, dates(dates), Bars.ofCloses(closes));
    }
}
