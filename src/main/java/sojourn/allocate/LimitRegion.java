package sojourn.allocate;

import java.util.Arrays;
import java.util.Optional;
import java.util.OptionalDouble;
import sojourn.numeric.QuadraticProgramme;
import sojourn.numeric.QuadraticProgramme.HalfSpace;

/**
 * Weights within {@link Limits}, perhaps of a stated sum, as half-spaces: each weight at least low and at most high; the sum of
 * absolute weights at most gross, which is s'w at most gross for every s of signs, so that the s of w's own signs is the one
 * that matters; the sum as stated, from both sides.
 */
record LimitRegion(Limits limits, OptionalDouble sum) implements QuadraticProgramme.Region {
    /** How far from a bound a weight still counts as standing on it. */
    private static final double ON_BOUND = 1e-12;

    @Override
    public Optional<HalfSpace> mostViolated(double[] w, double slack) {
        double worst = slack;
        Optional<HalfSpace> found = Optional.empty();
        double gross = 0;
        double net = 0;
        for (int i = 0; i < w.length; i++) {
            gross += Math.abs(w[i]);
            net += w[i];
            double beyond = Math.max(limits.low() - w[i], w[i] - limits.high());
            if (beyond > worst) {
                worst = beyond;
                found = Optional.of(bound(w, i));
            }
        }
        double root = Math.sqrt(w.length); // the length of a normal of signs
        if ((gross - limits.gross()) / root > worst) {
            worst = (gross - limits.gross()) / root;
            found = Optional.of(grossly(w));
        }
        if (sum.isPresent() && Math.abs(net - sum.getAsDouble()) / root > worst) {
            found = Optional.of(summing(w.length, net < sum.getAsDouble() ? 1 : -1));
        }
        return found;
    }

    private HalfSpace bound(double[] w, int asset) {
        double[] normal = new double[w.length];
        boolean below = w[asset] < limits.low();
        normal[asset] = below ? 1 : -1;
        return HalfSpace.atLeast(below ? limits.low() : -limits.high(), normal);
    }

    private HalfSpace grossly(double[] w) {
        double[] normal = new double[w.length];
        for (int i = 0; i < normal.length; i++) {
            normal[i] = w[i] < 0 ? 1 : -1;
        }
        return HalfSpace.atLeast(-limits.gross(), normal);
    }

    private HalfSpace summing(int assets, int sign) {
        double[] normal = new double[assets];
        Arrays.fill(normal, sign);
        return HalfSpace.atLeast(sign * sum.orElseThrow(), normal);
    }

    /** {@code weight} without the rounding that keeps it off a bound, or off 0. */
    double settled(double weight) {
        for (double bound : new double[] {0, limits.low(), limits.high()}) {
            if (Math.abs(weight - bound) <= ON_BOUND) {
                return bound;
            }
        }
        return weight;
    }
}
