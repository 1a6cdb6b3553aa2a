package sojourn.walk;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.charset.StandardCharsets;
import java.time.LocalDate;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import org.junit.jupiter.api.Test;
import sojourn.GivenPrices;

/** An address stands for settings, dates, closes, what is observed besides, and cash rates; and for nothing else. */
class TimelineAddressTest {
    private static final int BARS = 60;
    private static final byte[] SETTINGS = "{\"refit\":{\"every\":21}}".getBytes(StandardCharsets.UTF_8);
    private static final List<Observation> RETURNS = List.of(new LogReturn("a"));

    @Test
    void theSameInputsHaveTheSameAddress() {
        assertThat(address(prices())).isEqualTo(address(prices())).matches("[0-9a-f]{16}");
    }

    @Test
    void opensAreNotWalkedAndDoNotCount() {
        double[][] other = new double[2][BARS];
        for (int bar = 0; bar < BARS; bar++) {
            other[0][bar] = 1 + bar;
            other[1][bar] = 2 + bar;
        }
        assertThat(address(prices().withOpens(other))).isEqualTo(address(prices()));
    }

    @Test
    void otherSettingsHaveAnotherAddress() {
        byte[] other = SETTINGS.clone();
        other[other.length - 3] ^= 1;
        assertThat(TimelineAddress.of(other, prices().table(), RETURNS)).isNotEqualTo(address(prices()));
    }

    @Test
    void aDateALongerHistoryOrAnotherCashRateChangesIt() {
        GivenPrices prices = prices();
        LocalDate[] days = prices.dates().toArray(LocalDate[]::new);
        days[BARS - 1] = days[BARS - 1].plusDays(1);
        double[] cash = new double[BARS];
        cash[30] = Double.MIN_VALUE;
        Set<String> addresses = new HashSet<>();
        addresses.add(address(prices));
        addresses.add(address(prices.on(days)));
        addresses.add(address(prices.withCash(cash)));
        addresses.add(address(prices.first(BARS - 1)));
        addresses.add(address(closesOf(prices, new int[] {1, 0})));
        addresses.add(address(closesOf(prices, new int[] {0})));
        assertThat(addresses).hasSize(6);
    }

    @Test
    void anEarlierAddressIsThatOfTheShorterHistory() {
        GivenPrices prices = prices();
        for (int bar = 0; bar < BARS; bar++) {
            assertThat(TimelineAddress.at(SETTINGS, prices.table(), RETURNS, bar))
                    .isEqualTo(address(prices.first(bar + 1)));
        }
    }

    @Test
    void oneBitOfOneCloseChangesItFromThatBarOn() {
        GivenPrices prices = prices();
        for (int changed : new int[] {0, 1, 29, BARS - 1}) {
            double[][] closes = closes(prices, new int[] {0, 1});
            closes[1][changed] = Math.nextUp(closes[1][changed]);
            GivenPrices other = GivenPrices.closes(closes);
            for (int bar = 0; bar < BARS; bar++) {
                boolean same = TimelineAddress.at(SETTINGS, other.table(), RETURNS, bar)
                        .equals(TimelineAddress.at(SETTINGS, prices.table(), RETURNS, bar));
                assertThat(same).isEqualTo(bar < changed);
            }
        }
    }

    private static String address(GivenPrices prices) {
        return TimelineAddress.of(SETTINGS, prices.table(), RETURNS);
    }

    private static GivenPrices prices() {
        return closesOf(Walks.weathers(61, BARS, 2), new int[] {0, 1});
    }

    private static GivenPrices closesOf(GivenPrices prices, int[] assets) {
        return GivenPrices.closes(closes(prices, assets));
    }

    private static double[][] closes(GivenPrices prices, int[] assets) {
        double[][] closes = new double[assets.length][BARS];
        for (int i = 0; i < assets.length; i++) {
            for (int bar = 0; bar < BARS; bar++) {
                closes[i][bar] = prices.close(assets[i], bar);
            }
        }
        return closes;
    }
}
