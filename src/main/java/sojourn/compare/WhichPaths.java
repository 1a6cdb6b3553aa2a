package sojourn.compare;

import java.util.List;

/** Which variants of a comparison get a folder of their own; the table, digests and timelines are always whole. */
public final class WhichPaths {
    private static final int ALL_UP_TO = 20;
    private static final int BEST = 10;

    private final int upTo;
    private final int beyond;

    private WhichPaths(int upTo, int beyond) {
        this.upTo = upTo;
        this.beyond = beyond;
    }

    /** All of up to 20 variants, the best 10 of more. */
    public static WhichPaths byDefault() {
        return new WhichPaths(ALL_UP_TO, BEST);
    }

    /** All. */
    public static WhichPaths all() {
        return new WhichPaths(Integer.MAX_VALUE, Integer.MAX_VALUE);
    }

    /** The best so many; 0 for none. */
    public static WhichPaths best(int count) {
        return new WhichPaths(count, count);
    }

    /** Those of the variants, best first, that get a folder. */
    <T> List<T> of(List<T> ranked) {
        return ranked.size() <= upTo ? ranked : ranked.subList(0, Math.min(beyond, ranked.size()));
    }
}
