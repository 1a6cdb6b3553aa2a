package sojourn.compare;

import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.function.Supplier;
import sojourn.regime.StartRunner;

/** Runs the starts of a fit on threads of their own; results come in the order of the starts. */
final class ThreadedStarts implements StartRunner, AutoCloseable {
    private final ExecutorService pool;

    ThreadedStarts(int threads) {
        this.pool = Executors.newFixedThreadPool(threads, task -> {
            Thread thread = new Thread(task, "sojourn-start");
            thread.setDaemon(true);
            return thread;
        });
    }

    @Override
    public void close() {
        pool.shutdownNow();
    }

    @Override
    public <T> List<T> run(List<Supplier<T>> starts) {
        List<Future<T>> running = new ArrayList<>(starts.size());
        for (Supplier<T> start : starts) {
            running.add(pool.submit(start::get));
        }
        List<T> results = new ArrayList<>(starts.size());
        for (Future<T> one : running) {
            try {
                results.add(one.get());
            } catch (ExecutionException e) {
                throw LocalWorkers.unwrapped(e);
            } catch (InterruptedException e) {
                Thread.currentThread().interrupt();
                throw new IllegalStateException("interrupted while waiting for a start", e);
            }
        }
        return results;
    }
}
