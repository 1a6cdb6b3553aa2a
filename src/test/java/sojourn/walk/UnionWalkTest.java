package sojourn.walk;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import sojourn.GivenPrices;
import sojourn.market.BarLength;
import sojourn.market.Calendar;
import sojourn.market.CashRates;
import sojourn.market.DayCount;
import sojourn.market.Known;
import sojourn.market.Market;
import sojourn.market.PriceSeries;
import sojourn.market.PriceTable;
import sojourn.market.PriceTable.Bars;

/** Observations and addresses on bars on which a close is carried. */
class UnionWalkTest {
    private static final Calendar UNION = new Calendar(BarLength.DAILY, Calendar.Days.UNION, Calendar.Rows.DAYS);
    private static final int GAP = 30;
    private static final GivenPrices PRICES = Walks.weathers(5, 60, 2);

    /** Two series; b lacks the days of {@code lacking}. */
    private static PriceTable table(Calendar calendar, List<Integer> lacking) {
        List<LocalDate> dates = new ArrayList<>();
        List<Double> closes = new ArrayList<>();
        double[] all = new double[60];
        for (int day = 0; day < 60; day++) {
            all[day] = PRICES.close(0, day);
            if (!lacking.contains(day)) {
                dates.add(PRICES.dates().get(day));
                closes.add(PRICES.close(1, day));
            }
        }
        Bars own = Bars.ofCloses(closes.stream().mapToDouble(x -> x).toArray());
        List<PriceSeries> series =
                List.of(PriceSeries.of("a", PRICES.dates(), Bars.ofCloses(all)), PriceSeries.of("b", dates, own));
        return Market.of(series, calendar, CashRates.constant(0, DayCount.ACTUAL_360))
                .table();
    }

    @Test
    void equalCalendarsHaveOneAddressAndEqualBars() {
        PriceTable union = table(UNION, List.of());
        PriceTable common = table(Calendar.DAILY, List.of());
        List<Observation> observed = List.of(new LogReturn("a"), new LogReturn("b"));
        assertThat(TimelineAddress.of(new byte[] {1}, union, observed))
                .isEqualTo(TimelineAddress.of(new byte[] {1}, common, observed));
        for (int bar = 0; bar < 60; bar++) {
            Known known = union.knownAt(bar);
            assertThat(known.closes(1, 0)).isEqualTo(common.knownAt(bar).closes(1, 0));
            assertThat(known.carried(1, bar)).isFalse();
        }
    }

    @Test
    void aCarriedCloseIsNoObservationAndItsReturnCountsOnTheNextRow() {
        PriceTable table = table(UNION, List.of(GAP, GAP + 1));
        double over = PRICES.close(1, GAP + 2) / PRICES.close(1, GAP - 1);
        for (Observation one :
                List.of(new LogReturn("b"), new SimpleReturn("b"), new AbsoluteReturn("b"), new Change("b"))) {
            assertThat(one.at(table.knownAt(GAP))).as(one.word()).isEmpty();
            assertThat(one.at(table.knownAt(GAP + 1))).as(one.word()).isEmpty();
        }
        assertThat(new SimpleReturn("b").at(table.knownAt(GAP + 2)).orElseThrow())
                .isCloseTo(over - 1, within(1e-15));
        assertThat(new LogReturn("a").at(table.knownAt(GAP))).isPresent();
        OptionalDouble realised = new LogRealisedVolatility("b", 2).at(table.knownAt(GAP + 2));
        double last = Math.log(over);
        double before = Math.log(PRICES.close(1, GAP - 1) / PRICES.close(1, GAP - 2));
        double expected = 0.5 * Math.log((last * last + before * before) / 2);
        assertThat(realised.orElseThrow()).isCloseTo(expected, within(1e-12));
    }

    @Test
    void carriedRowsHaveNoPartInMomentsAndOrder() {
        PriceTable table = table(UNION, List.of(GAP));
        ObservationLog log = new ObservationLog(List.of(new LogReturn("a")), table.assets());
        for (int bar = 0; bar < 60; bar++) {
            log.append(table.knownAt(bar));
        }
        for (int row = 0; row < 59; row++) {
            assertThat(log.companions(0).missing(row)).as("row %d", row).isEqualTo(row == GAP - 1);
            assertThat(log.withheld(1, 0).get(row)).isEqualTo(row == GAP - 1);
            assertThat(log.withheld(0, 0).get(row)).isFalse();
        }
    }

    @Test
    void aCloseThatIsCarriedHasAnotherAddressThanTheSameCloseOfItsOwn() {
        List<Observation> observed = List.of(new LogReturn("a"));
        PriceTable carried = table(UNION, List.of(GAP));
        String withGap = TimelineAddress.at(new byte[] {1}, carried, observed, GAP);
        String before = TimelineAddress.at(new byte[] {1}, carried, observed, GAP - 1);
        PriceTable whole = table(UNION, List.of());
        assertThat(TimelineAddress.at(new byte[] {1}, whole, observed, GAP - 1)).isEqualTo(before);
        assertThat(TimelineAddress.at(new byte[] {1}, whole, observed, GAP)).isNotEqualTo(withGap);
    }
}
