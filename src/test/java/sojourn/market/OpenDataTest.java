package sojourn.market;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;

/** Whole files of open data; counts, first and last values as their READMEs and the files themselves state them. */
class OpenDataTest {
    private static final String METALS = "gold_silver/gold_silver_1977_2012.csv";
    private static final String MONTHS = "sp500/sp500_monthly.csv";

    @Test
    void theStockExchangeOfNewYorkByDay() {
        Market market = PriceReader.read(
                Path.of(""),
                Map.of("stocks", PriceSource.of(Fixture.openData("nyse/nyse_1990_2005.csv"))),
                Calendar.DAILY,
                CashSource.NOTHING,
                List.of("stocks"));
        Known known = market.table().knownAt(4002);
        assertThat(market.table().size()).isEqualTo(4003);
        assertThat(market.files().get(0).rows()).isEqualTo(4003);
        assertThat(known.date(0)).isEqualTo("1990-01-02");
        assertThat(known.close(0, 0)).isEqualTo(2093.6);
        assertThat(known.date()).isEqualTo("2005-11-11");
        assertThat(known.close(0, 4002)).isEqualTo(7561.4);
        assertThat(market.findings()).isEmpty();
    }

    @Test
    void goldAndSilverFromOneFile() {
        Market market = metals(Calendar.DAILY);
        PriceTable table = market.table();
        Known known = table.knownAt(table.size() - 1);
        assertThat(table.size()).isEqualTo(9132);
        assertThat(known.date(0)).isEqualTo("1977-12-30");
        assertThat(known.date()).isEqualTo("2012-12-31");
        assertThat(known.close(0, 0)).isEqualTo(100);
        assertThat(known.close(1, 0)).isEqualTo(223.42);
        assertThat(known.close(0, 9131)).isEqualTo(915.88);
        assertThat(known.close(1, 9131)).isEqualTo(1100.34);
        assertThat(market.files().get(0).sha256())
                .isEqualTo(market.files().get(1).sha256());
        assertThat(market.files().get(0).contentDigest())
                .isNotEqualTo(market.files().get(1).contentDigest());
    }

    /** From December 1977 to November 2012 there are 420 months; December 2012 has no later row. */
    @Test
    void metalsByMonth() {
        Market market = metals(new Calendar(BarLength.MONTHLY, Calendar.Days.COMMON, Calendar.Rows.DAYS));
        assertThat(market.table().size()).isEqualTo(420);
        assertThat(market.table().knownAt(419).date()).isEqualTo("2012-11-30");
    }

    @Test
    void monthsThatAreBarsAlready() {
        Market market = months(new Calendar(BarLength.MONTHLY, Calendar.Days.COMMON, Calendar.Rows.BARS));
        Known known = market.table().knownAt(122);
        assertThat(market.table().size()).isEqualTo(123);
        assertThat(market.table().barLength()).isEqualTo(BarLength.MONTHLY);
        assertThat(known.close(0, 0)).isEqualTo(1394.46);
        assertThat(known.date()).isEqualTo("2010-03-01");
        assertThat(known.close(0, 122)).isEqualTo(1140.45);
        assertThat(market.findings()).isEmpty();
    }

    @Test
    void monthsTakenForDaysAreReported() {
        Market market = months(Calendar.DAILY);
        assertThat(market.findings().get(0).suggestion())
                .isEqualTo("write calendar: {bars: monthly, rows: bars} if each row is a whole month");
        assertThat(market.findings()).as("no gaps besides").hasSize(1);
    }

    private static Market metals(Calendar calendar) {
        Map<String, PriceSource> sources = new LinkedHashMap<>();
        PriceSource file = PriceSource.of(Fixture.openData(METALS));
        sources.put("gold", file.withClose("gold"));
        sources.put("silver", file.withClose("silver"));
        return PriceReader.read(Path.of(""), sources, calendar, CashSource.NOTHING, List.of("gold", "silver"));
    }

    private static Market months(Calendar calendar) {
        Map<String, PriceSource> sources = Map.of("stocks", PriceSource.of(Fixture.openData(MONTHS)));
        return PriceReader.read(Path.of(""), sources, calendar, CashSource.NOTHING, List.of("stocks"));
    }
}
