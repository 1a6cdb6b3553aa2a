package sojourn.compare;

import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.function.Function;

/** Workers that are threads of this process. */
public final class LocalWorkers implements Workers {
    private final int threads;
    private final ExecutorService pool;

    /** With so many threads, at least 1. */
    public LocalWorkers(int threads) {
        this.threads = threads;
        this.pool = Executors.newFixedThreadPool(threads, task -> {
            Thread thread = new Thread(task, "sojourn-worker");
            thread.setDaemon(true);
            return thread;
        });
    }

    @Override
    public <J, R> List<R> run(List<J> jobs, Function<? super J, ? extends R> work) {
        List<Future<R>> running = new ArrayList<>(jobs.size());
        for (J job : jobs) {
            running.add(pool.submit(() -> work.apply(job)));
        }
        List<R> answers = new ArrayList<>(jobs.size());
        RuntimeException failure = null;
        for (Future<R> one : running) {
            try {
                answers.add(one.get());
            } catch (ExecutionException e) {
                failure = failure == null ? unwrapped(e) : failure;
            } catch (InterruptedException e) {
                Thread.currentThread().interrupt();
                running.forEach(future -> future.cancel(true));
                throw new IllegalStateException("interrupted while waiting for a job", e);
            }
        }
        if (failure != null) {
            throw failure;
        }
        return answers;
    }

    @Override
    public int threads() {
        return threads;
    }

    @Override
    public void close() {
        pool.shutdownNow();
    }

    /** What a job threw: an error of the machine goes on as it is, an exception is given back to be thrown. */
    static RuntimeException unwrapped(ExecutionException e) {
        Throwable cause = e.getCause();
        if (cause instanceof Error error) {
            throw error;
        }
        return cause instanceof RuntimeException runtime ? runtime : new IllegalStateException("a job failed", cause);
    }
}
