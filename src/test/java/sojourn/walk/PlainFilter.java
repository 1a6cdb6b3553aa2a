package sojourn.walk;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.OptionalDouble;
import sojourn.archive.Table;

/**
 * The filter as textbooks print it, in plain probabilities: p_1 ~ initial(k) f_k(x_1), p_t(k) ~ sum_i p_{t-1}(i) A_ik f_k(x_t),
 * a missing x_t leaving out f. Hamilton (1989), Econometrica 57, 357-384. Parameters come from a row of a table of fits.
 */
final class PlainFilter {
    private final double[] initial;
    private final double[][] transition;
    private final double[] mean;
    private final double[] sd;

    private PlainFilter(double[] initial, double[][] transition, double[] mean, double[] sd) {
        this.initial = initial;
        this.transition = transition;
        this.mean = mean;
        this.sd = sd;
    }

    /** What was known at one bar of a window: the filtered probabilities, and the log density of the bar before it was seen. */
    record Step(List<Double> filtered, OptionalDouble logDensity) {}

    static PlainFilter of(Table fits, int row, List<String> regimes, String observation) {
        int states = regimes.size();
        PlainFilter filter =
                new PlainFilter(new double[states], new double[states][states], new double[states], new double[states]);
        for (int i = 0; i < states; i++) {
            String regime = regimes.get(i);
            filter.initial[i] = number(fits, row, "initial." + regime);
            filter.mean[i] = number(fits, row, "mean." + observation + "." + regime);
            filter.sd[i] = number(fits, row, "sd." + observation + "." + regime);
            for (int j = 0; j < states; j++) {
                filter.transition[i][j] = number(fits, row, "transition." + regime + "." + regimes.get(j));
            }
        }
        return filter;
    }

    static String cell(Table table, int row, String column) {
        return table.rows().get(row).get(table.columns().indexOf(column));
    }

    private static double number(Table table, int row, String column) {
        return Double.parseDouble(cell(table, row, column));
    }

    /** One step a bar; NaN marks a missing observation. */
    List<Step> over(double[] x) {
        List<Step> steps = new ArrayList<>();
        double[] now = initial;
        for (int t = 0; t < x.length; t++) {
            double[] next = t == 0 ? initial.clone() : moved(now);
            OptionalDouble logDensity = OptionalDouble.empty();
            if (!Double.isNaN(x[t])) {
                double density = 0;
                for (int k = 0; k < next.length; k++) {
                    double z = (x[t] - mean[k]) / sd[k];
                    next[k] *= Math.exp(-z * z / 2) / (sd[k] * Math.sqrt(2 * Math.PI));
                    density += next[k];
                }
                for (int k = 0; k < next.length; k++) {
                    next[k] /= density;
                }
                logDensity = OptionalDouble.of(Math.log(density));
            }
            steps.add(new Step(Arrays.stream(next).boxed().toList(), logDensity));
            now = next;
        }
        return steps;
    }

    private double[] moved(double[] now) {
        double[] next = new double[now.length];
        for (int i = 0; i < now.length; i++) {
            for (int j = 0; j < now.length; j++) {
                next[j] += now[i] * transition[i][j];
            }
        }
        return next;
    }
}
