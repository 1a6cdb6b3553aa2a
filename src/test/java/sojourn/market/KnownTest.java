package sojourn.market;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.lang.reflect.InvocationTargetException;
import java.lang.reflect.Method;
import java.lang.reflect.Modifier;
import java.time.LocalDate;
import java.util.Arrays;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

class KnownTest {
    private static final PriceSeries SERIES = Fixture.invented("stocks", LocalDate.of(2020, 1, 1), 20, 3);
    private static final PriceTable TABLE = Market.of(
                    List.of(SERIES), Calendar.DAILY, CashRates.constant(2, DayCount.ACTUAL_365))
            .table();
    private static final int NOW = 12;

    /** Every public method that takes a bar; the bar is its last argument, what stands before it is an asset, or a series by its name. */
    static Stream<Method> methodsThatTakeABar() {
        return Arrays.stream(Known.class.getDeclaredMethods())
                .filter(method -> Modifier.isPublic(method.getModifiers()))
                .filter(method -> method.getParameterCount() > 0);
    }

    @Test
    void theMethodsThatTakeABarAreThese() {
        assertThat(methodsThatTakeABar().map(Method::getName))
                .containsExactlyInAnyOrder(
                        "at",
                        "date",
                        "close",
                        "close",
                        "closes",
                        "carried",
                        "carried",
                        "ownCloses",
                        "open",
                        "high",
                        "low",
                        "volume",
                        "cashReturn",
                        "given");
    }

    @ParameterizedTest
    @MethodSource("methodsThatTakeABar")
    void aLaterBarIsRefused(Method method) throws ReflectiveOperationException {
        Known known = TABLE.knownAt(NOW);
        assertThat(method.invoke(known, arguments(method, NOW))).isNotNull();
        for (int later : new int[] {NOW + 1, TABLE.size() - 1, TABLE.size(), Integer.MAX_VALUE, -1}) {
            assertThatThrownBy(() -> method.invoke(known, arguments(method, later)))
                    .isInstanceOf(InvocationTargetException.class)
                    .cause()
                    .isInstanceOf(IndexOutOfBoundsException.class)
                    .hasMessage("bar " + later + " is not known at the close of bar 12");
        }
    }

    @ParameterizedTest
    @MethodSource("methodsThatTakeABar")
    void whatWasKnownEarlierStaysHidden(Method method) {
        Known earlier = TABLE.knownAt(NOW).at(5);
        assertThat(earlier.bar()).isEqualTo(5);
        assertThatThrownBy(() -> method.invoke(earlier, arguments(method, 6)))
                .cause()
                .hasMessage("bar 6 is not known at the close of bar 5");
    }

    @Test
    void closesEndAtTheKnownBarAndAreACopy() {
        Known known = TABLE.knownAt(NOW);
        double[] closes = known.closes(0, 3);
        assertThat(closes).hasSize(NOW - 3 + 1);
        assertThat(closes[closes.length - 1]).isEqualTo(known.close(0, NOW));
        closes[0] = -1;
        assertThat(known.close(0, 3)).isPositive();
    }

    @Test
    void thereIsNoCloseBeyondTheTable() {
        assertThatThrownBy(() -> TABLE.knownAt(TABLE.size())).isInstanceOf(IndexOutOfBoundsException.class);
        assertThatThrownBy(() -> TABLE.knownAt(-1)).isInstanceOf(IndexOutOfBoundsException.class);
    }

    private static Object[] arguments(Method method, int bar) {
        Object[] arguments = new Object[method.getParameterCount()];
        Arrays.fill(arguments, 0);
        if (method.getParameterTypes()[0] == String.class) {
            arguments[0] = "stocks";
        }
        arguments[arguments.length - 1] = bar;
        return arguments;
    }
}
