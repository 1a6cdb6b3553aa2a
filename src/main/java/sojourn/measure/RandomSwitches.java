package sojourn.measure;

import java.util.Collections;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;

/**
 * Where a strategy falls among draws that change what is held as often and for as long as it did, at random times.
 *
 * @param draws how many
 * @param how what was put in another order, a sentence
 * @param figures by measure
 */
public record RandomSwitches(int draws, String how, Map<Measure, Luck> figures) {
    /** The measures that are told; of each, higher is better. */
    public static final List<Measure> MEASURES =
            List.of(Measure.WORST_DRAWDOWN, Measure.GROWTH_PER_YEAR, Measure.SHARPE);

    /** Copies the map. */
    public RandomSwitches {
        figures = Collections.unmodifiableMap(new EnumMap<>(figures));
    }

    /** From the measures of the strategy and of each draw. */
    public static RandomSwitches of(String how, Map<Measure, Measured> own, List<Map<Measure, Measured>> draws) {
        Map<Measure, Luck> figures = new EnumMap<>(Measure.class);
        for (Measure measure : MEASURES) {
            List<Measured> drawn = draws.stream()
                    .map(draw -> draw.getOrDefault(measure, NOT_ASKED))
                    .toList();
            figures.put(measure, Luck.of(own.getOrDefault(measure, NOT_ASKED), drawn));
        }
        return new RandomSwitches(draws.size(), how, figures);
    }

    private static final Measured NOT_ASKED = Measured.undefined(Measured.Reason.NOT_RECORDED, "it was not measured");
}
