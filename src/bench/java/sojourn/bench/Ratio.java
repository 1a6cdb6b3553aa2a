package sojourn.bench;

import com.sun.management.OperatingSystemMXBean;
import java.lang.management.ManagementFactory;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.function.IntToDoubleFunction;
import java.util.function.LongSupplier;
import sojourn.regime.EmIterations;
import sojourn.regime.EmissionFamily;
import sojourn.walk.RegimeTimeline;

/**
 * Prints CPU time, warm, of one EM iteration by observation, of a whole walk, and of one rule by bar. The series is the file named by
 * {@code $RATIO_CSV}, the number of states of the EM iteration {@code $RATIO_K}; arguments choose among em, walk and rule.
 */
final class Ratio {
    private static final int ROUNDS = 7;
    private static volatile double sink;

    private Ratio() {}

    /** Measures and prints. */
    public static void main(String[] arguments) {
        List<String> wanted = arguments.length == 0 ? List.of("em", "walk", "rule") : List.of(arguments);
        double[] values = Series.read(Path.of(variable("RATIO_CSV")));
        if (wanted.contains("em")) {
            iteration(values, Integer.parseInt(variable("RATIO_K")));
        }
        if (wanted.contains("walk") || wanted.contains("rule")) {
            job(values, wanted);
        }
    }

    private static void iteration(double[] values, int states) {
        EmIterations em = EmIterations.of(values, EmissionFamily.NORMAL, states);
        int each = 2_000_000 / em.rows() + 1;
        double nanoseconds = median(round -> sink = em.run(each), ownThread(), ROUNDS);
        print("ns_per_obs_iter", nanoseconds / each / em.rows());
    }

    private static void job(double[] values, List<String> wanted) {
        Job job = new Job(values);
        RegimeTimeline timeline = job.walk();
        if (wanted.contains("walk")) {
            double nanoseconds = median(round -> job.walk().endBar(), wholeProcess(), 3);
            print("walk_cpu_s", nanoseconds / 1e9);
        }
        if (wanted.contains("rule")) {
            int each = 1_000_000 / job.bars() + 1;
            IntToDoubleFunction variants = round -> {
                double sum = 0;
                for (int v = 0; v < each; v++) {
                    sum += job.trade(timeline, 0.5 + 0.4 * v / each).size();
                }
                return sum;
            };
            double nanoseconds = median(variants, ownThread(), ROUNDS);
            double bars = variants.applyAsDouble(0);
            print("rule_ns_per_day", nanoseconds / bars);
        }
    }

    /** The median time of so many rounds, after as many to warm up. */
    private static double median(IntToDoubleFunction work, LongSupplier clock, int rounds) {
        double[] times = new double[rounds];
        for (int round = -rounds; round < rounds; round++) {
            long before = clock.getAsLong();
            sink = work.applyAsDouble(round);
            times[Math.max(0, round)] = clock.getAsLong() - before;
        }
        Arrays.sort(times);
        return times[rounds / 2];
    }

    private static LongSupplier ownThread() {
        return ManagementFactory.getThreadMXBean()::getCurrentThreadCpuTime;
    }

    /** The collector's threads included. */
    private static LongSupplier wholeProcess() {
        return ManagementFactory.getPlatformMXBean(OperatingSystemMXBean.class)::getProcessCpuTime;
    }

    private static String variable(String name) {
        String value = System.getenv(name);
        if (value == null) {
            throw new IllegalArgumentException("set " + name);
        }
        return value;
    }

    private static void print(String name, double value) {
        System.out.println(name + "=" + String.format(Locale.ROOT, "%.4f", value));
    }
}
