package sojourn.allocate;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.LocalDate;
import java.time.temporal.IsoFields;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import sojourn.GivenPrices;
import sojourn.market.PriceTable;

class ScheduleTest {
    @Test
    void everyCloseDecides() {
        assertThat(decisionBars(Schedule.AT_EVERY_CLOSE, GivenPrices.flat(4, 1).table()))
                .containsExactly(0, 1, 2, 3);
    }

    @Test
    void aWeekMayRunAcrossNewYear() {
        PriceTable table = GivenPrices.flat(6, 1)
                .on(
                        LocalDate.of(2019, 12, 27), // Friday
                        LocalDate.of(2019, 12, 30), // Monday
                        LocalDate.of(2019, 12, 31),
                        LocalDate.of(2020, 1, 2), // Thursday of the same ISO week
                        LocalDate.of(2020, 1, 7), // Tuesday: Monday was no bar
                        LocalDate.of(2020, 1, 8))
                .table();
        assertThat(decisionBars(Schedule.FIRST_OF_WEEK, table)).containsExactly(1, 4);
        assertThat(decisionBars(Schedule.FIRST_OF_MONTH, table)).containsExactly(3);
    }

    @Test
    void periodsAreIsoWeeksAndCalendarMonths() {
        GivenPrices prices = GivenPrices.flat(3_000, 1);
        PriceTable table = prices.table();
        List<Integer> weeks = new ArrayList<>();
        List<Integer> months = new ArrayList<>();
        for (int bar = 1; bar < prices.size(); bar++) {
            LocalDate date = prices.dates().get(bar);
            LocalDate before = prices.dates().get(bar - 1);
            if (date.get(IsoFields.WEEK_OF_WEEK_BASED_YEAR) != before.get(IsoFields.WEEK_OF_WEEK_BASED_YEAR)) {
                weeks.add(bar);
            }
            if (!date.getMonth().equals(before.getMonth())) {
                months.add(bar);
            }
        }
        assertThat(decisionBars(Schedule.FIRST_OF_WEEK, table)).isEqualTo(weeks);
        assertThat(decisionBars(Schedule.FIRST_OF_MONTH, table)).isEqualTo(months);
    }

    @Test
    void theSamePeriodOfTheNextYearIsAnotherPeriod() {
        PriceTable table = GivenPrices.flat(2, 1)
                .on(LocalDate.of(2019, 3, 4), LocalDate.of(2020, 3, 2))
                .table();
        assertThat(decisionBars(Schedule.FIRST_OF_WEEK, table)).containsExactly(1);
        assertThat(decisionBars(Schedule.FIRST_OF_MONTH, table)).containsExactly(1);
    }

    private static List<Integer> decisionBars(Schedule schedule, PriceTable table) {
        List<Integer> bars = new ArrayList<>();
        for (int bar = 0; bar < table.size(); bar++) {
            if (schedule.decides(table.knownAt(bar))) {
                bars.add(bar);
            }
        }
        return bars;
    }
}
