package sojourn.allocate;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import sojourn.numeric.Cholesky;
import sojourn.numeric.QuadraticProgramme;
import sojourn.walk.Forecast;

/**
 * The weights of some assets that minimise risk w'Cov w/2 - c'w within the limits. Undefined where Cov has no inverse, which it is
 * said to have none of if an asset's variance that the assets before it leave unexplained is below {@value #UNEXPLAINED} of its
 * own: weights would then be rounding errors.
 */
final class Optimum {
    private static final double UNEXPLAINED = 1e-12;

    private final List<String> assets;
    private final int[] chosen;
    private final LimitRegion region;

    /**
     * Among {@code names}, which are some of {@code assets}.
     *
     * @param sum what the weights must add up to; empty if they need not
     */
    Optimum(List<String> names, List<String> assets, Limits limits, OptionalDouble sum) {
        this.assets = List.copyOf(assets);
        this.chosen = names.stream().mapToInt(assets::indexOf).toArray();
        this.region = new LimitRegion(limits, sum);
    }

    /** Indices of the assets among all. */
    int[] chosen() {
        return chosen.clone();
    }

    /** Weights of all assets; those that are not among the chosen get 0. {@code linear} is c, one a chosen asset, not modified. */
    Wish of(Forecast forecast, double risk, double[] linear) {
        int n = chosen.length;
        double[] quadratic = new double[n * n];
        for (int i = 0; i < n; i++) {
            for (int j = 0; j < n; j++) {
                quadratic[i * n + j] = risk * forecast.covariance(chosen[i], chosen[j]);
            }
        }
        Optional<Cholesky> factor = Cholesky.of(quadratic, n).filter(one -> regular(one, quadratic));
        if (factor.isEmpty()) {
            return Wish.Undefined.because("the forecast covariance of " + String.join(", ", names())
                    + " has no inverse: one of them hardly moves on its own beyond the others");
        }
        Optional<double[]> found = QuadraticProgramme.minimum(factor.get(), linear, region);
        return found.isEmpty()
                ? Wish.Undefined.because("the search for the best weights of " + String.join(", ", names())
                        + " within the limits did not end")
                : weights(found.get());
    }

    private static boolean regular(Cholesky factor, double[] matrix) {
        int n = factor.size();
        for (int i = 0; i < n; i++) {
            if (!(factor.at(i, i) * factor.at(i, i) > UNEXPLAINED * matrix[i * n + i])) {
                return false;
            }
        }
        return true;
    }

    private Weights weights(double[] found) {
        double[] weights = new double[assets.size()];
        for (int i = 0; i < found.length; i++) {
            weights[chosen[i]] = region.settled(found[i]);
        }
        return Weights.of(weights);
    }

    private List<String> names() {
        List<String> names = new ArrayList<>();
        for (int asset : chosen) {
            names.add(assets.get(asset));
        }
        return names;
    }
}
