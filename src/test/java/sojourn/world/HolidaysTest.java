package sojourn.world;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.LocalDate;
import java.time.MonthDay;
import java.util.Map;
import org.junit.jupiter.api.Test;

class HolidaysTest {
    @Test
    void aDayOfTheYearComesBackEveryYear() {
        Holidays holidays = new Holidays(Map.of("Longest Light", MonthDay.of(6, 21)));
        assertThat(holidays.include(LocalDate.of(2001, 6, 21))).isTrue();
        assertThat(holidays.include(LocalDate.of(2024, 6, 21))).isTrue();
        assertThat(holidays.include(LocalDate.of(2024, 6, 22))).isFalse();
    }

    @Test
    void theLeapDayComesInLeapYearsOnly() {
        Holidays holidays = new Holidays(Map.of("Odd Day", MonthDay.of(2, 29)));
        assertThat(holidays.include(LocalDate.of(2024, 2, 29))).isTrue();
        assertThat(holidays.include(LocalDate.of(2023, 2, 28))).isFalse();
        assertThat(holidays.include(LocalDate.of(2023, 3, 1))).isFalse();
    }

    @Test
    void noneIncludesNothing() {
        assertThat(Holidays.none().include(LocalDate.of(2001, 1, 1))).isFalse();
    }
}
