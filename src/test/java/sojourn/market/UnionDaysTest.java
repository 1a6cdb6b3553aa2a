package sojourn.market;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.time.LocalDate;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import sojourn.document.InputException;
import sojourn.market.PriceTable.Bars;
import sojourn.market.PriceTable.Column;

/** Bars of days that not every series has. Expected values are counted out by hand. */
class UnionDaysTest {
    private static final Calendar UNION = new Calendar(BarLength.DAILY, Calendar.Days.UNION, Calendar.Rows.DAYS);
    private static final CashRates NO_RATE = CashRates.constant(0, DayCount.ACTUAL_360);

    private static final PriceSeries STOCKS = PriceSeries.of(
            "stocks",
            Fixture.dates("2020-01-02", "2020-01-06", "2020-01-07", "2020-01-09"),
            withOpens(new double[] {9, 10, 11, 13}, new double[] {8, 10.5, 11.5, 13.5}));
    private static final PriceSeries BONDS = PriceSeries.of(
            "bonds",
            Fixture.dates("2020-01-03", "2020-01-06", "2020-01-08", "2020-01-09"),
            Bars.ofCloses(50, 51, 53, 54));

    private static Bars withOpens(double[] closes, double[] opens) {
        return new Bars(
                Column.of(closes), Optional.of(Column.of(opens)), Optional.empty(), Optional.empty(), Optional.empty());
    }

    @Test
    void barsAreTheDaysOfAnySeriesOnceAllHaveHadARowAndLastClosesAreCarried() {
        PriceTable table = Market.of(List.of(STOCKS, BONDS), UNION, NO_RATE).table();
        Known last = table.knownAt(table.size() - 1);
        assertThat(List.of(last.date(0), last.date(1), last.date(2), last.date(3), last.date()))
                .isEqualTo(Fixture.dates("2020-01-03", "2020-01-06", "2020-01-07", "2020-01-08", "2020-01-09"));
        assertThat(last.closes(0, 0)).containsExactly(9, 10, 11, 11, 13);
        assertThat(last.closes(1, 0)).containsExactly(50, 51, 51, 53, 54);
        boolean[] stocks = {true, false, false, true, false};
        boolean[] bonds = {false, false, true, false, false};
        for (int bar = 0; bar < 5; bar++) {
            assertThat(last.carried(0, bar)).as("stocks %d", bar).isEqualTo(stocks[bar]);
            assertThat(last.carried("bonds", bar)).as("bonds %d", bar).isEqualTo(bonds[bar]);
            assertThat(table.fillPrices().carried(0, bar)).isEqualTo(stocks[bar]);
            assertThat(last.open(0, bar).isEmpty())
                    .as("an open is never carried")
                    .isEqualTo(stocks[bar]);
        }
        assertThat(last.open(0, 4)).hasValue(13.5);
        assertThat(last.ownCloses(0, 2, 4)).containsExactly(11, 13);
        assertThat(last.ownCloses(1, 9, 4)).containsExactly(50, 51, 53, 54);
    }

    @Test
    void whatFallsAwayAndWhatIsCarriedIsSaid() {
        List<String> findings = Market.of(List.of(STOCKS, BONDS), UNION, NO_RATE).findings().stream()
                .map(Finding::toString)
                .toList();
        assertThat(findings)
                .anySatisfy(one -> assertThat(one).contains("1 of 4 rows of stocks fall away: 1 before 2020-01-03"))
                .anySatisfy(
                        one -> assertThat(one)
                                .contains(
                                        "stocks has no row on 2 of 5 bars, the first 2020-01-03, the last 2020-01-08, at most 1"))
                .anySatisfy(one -> assertThat(one).contains("bonds has no row on 1 of 5 bars"));
    }

    @Test
    void aSeriesThatEndsIsCarriedToTheEnd() {
        PriceSeries ended = BONDS.upTo(LocalDate.of(2020, 1, 6)).orElseThrow();
        Market market = Market.of(List.of(STOCKS, ended), UNION, NO_RATE);
        Known last = market.table().knownAt(3);
        assertThat(last.date()).isEqualTo(LocalDate.of(2020, 1, 9));
        assertThat(last.closes(1, 0)).containsExactly(50, 51, 51, 51);
        assertThat(market.findings())
                .anySatisfy(one -> assertThat(one.toString()).contains("the last 2020-01-09, at most 2 in a row"));
    }

    @Test
    void dividendsAndSplitsCountOnTheirOwnDaysOnly() {
        PriceSeries paying = PriceSeries.of(
                "bonds",
                BONDS.dates(),
                Bars.ofCloses(50, 51, 26.5, 27).giving(Column.of(0, 1, 0, 0.5), Column.of(1, 1, 2, 1)));
        FillPrices prices =
                Market.of(List.of(STOCKS, paying), UNION, NO_RATE).table().fillPrices();
        double[] dividends = {0, 1, 0, 0, 0.5};
        double[] splits = {1, 1, 1, 2, 1};
        for (int bar = 0; bar < 5; bar++) {
            assertThat(prices.dividend(1, bar)).as("dividend %d", bar).isEqualTo(dividends[bar]);
            assertThat(prices.split(1, bar)).as("split %d", bar).isEqualTo(splits[bar]);
        }
    }

    @Test
    void anotherEndKeepsWhatIsCarried() {
        PriceTable table = Market.of(List.of(STOCKS, BONDS), UNION, NO_RATE).table();
        Known cut = AnotherEnd.cut(table, 4).knownAt(3);
        PriceTable longer = AnotherEnd.longer(AnotherEnd.cut(table, 4), LocalDate.of(2020, 1, 9), List.of(0.1, 0.0));
        assertThat(cut.carried(0, 3)).isTrue();
        assertThat(cut.carried(1, 3)).isFalse();
        assertThat(longer.knownAt(4).carried(0, 3)).isTrue();
        assertThat(longer.knownAt(4).carried(0, 4)).isFalse();
    }

    @Test
    void noDayIsThereByWhichAllHaveHadARow() {
        PriceSeries late = PriceSeries.of("gold", Fixture.dates("2020-01-09"), Bars.ofCloses(7));
        assertThatThrownBy(() -> Market.of(List.of(STOCKS, late), UNION, NO_RATE))
                .isInstanceOf(InputException.class)
                .hasMessageContaining("gold");
    }
}
