package sojourn.evidence;

import sojourn.numeric.RandomStream;
import sojourn.regime.Emission;
import sojourn.regime.RegimeModel;
import sojourn.regime.StudentT;

/**
 * Observations drawn from a model, the first of several: the first regime from its long run, the next from the chain, each the least k whose cumulated
 * probability lies above a uniform. Student's t by U, V uniform: sqrt(nu (U^{-2/nu} - 1)) cos(2 pi V), Bailey (1994), Mathematics of Computation 62, 779-781.
 */
final class DrawnSeries {
    private static final double TWO_PI = 6.283185307179586;

    private DrawnSeries() {}

    /** {@code count} of them. {@code longRun} is not modified. */
    static double[] of(RegimeModel model, double[] longRun, int count, RandomStream random) {
        double[] series = new double[count];
        int regime = 0;
        for (int t = 0; t < count; t++) {
            double u = random.nextDouble();
            double below = 0;
            int next = 0;
            for (int k = 0; k < longRun.length; k++) {
                below += t == 0 ? longRun[k] : model.transition(regime, k);
                next = k;
                if (u < below) {
                    break;
                }
            }
            regime = next;
            series[t] = draw(model.emission(), regime, random);
        }
        return series;
    }

    private static double draw(Emission emission, int regime, RandomStream random) {
        if (emission instanceof StudentT student) {
            double nu = student.degreesOfFreedom(regime);
            double u = 1 - random.nextDouble(); // above 0
            double radius = Math.sqrt(nu * (StrictMath.pow(u, -2 / nu) - 1));
            return student.mean(regime, 0)
                    + student.scale(regime) * radius * StrictMath.cos(TWO_PI * random.nextDouble());
        }
        return emission.mean(regime, 0) + emission.standardDeviation(regime, 0) * random.nextNormal();
    }
}
