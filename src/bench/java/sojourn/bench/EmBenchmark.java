package sojourn.bench;

import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;
import sojourn.numeric.RandomStream;
import sojourn.regime.EmIterations;
import sojourn.regime.EmissionFamily;

/** Ten EM iterations on invented returns with calm and stormy weather. */
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
@State(Scope.Thread)
@Fork(1)
@Warmup(iterations = 5, time = 1)
@Measurement(iterations = 5, time = 1)
public class EmBenchmark {
    private static final int ITERATIONS = 10;

    /** Number of states. */
    @Param({"2", "3", "4", "6"})
    public int states;

    /** Number of observations. */
    @Param({"5000", "20000"})
    public int rows;

    /** Distribution within a state. */
    @Param({"normal", "student-t"})
    public String emission;

    private EmIterations em;

    /** Invents the series. */
    @Setup
    public void invent() {
        RandomStream random = RandomStream.of(1, "benchmark");
        double[] values = new double[rows];
        boolean stormy = false;
        for (int t = 0; t < rows; t++) {
            stormy = random.nextDouble() < 0.02 != stormy;
            values[t] = random.nextNormal() * (stormy ? 0.02 : 0.007);
        }
        EmissionFamily family = EmissionFamily.values().stream()
                .filter(each -> each.word().equals(emission))
                .findFirst()
                .orElseThrow();
        em = EmIterations.of(values, family, states);
    }

    /** Expectation and maximisation steps. */
    @Benchmark
    public double iterations() {
        return em.run(ITERATIONS);
    }
}
