package sojourn.compare;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;

import java.util.List;
import java.util.Queue;
import java.util.concurrent.ConcurrentLinkedQueue;
import java.util.concurrent.CountDownLatch;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

class LocalWorkersTest {
    @Test
    void answersComeInTheOrderOfTheJobsWhateverEndsFirst() {
        CountDownLatch second = new CountDownLatch(1);
        try (LocalWorkers workers = new LocalWorkers(2)) {
            List<Integer> answers = workers.run(List.of(1, 2), job -> {
                if (job == 1) {
                    await(second);
                } else {
                    second.countDown();
                }
                return 10 * job;
            });
            assertThat(answers).containsExactly(10, 20);
        }
    }

    @Test
    void theFirstFailureInTheOrderOfTheJobsIsThrownAfterAllHaveEnded() {
        Queue<Integer> ended = new ConcurrentLinkedQueue<>();
        List<Integer> jobs = IntStream.range(0, 20).boxed().toList();
        try (LocalWorkers workers = new LocalWorkers(4)) {
            assertThatIllegalArgumentException()
                    .isThrownBy(() -> workers.run(jobs, job -> {
                        ended.add(job);
                        if (job % 7 == 3) {
                            throw new IllegalArgumentException("job " + job);
                        }
                        return job;
                    }))
                    .withMessage("job 3");
            assertThat(ended).containsExactlyInAnyOrderElementsOf(jobs);
        }
    }

    @Test
    void noJobsNoAnswers() {
        try (LocalWorkers workers = new LocalWorkers(1)) {
            assertThat(workers.run(List.<Integer>of(), job -> job)).isEmpty();
            assertThat(workers.threads()).isEqualTo(1);
        }
    }

    private static void await(CountDownLatch latch) {
        try {
            latch.await();
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
            throw new IllegalStateException(e);
        }
    }
}
