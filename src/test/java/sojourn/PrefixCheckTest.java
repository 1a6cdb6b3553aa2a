package sojourn;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.function.IntFunction;
import org.junit.jupiter.api.Test;
import sojourn.PrefixCheck.Difference;
import sojourn.PrefixCheck.Row;
import sojourn.PrefixCheck.Rows;
import sojourn.numeric.ShortestDecimal;

/** The check itself: it passes what stays, and names the first thing that moves. */
class PrefixCheckTest {
    private static final int SIZE = 10;

    @Test
    void whatDoesNotDependOnTheCutPasses() {
        PrefixCheck check = PrefixCheck.of(rows -> job(rows, bar -> bar / 3.0), SIZE);
        for (int cut = 1; cut <= SIZE; cut++) {
            assertThat(check.difference(cut)).isEmpty();
        }
    }

    @Test
    void theLastBitOfOneCellIsNoticed() {
        IntFunction<Rows> leaky = rows -> job(rows, bar -> bar == 4 && rows < SIZE ? Math.nextUp(0.3) : 0.3);
        PrefixCheck check = PrefixCheck.of(leaky, SIZE);
        assertThat(check.difference(4)).isEmpty();
        assertThat(check.difference(7))
                .contains(new Difference(7, "numbers of 2001-01-05", "value", "0.3", "0.30000000000000004"));
    }

    @Test
    void rowsThatAreMissingOrTooManyAreNoticed() {
        PrefixCheck missing = PrefixCheck.of(rows -> without(job(rows, bar -> bar), rows < SIZE ? rows - 1 : -1), SIZE);
        assertThat(missing.difference(6))
                .contains(new Difference(6, "numbers of 2001-01-06", "", "[2001-01-06, 5.0]", "no row"));
        PrefixCheck tooMany = PrefixCheck.of(rows -> without(job(rows, bar -> bar), rows == SIZE ? 5 : -1), SIZE);
        assertThat(tooMany.difference(6))
                .contains(new Difference(6, "numbers of 2001-01-06", "", "no row", "[2001-01-06, 5.0]"));
        assertThat(tooMany.difference(8).orElseThrow().inCut()).isEqualTo("numbers of 2001-01-06");
    }

    private interface Value {
        double at(int bar);
    }

    private static Rows job(int rows, Value value) {
        List<Row> made = new ArrayList<>();
        for (int bar = 0; bar < rows; bar++) {
            made.add(new Row(
                    "numbers",
                    date(bar),
                    List.of("date", "value"),
                    List.of(date(bar).toString(), ShortestDecimal.of(value.at(bar)))));
        }
        return new Rows(date(rows - 1), made);
    }

    private static Rows without(Rows rows, int bar) {
        return new Rows(
                rows.through(),
                rows.rows().stream()
                        .filter(row -> bar < 0 || !row.knownOn().equals(date(bar)))
                        .toList());
    }

    private static LocalDate date(int bar) {
        return LocalDate.of(2001, 1, 1).plusDays(bar);
    }
}
