package sojourn.compare;

import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;

/**
 * Which variants belong together: those that use a price series in common, by content, directly or through others. They are judged
 * over one window; variants on unrelated markets are not held back by each other.
 */
final class PriceSets {
    private final Map<Run.Traded, Integer> sets = new LinkedHashMap<>();

    private PriceSets() {}

    static PriceSets of(List<Run.Traded> runs) {
        PriceSets found = new PriceSets();
        Map<Integer, Set<String>> series = new LinkedHashMap<>();
        for (Run.Traded run : runs) {
            int own = found.sets.size();
            Set<String> joined = new LinkedHashSet<>(run.ready().usedContents());
            for (int other : List.copyOf(series.keySet())) {
                Set<String> theirs = series.getOrDefault(other, Set.of());
                if (theirs.stream().anyMatch(joined::contains)) {
                    joined.addAll(theirs);
                    found.sets.replaceAll((member, set) -> set == other ? Integer.valueOf(own) : set);
                    series.remove(other);
                }
            }
            found.sets.put(run, own);
            series.put(own, joined);
        }
        return found;
    }

    /** The number of the set a variant belongs to; means nothing but sameness. */
    int of(Run.Traded run) {
        Integer set = sets.get(run);
        if (set == null) {
            throw new IllegalArgumentException("the variant was not among those sorted");
        }
        return set;
    }
}
