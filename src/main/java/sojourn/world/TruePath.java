package sojourn.world;

import java.time.DayOfWeek;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import sojourn.numeric.RandomStream;

/** Draws the trading days of a world and the true state of each: a semi-Markov chain that counts trading days. */
final class TruePath {
    private TruePath() {}

    /** The trading days and their states; the first stay begins on the first day, the last is cut off at the end. */
    static WorldTruth draw(World world) {
        List<LocalDate> days = tradingDays(world);
        List<String> names = world.stateNames();
        RandomStream random = RandomStream.of(world.seed(), "world-stays");
        int[] path = new int[days.size()];
        String state = world.startsIn();
        int bar = 0;
        while (bar < path.length) {
            HiddenState now = world.state(state);
            int end = Math.min(path.length, bar + now.stay().draw(random));
            while (bar < end) {
                path[bar++] = names.indexOf(state);
            }
            state = successor(now.then(), random.nextDouble());
        }
        return WorldTruth.of(names, days, path);
    }

    private static List<LocalDate> tradingDays(World world) {
        LocalDate end = world.firstDay().plusYears(world.years());
        List<LocalDate> days = new ArrayList<>();
        for (LocalDate day = world.firstDay(); day.isBefore(end); day = day.plusDays(1)) {
            boolean weekend = day.getDayOfWeek() == DayOfWeek.SATURDAY || day.getDayOfWeek() == DayOfWeek.SUNDAY;
            if (!weekend && !world.holidays().include(day)) {
                days.add(day);
            }
        }
        return days;
    }

    /** By inverse distribution function; the last with a positive probability takes what rounding left over. */
    private static String successor(Map<String, Double> then, double u) {
        double below = 0;
        String chosen = "";
        for (Map.Entry<String, Double> next : then.entrySet()) {
            if (next.getValue() > 0 && (chosen.isEmpty() || u >= below)) {
                chosen = next.getKey();
                below += next.getValue();
            }
        }
        return chosen;
    }
}
