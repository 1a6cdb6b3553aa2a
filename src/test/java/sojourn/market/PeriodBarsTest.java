package sojourn.market;

import static org.assertj.core.api.Assertions.assertThat;
import static sojourn.market.Fixture.dates;

import java.time.LocalDate;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import sojourn.market.PriceTable.Bars;
import sojourn.market.PriceTable.Column;

/** Bars built from days, against tables worked out by hand. */
class PeriodBarsTest {
    private static final double NONE = Double.NaN;

    /** Thursday 2019-12-26 to Monday 2020-01-13; ISO week 2020-W01 runs from 30 December to 5 January. */
    private static final PriceSeries DAYS = PriceSeries.of(
            "stocks",
            dates("2019-12-26", "2019-12-27", "2019-12-30", "2020-01-02", "2020-01-05", "2020-01-07", "2020-01-13"),
            new Bars(
                    Column.of(11, 12, 10, 14, 13, 15, 16),
                    Optional.of(Column.of(10, 11, 12, NONE, 14, NONE, 15)),
                    Optional.of(Column.of(12, 13, 12.5, 15, 14.5, 15.5, 17)),
                    Optional.of(Column.of(9, 10.5, 9.5, 10, 12, 13, 14)),
                    Optional.of(Column.of(100, 200, 300, NONE, 500, 600, 700))));

    @Test
    void weeksByHand() {
        PriceTable table = tableOf(BarLength.WEEKLY);
        Known known = table.knownAt(table.size() - 1);
        assertThat(table.size()).isEqualTo(3);
        assertThat(List.of(known.date(0), known.date(1), known.date(2)))
                .isEqualTo(dates("2019-12-27", "2020-01-05", "2020-01-07"));
        assertThat(known.closes(0, 0)).containsExactly(12, 13, 15);
        assertThat(known.open(0, 0)).hasValue(10);
        assertThat(known.open(0, 1)).hasValue(12);
        assertThat(known.open(0, 2)).isEmpty();
        assertThat(known.high(0, 0)).hasValue(13);
        assertThat(known.high(0, 1)).hasValue(15);
        assertThat(known.low(0, 0)).hasValue(9);
        assertThat(known.low(0, 1)).hasValue(9.5);
        assertThat(known.volume(0, 0)).hasValue(300);
        assertThat(known.volume(0, 1)).isEmpty();
        assertThat(known.volume(0, 2)).hasValue(600);
    }

    @Test
    void oneFinishedMonthIsTooFew() {
        assertThat(Fixture.faults(() -> tableOf(BarLength.MONTHLY)))
                .containsExactly(
                        "stocks: the common days from 2019-12-26 to 2020-01-13 hold 1 complete month; give more days,"
                                + " or shorter bars");
    }

    @Test
    void monthsByHand() {
        PriceSeries days = PriceSeries.of(
                "stocks",
                dates("2020-01-31", "2020-02-03", "2020-02-28", "2020-03-02", "2020-03-03"),
                Bars.ofCloses(1, 2, 3, 4, 5));
        Market market = market(List.of(days), BarLength.MONTHLY);
        assertThat(market.table().knownAt(1).closes(0, 0)).containsExactly(1, 3);
        assertThat(market.findings().stream().map(Finding::toString))
                .containsOnlyOnce(
                        "the 2 days from 2020-03-02 to 2020-03-03 make no bar: no later month has begun; nothing to"
                                + " do; the bar appears with the first day of the next month");
    }

    @Test
    void oneDayMakesNoBar() {
        PriceSeries days =
                PriceSeries.of("stocks", dates("2020-01-31", "2020-02-28", "2020-03-02"), Bars.ofCloses(1, 2, 3));
        assertThat(market(List.of(days), BarLength.MONTHLY).findings().stream().map(Finding::what))
                .contains("the day 2020-03-02 makes no bar: no later month has begun");
    }

    @Test
    void daysThatOneSeriesLacksAreNoDaysOfAnyBar() {
        PriceSeries other = PriceSeries.of(
                "bonds",
                dates("2019-12-26", "2020-01-02", "2020-01-03", "2020-01-07", "2020-01-13"),
                Bars.ofCloses(1, 2, 3, 4, 5));
        PriceTable table = market(List.of(DAYS, other), BarLength.WEEKLY).table();
        Known known = table.knownAt(2);
        assertThat(known.date(1)).isEqualTo("2020-01-02");
        assertThat(known.closes(0, 0)).containsExactly(11, 14, 15);
        assertThat(known.closes(1, 0)).containsExactly(1, 2, 4);
        assertThat(known.high(0, 1)).hasValue(15);
    }

    /** ISO 8601: a week belongs to the year of its Thursday, but where a week ends does not depend on the year. */
    @ParameterizedTest
    @CsvSource({
        "DAILY, 2020-01-01, 2020-01-01",
        "WEEKLY, 2020-01-01, 2019-12-30",
        "WEEKLY, 2019-12-29, 2019-12-23",
        "WEEKLY, 2019-12-30, 2019-12-30",
        "MONTHLY, 2020-02-29, 2020-02-01"
    })
    void periodsBegin(BarLength length, String date, String start) {
        assertThat(length.periodStart(LocalDate.parse(date))).isEqualTo(start);
    }

    private static PriceTable tableOf(BarLength length) {
        return market(List.of(DAYS), length).table();
    }

    private static Market market(List<PriceSeries> series, BarLength length) {
        return Market.of(
                series,
                new Calendar(length, Calendar.Days.COMMON, Calendar.Rows.DAYS),
                CashRates.constant(0, DayCount.ACTUAL_365));
    }
}
