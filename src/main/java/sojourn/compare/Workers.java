package sojourn.compare;

import java.util.List;
import java.util.function.Function;

/** Runs plain-data jobs, here or elsewhere; answers come back in the order of the jobs, whatever ran first. */
public interface Workers extends AutoCloseable {
    /**
     * Runs {@code work} on every job. The first failure, in the order of the jobs, is thrown after all have ended.
     *
     * @param <J> a job
     * @param <R> its answer
     */
    <J, R> List<R> run(List<J> jobs, Function<? super J, ? extends R> work);

    /** How many jobs may run at once. */
    int threads();

    @Override
    void close();
}
