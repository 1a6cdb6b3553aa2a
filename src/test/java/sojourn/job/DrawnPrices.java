package sojourn.job;

import java.math.BigDecimal;
import java.math.RoundingMode;
import java.time.DayOfWeek;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;

/** Price files drawn at random from a stated seed: weekdays, calm and stormy spells, four decimals. */
final class DrawnPrices {
    private static final double CALM = 0.006;
    private static final double STORMY = 0.022;
    private static final double LEAVES = 0.02;

    private DrawnPrices() {}

    /** {@code bars} rows from the first weekday at or after {@code start}. */
    static String csv(long seed, int bars, LocalDate start) {
        SplittableRandom random = new SplittableRandom(seed);
        List<String> closes = new ArrayList<>();
        double price = 100;
        boolean storm = false;
        for (int bar = 0; bar < bars; bar++) {
            storm = storm ? random.nextDouble() >= LEAVES : random.nextDouble() < LEAVES;
            double move = random.nextGaussian() * (storm ? STORMY : CALM) + (storm ? -0.001 : 0.0008);
            price *= 1 + move;
            closes.add(BigDecimal.valueOf(price)
                    .setScale(4, RoundingMode.HALF_EVEN)
                    .toPlainString());
        }
        return csv(closes, start);
    }

    static String csv(List<String> closes, LocalDate start) {
        StringBuilder text = new StringBuilder("date,close\n");
        LocalDate date = start;
        for (String close : closes) {
            while (date.getDayOfWeek() == DayOfWeek.SATURDAY || date.getDayOfWeek() == DayOfWeek.SUNDAY) {
                date = date.plusDays(1);
            }
            text.append(date).append(',').append(close).append('\n');
            date = date.plusDays(1);
        }
        return text.toString();
    }

    /** The header and the first {@code bars} rows. */
    static String first(String csv, int bars) {
        return String.join("\n", csv.lines().limit(bars + 1L).toList()) + "\n";
    }
}
