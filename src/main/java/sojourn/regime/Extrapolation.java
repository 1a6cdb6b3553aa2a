package sojourn.regime;

/**
 * Extrapolates two EM steps: with r the first step and v the second minus the first, the stride is |r| / |v| and the point
 * theta0 + 2 stride r + stride^2 v (Varadhan and Roland 2008, Scand. J. Statistics 35, 335-353, scheme S3 with stride = -alpha).
 * Coordinates are the means and probabilities as they are and the logs of the variances and of degrees of freedom.
 */
final class Extrapolation {
    /** A probability that the extrapolation would make negative is cut to this part of where EM had taken it. */
    private static final double CUT = 0.1;

    private Extrapolation() {}

    /** |r| / |v|, which is about 1 / (1 - rate of convergence); at least 1. */
    static double stride(Parameters zero, Parameters one, Parameters two) {
        double r2 = 0;
        double v2 = 0;
        for (int e = 0; e < zero.size(); e++) {
            double r = coordinate(one, e) - coordinate(zero, e);
            double v = (coordinate(two, e) - coordinate(one, e)) - r;
            r2 += r * r;
            v2 += v * v;
        }
        return v2 > 0 ? StrictMath.max(1, Math.sqrt(r2 / v2)) : 1;
    }

    /** The largest change of a coordinate. */
    static double largestChange(Parameters before, Parameters after) {
        double largest = 0;
        for (int e = 0; e < before.size(); e++) {
            largest = StrictMath.max(largest, StrictMath.abs(coordinate(after, e) - coordinate(before, e)));
        }
        return largest;
    }

    /** The extrapolated point, brought back to probabilities and to variances not below the floor. */
    static Parameters point(Parameters zero, Parameters one, Parameters two, double stride) {
        Parameters point = two.copy();
        for (int e = 0; e < zero.size(); e++) {
            double start = coordinate(zero, e);
            double r = coordinate(one, e) - start;
            double v = (coordinate(two, e) - coordinate(one, e)) - r;
            double value = start + 2 * stride * r + stride * stride * v;
            if (isDegreesOfFreedom(point, e)) {
                boolean still = r == 0 && v == 0; // fixed ones stay to the bit
                point.set(e, still ? zero.at(e) : withinBounds(StrictMath.exp(value)));
            } else if (isVariance(point, e)) {
                point.set(e, StrictMath.max(Maximisation.FLOOR, StrictMath.exp(value)));
            } else if (e < point.firstMean()) {
                point.set(e, value > 0 ? value : CUT * two.at(e));
            } else {
                point.set(e, value);
            }
        }
        int states = zero.states();
        for (int row = 0; row < point.firstMean(); row += states) {
            normalise(point, row, states);
        }
        return point;
    }

    /** Brings {@code length} entries to sum 1; {@code point} is modified. */
    static void normalise(Parameters point, int start, int length) {
        double total = 0;
        for (int e = start; e < start + length; e++) {
            total += point.at(e);
        }
        for (int e = start; e < start + length; e++) {
            point.set(e, point.at(e) / total);
        }
    }

    private static double withinBounds(double degreesOfFreedom) {
        return StrictMath.max(
                EmissionFamily.LEAST_DEGREES_OF_FREEDOM,
                StrictMath.min(EmissionFamily.MOST_DEGREES_OF_FREEDOM, degreesOfFreedom));
    }

    private static boolean isDegreesOfFreedom(Parameters p, int entry) {
        return entry >= p.degreesOfFreedom(0);
    }

    private static boolean isVariance(Parameters p, int entry) {
        return entry >= p.variance(0);
    }

    private static double coordinate(Parameters p, int entry) {
        return entry >= p.variance(0) ? StrictMath.log(p.at(entry)) : p.at(entry);
    }
}
