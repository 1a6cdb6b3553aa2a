package sojourn.regime;

import java.util.ArrayList;
import java.util.List;
import java.util.function.Supplier;

/** Runs the starts of a fit. A caller may use threads: starts share nothing and the result does not depend on when each ran. */
public interface StartRunner {
    /** The results of all starts, in the order of the starts. */
    <T> List<T> run(List<Supplier<T>> starts);

    /** One after the other, in the calling thread. */
    static StartRunner sequential() {
        return new StartRunner() {
            @Override
            public <T> List<T> run(List<Supplier<T>> starts) {
                List<T> results = new ArrayList<>();
                for (Supplier<T> start : starts) {
                    results.add(start.get());
                }
                return results;
            }
        };
    }
}
