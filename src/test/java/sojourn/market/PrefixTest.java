package sojourn.market;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/** What was known at a close does not depend on what came later: cutting the series leaves the earlier bars as they were. */
class PrefixTest {
    private static final LocalDate START = LocalDate.of(2019, 11, 20);
    private static final PriceSeries STOCKS = Fixture.invented("stocks", START, 160, 1);
    private static final PriceSeries BONDS = Fixture.invented("bonds", START.plusDays(9), 150, 2);

    @ParameterizedTest
    @EnumSource(BarLength.class)
    void everyCutGivesAPrefixToTheBit(BarLength length) {
        everyCutGivesAPrefix(new Calendar(length, Calendar.Days.COMMON, Calendar.Rows.DAYS));
    }

    @Test
    void everyCutOfAUnionGivesAPrefixToTheBit() {
        everyCutGivesAPrefix(new Calendar(BarLength.DAILY, Calendar.Days.UNION, Calendar.Rows.DAYS));
    }

    private static void everyCutGivesAPrefix(Calendar calendar) {
        List<List<Long>> whole = bits(Market.of(List.of(STOCKS, BONDS), calendar, rates(STOCKS.last())));
        int tables = 0;
        int bars = 0;
        for (LocalDate cut = BONDS.first(); !cut.isAfter(STOCKS.last()); cut = cut.plusDays(1)) {
            PriceSeries stocks = STOCKS.upTo(cut).orElseThrow();
            PriceSeries bonds = BONDS.upTo(cut).orElseThrow();
            CashRates rates = rates(cut);
            List<List<Long>> part = new ArrayList<>();
            List<String> faults =
                    Fixture.faults(() -> part.addAll(bits(Market.of(List.of(stocks, bonds), calendar, rates))));
            assertThat(faults).as("faults at %s", cut).hasSizeLessThanOrEqualTo(bars >= 2 ? 0 : 1);
            if (faults.isEmpty()) {
                assertThat(part).as("cut at %s", cut).isEqualTo(whole.subList(0, part.size()));
                assertThat(part.size()).isGreaterThanOrEqualTo(bars);
                bars = part.size();
                tables++;
            }
        }
        assertThat(bars).isEqualTo(whole.size());
        assertThat(tables).isGreaterThan(100);
    }

    @Test
    void aCutFileGivesAPrefix() {
        StringBuilder text = new StringBuilder("date,close,open\n");
        for (int row = 0; row < 40; row++) {
            text.append(STOCKS.dates().get(row)).append(',').append(STOCKS.close(row));
            text.append(row % 7 == 0 ? ",\n" : "," + STOCKS.close(row) + "\n");
        }
        List<String> lines = text.toString().lines().toList();
        PriceSeries whole = read(lines);
        for (int end = 2; end <= lines.size(); end++) {
            PriceSeries part = read(lines.subList(0, end));
            assertThat(part.dates()).isEqualTo(whole.dates().subList(0, end - 1));
            assertThat(part.digest())
                    .isEqualTo(whole.upTo(part.last()).orElseThrow().digest());
        }
    }

    private static PriceSeries read(List<String> lines) {
        TextFile text = new TextFile("stocks.csv", String.join("\n", lines), "");
        Faults faults = new Faults("prices of 'stocks'");
        return PriceFile.read(
                        "stocks",
                        text,
                        PriceSource.of("stocks.csv"),
                        SeriesKind.PRICES,
                        BarLength.DAILY,
                        faults,
                        new ArrayList<>())
                .orElseThrow();
    }

    /** A rate every third day, and its changes; nothing dated after {@code last}. */
    private static CashRates rates(LocalDate last) {
        List<LocalDate> dates = new ArrayList<>();
        for (LocalDate date = START; !date.isAfter(last); date = date.plusDays(3)) {
            dates.add(date);
        }
        double[] percent = new double[dates.size()];
        for (int i = 0; i < percent.length; i++) {
            percent[i] = 1 + 0.01 * i;
        }
        return CashRates.dated(dates, percent, DayCount.ACTUAL_360);
    }

    /** Everything that a bar shows, as raw bits. */
    private static List<List<Long>> bits(Market market) {
        PriceTable table = market.table();
        List<List<Long>> rows = new ArrayList<>();
        for (int bar = 0; bar < table.size(); bar++) {
            Known known = table.knownAt(bar);
            List<Long> row = new ArrayList<>();
            row.add(known.date().toEpochDay());
            row.add(Double.doubleToRawLongBits(known.cashReturn(bar)));
            row.add(Double.doubleToRawLongBits(known.expectedCashReturn()));
            row.add(Double.doubleToRawLongBits(table.fillPrices().cashReturn(bar)));
            for (int asset = 0; asset < 2; asset++) {
                row.add(Double.doubleToRawLongBits(known.close(asset, bar)));
                row.add(known.carried(asset, bar) ? 1L : 0L);
                row.add(bits(known.open(asset, bar)));
                row.add(bits(known.high(asset, bar)));
                row.add(bits(known.low(asset, bar)));
                row.add(bits(known.volume(asset, bar)));
            }
            rows.add(row);
        }
        return rows;
    }

    private static long bits(OptionalDouble value) {
        return Double.doubleToRawLongBits(value.orElse(-1));
    }
}
