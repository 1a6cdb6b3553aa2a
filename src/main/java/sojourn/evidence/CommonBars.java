package sojourn.evidence;

import java.util.List;
import java.util.Map;
import java.util.Optional;

/** The bars on which all of some series have a number, so that they are compared over the same ones. */
final class CommonBars {
    private CommonBars() {}

    static int[] of(List<PerBar> series) {
        return series.get(0).where(bar -> series.stream().allMatch(one -> one.has(bar)));
    }

    static <K, T> T required(Map<K, T> byName, K name) {
        return Optional.ofNullable(byName.get(name))
                .orElseThrow(() -> new IllegalArgumentException(name + " is not among " + byName.keySet()));
    }
}
