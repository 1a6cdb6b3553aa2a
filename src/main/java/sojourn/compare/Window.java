package sojourn.compare;

import java.time.LocalDate;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import sojourn.market.TimeAxis;
import sojourn.measure.JudgeSettings;
import sojourn.trade.Track;

/**
 * The bars over which a variant is judged: {@code base} is the bar whose close is the starting point, the first return is that of
 * the bar after it.
 *
 * @param base bar of the price table
 * @param last bar of the price table, after {@code base}
 */
record Window(int base, int last) {
    /**
     * The windows of all variants that traded. Variants of one price set share one: from the latest first fill among them
     * to the earliest last bar. A window stated by a variant replaces that, within what the variant traded. A variant whose
     * window holds no return is left out.
     */
    static Map<Run.Traded, Window> of(List<Run.Traded> runs) {
        PriceSets sets = PriceSets.of(runs);
        Map<Integer, LocalDate> from = new LinkedHashMap<>();
        Map<Integer, LocalDate> to = new LinkedHashMap<>();
        for (Run.Traded run : runs) {
            int set = sets.of(run);
            from.merge(set, firstFill(run), (a, b) -> a.isAfter(b) ? a : b);
            to.merge(set, axis(run).date(run.track().lastBar()), (a, b) -> a.isBefore(b) ? a : b);
        }
        Map<Run.Traded, Window> windows = new LinkedHashMap<>();
        for (Run.Traded run : runs) {
            int set = sets.of(run);
            Optional<JudgeSettings.Window> stated =
                    run.file().strategy().judge().window();
            LocalDate first =
                    stated.flatMap(JudgeSettings.Window::from).orElseGet(() -> Objects.requireNonNull(from.get(set)));
            LocalDate last =
                    stated.flatMap(JudgeSettings.Window::to).orElseGet(() -> Objects.requireNonNull(to.get(set)));
            between(run, first, last).ifPresent(window -> windows.put(run, window));
        }
        return windows;
    }

    /** Whether a track still has wealth to begin the window with; growth from nothing is undefined. */
    boolean beginsAlive(Track track) {
        return track.wealth(base) > 0;
    }

    private static Optional<Window> between(Run.Traded run, LocalDate from, LocalDate to) {
        TimeAxis axis = axis(run);
        Track track = run.track();
        int base = firstFillBar(track);
        while (base <= track.lastBar() && axis.date(base).isBefore(from)) {
            base++;
        }
        int last = track.lastBar();
        while (last > base && axis.date(last).isAfter(to)) {
            last--;
        }
        return last > base && !axis.date(last).isAfter(to) ? Optional.of(new Window(base, last)) : Optional.empty();
    }

    private static LocalDate firstFill(Run.Traded run) {
        return axis(run).date(firstFillBar(run.track()));
    }

    /** A rule that keeps to cash from the start has no fill; its first decision stands for it. */
    private static int firstFillBar(Track track) {
        return track.firstFill().orElse(track.firstBar());
    }

    private static TimeAxis axis(Run.Traded run) {
        return run.ready().market().table().fillPrices().axis();
    }
}
