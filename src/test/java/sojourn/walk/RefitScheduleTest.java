package sojourn.walk;

import static org.assertj.core.api.Assertions.assertThat;

import com.fasterxml.jackson.databind.JsonNode;
import java.time.DayOfWeek;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Predicate;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import sojourn.CheckValues;
import sojourn.GivenPrices;
import sojourn.market.PriceTable;

/** When a model is fitted again. */
class RefitScheduleTest {
    private static final int ENOUGH = 30;

    @Test
    void countedFitsServeTheBarsOfTheWorkedCase() {
        CheckValues check = CheckValues.byId("refit_schedule_expanding");
        int observations = check.input("n_bars").asInt();
        RefitSettings refit = Walks.expanding(
                check.input("min_window").asInt(),
                Walks.every(check.input("refit_every").asInt()));
        GivenPrices prices = Walks.weathers(1, observations + 1, 1); // observation i is the return of bar i + 1
        RegimeTimeline timeline = Walks.forward(prices, Walks.oneRegime(new LogReturn("a")), refit);
        JsonNode expected = check.expected("fits");
        assertThat(timeline.fits()).hasSize(expected.size());
        for (int j = 0; j < expected.size(); j++) {
            FitRecord fit = timeline.fits().get(j);
            assertThat(fit.bar() - 1)
                    .isEqualTo(expected.get(j).get("fit_last_index").asInt());
            assertThat(fit.windowStart())
                    .isEqualTo(prices.dates()
                            .get(expected.get(j).get("fit_first_index").asInt() + 1));
            List<Integer> served = IntStream.range(timeline.firstBar().orElseThrow(), timeline.endBar())
                    .filter(bar -> timeline.fitInForce(bar).orElseThrow() == fit.number())
                    .mapToObj(bar -> bar - 1)
                    .toList();
            assertThat(served)
                    .isEqualTo(IntStream.rangeClosed(
                                    expected.get(j).get("first_decision_index").asInt(),
                                    expected.get(j).get("last_decision_index").asInt())
                            .boxed()
                            .toList());
        }
    }

    @Test
    void barsWithoutAnObservationCountForNothing() {
        Walks.Gappy everyThirdIsMissing = new Walks.Gappy(bar -> bar % 3 == 0);
        RegimeTimeline timeline = Walks.forward(
                Walks.weathers(2, 120, 1), Walks.oneRegime(everyThirdIsMissing), Walks.expanding(20, Walks.every(8)));
        // bars 1 2, 4 5, 7 8, … are observed: the n-th observation, n even, is made on bar 3 n / 2 - 1
        List<Integer> expected = new ArrayList<>();
        for (int n = 20; 3 * n / 2 - 1 < 120; n += 8) {
            expected.add(3 * n / 2 - 1);
        }
        assertThat(Walks.fitBars(timeline)).isEqualTo(expected);
        assertThat(timeline.fits().get(1).fit().observations()).isEqualTo(28);
    }

    @Test
    void aWeekStartsWithTheFirstBarOnOrAfterAMonday() {
        assertPeriodStarts(RefitSchedule.FirstBarOf.WEEK, day -> day.getDayOfWeek() == DayOfWeek.MONDAY);
    }

    @Test
    void aMonthStartsWithTheFirstBarOnOrAfterItsFirstDay() {
        assertPeriodStarts(RefitSchedule.FirstBarOf.MONTH, day -> day.getDayOfMonth() == 1);
    }

    @Test
    void aQuarterStartsWithTheFirstBarOnOrAfterTheFirstOfJanuaryAprilJulyOctober() {
        assertPeriodStarts(
                RefitSchedule.FirstBarOf.QUARTER,
                day -> day.getDayOfMonth() == 1 && (day.getMonthValue() - 1) % 3 == 0);
    }

    @Test
    void isoWeeksRunOnAcrossTheYearsEnd() {
        // ISO 8601: 2004-12-31 and 2005-01-01/02 lie in week 53 of 2004; 2008-12-29 opens week 1 of 2009
        assertThat(due(RefitSchedule.FirstBarOf.WEEK, "2004-12-27", "2004-12-31", "2005-01-02", "2005-01-03"))
                .containsExactly(3);
        assertThat(due(RefitSchedule.FirstBarOf.WEEK, "2008-12-28", "2008-12-29", "2008-12-31", "2009-01-02"))
                .containsExactly(1);
        assertThat(due(RefitSchedule.FirstBarOf.WEEK, "2015-12-28", "2016-01-01", "2016-01-04")) // week 53, then 1
                .containsExactly(2);
        assertThat(due(RefitSchedule.FirstBarOf.WEEK, "2009-12-31", "2010-12-30")) // week 53 of 2009, 52 of 2010
                .containsExactly(1);
    }

    @Test
    void theSamePeriodOfAnotherYearIsAnotherPeriod() {
        assertThat(due(RefitSchedule.FirstBarOf.MONTH, "2001-05-31", "2002-05-02"))
                .containsExactly(1);
        assertThat(due(RefitSchedule.FirstBarOf.QUARTER, "2001-05-31", "2002-05-02"))
                .containsExactly(1);
        assertThat(due(RefitSchedule.FirstBarOf.MONTH, "2001-12-31", "2002-01-02"))
                .containsExactly(1);
        assertThat(due(RefitSchedule.FirstBarOf.QUARTER, "2001-12-31", "2002-01-02"))
                .containsExactly(1);
    }

    @Test
    void theFilesFirstBarStartsNoPeriod() {
        for (RefitSchedule schedule : RefitSchedule.FirstBarOf.values()) {
            assertThat(due(schedule, "2001-01-01", "2001-01-02")).isEmpty(); // a Monday, the first of a quarter
        }
    }

    @Test
    void calendarFitsBeginWithTheFirstPeriodThatHasEnoughObservations() {
        GivenPrices prices = Walks.weathers(3, 150, 1); // from Monday 2001-01-01 on: bar 22 is Wednesday the 31st
        RegimeTimeline timeline = Walks.forward(
                prices, Walks.oneRegime(new LogReturn("a")), Walks.expanding(ENOUGH, RefitSchedule.FirstBarOf.MONTH));
        List<String> fittedOn =
                timeline.fits().stream().map(fit -> fit.fittedOn().toString()).toList();
        assertThat(fittedOn).containsExactly("2001-03-01", "2001-04-02", "2001-05-01", "2001-06-01", "2001-07-02");
    }

    @Test
    void enoughObservationsMeansThoseOfThePeriodsFirstBarToo() {
        GivenPrices prices = Walks.weathers(3, 60, 1); // the 43rd observation is that of 2001-03-01
        RegimeSettings one = Walks.oneRegime(new LogReturn("a"));
        assertThat(Walks.fitBars(Walks.forward(prices, one, Walks.expanding(43, RefitSchedule.FirstBarOf.MONTH))))
                .containsExactly(43);
        assertThat(Walks.fitBars(Walks.forward(prices, one, Walks.expanding(44, RefitSchedule.FirstBarOf.MONTH))))
                .isEmpty();
    }

    @Test
    void aPeriodStartsEvenOnABarThatIsNotObserved() {
        Walks.Gappy gap = new Walks.Gappy(bar -> bar == 43);
        RegimeTimeline timeline = Walks.forward(
                Walks.weathers(3, 60, 1),
                Walks.oneRegime(gap),
                Walks.expanding(ENOUGH, RefitSchedule.FirstBarOf.MONTH));
        assertThat(Walks.fitBars(timeline)).containsExactly(43);
        assertThat(timeline.fits().get(0).fit().observations()).isEqualTo(42);
    }

    /** Against a scan of every calendar day since the bar before, on weekdays with holes of up to three weeks over 20 years. */
    private static void assertPeriodStarts(RefitSchedule schedule, Predicate<LocalDate> opens) {
        List<LocalDate> days = new ArrayList<>();
        for (LocalDate day = LocalDate.of(2000, 1, 3); day.getYear() < 2020; day = day.plusDays(1)) {
            boolean hole = (day.toEpochDay() / 17) % 9 == 0;
            if (day.getDayOfWeek().getValue() < 6 && !hole) {
                days.add(day);
            }
        }
        List<Integer> expected = new ArrayList<>();
        for (int bar = 1; bar < days.size(); bar++) {
            if (days.get(bar - 1)
                    .plusDays(1)
                    .datesUntil(days.get(bar).plusDays(1))
                    .anyMatch(opens)) {
                expected.add(bar);
            }
        }
        assertThat(due(schedule, days.toArray(LocalDate[]::new))).isEqualTo(expected);
    }

    private static List<Integer> due(RefitSchedule schedule, String... days) {
        return due(schedule, List.of(days).stream().map(LocalDate::parse).toArray(LocalDate[]::new));
    }

    private static List<Integer> due(RefitSchedule schedule, LocalDate... days) {
        PriceTable table = GivenPrices.flat(days.length, 1).on(days).table();
        return IntStream.range(0, days.length)
                .filter(bar -> schedule.due(table.knownAt(bar), ENOUGH, true, ENOUGH))
                .boxed()
                .toList();
    }
}
