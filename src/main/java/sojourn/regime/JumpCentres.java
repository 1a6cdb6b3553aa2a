package sojourn.regime;

import java.util.Arrays;
import sojourn.numeric.Check;
import sojourn.numeric.CompensatedSum;

/** Where each regime of a jump model lies, and the unit of distances. Immutable. */
public final class JumpCentres {
    private final int states;
    private final double[] centres;
    private final double[] scales;

    private JumpCentres(int states, double[] centres, double[] scales) {
        this.states = states;
        this.centres = centres;
        this.scales = scales;
    }

    /**
     * Copies its arrays; neither modified.
     *
     * @param centres states × dimension, row-major, in the unit of the observations
     * @param scales one a column, above 0: a distance of that much counts as 1
     */
    static JumpCentres of(int states, double[] centres, double[] scales) {
        Check.that(
                scales.length > 0 && centres.length == states * scales.length,
                centres.length + " numbers for the centres of " + states + " states in " + scales.length
                        + " dimensions");
        for (double scale : scales) {
            Check.above(scale, 0, "scale");
        }
        for (double centre : centres) {
            Check.finite(centre, "centre");
        }
        return new JumpCentres(states, centres.clone(), scales.clone());
    }

    /** Number of regimes. */
    public int states() {
        return states;
    }

    /** Numbers an observation has. */
    public int dimension() {
        return scales.length;
    }

    /** The mean of one column in one regime, over the rows of the window that belong to it. */
    public double centre(int state, int column) {
        return centres[state * scales.length + column];
    }

    /** The standard deviation of one column over the window, divisor n: the unit of distances. */
    public double scale(int column) {
        return scales[column];
    }

    /** The squared distance of a row from each centre: sum over the columns that are there of ((x - centre) / scale)^2. */
    double[] distances(Observations x, int row) {
        double[] distances = new double[states];
        for (int k = 0; k < states; k++) {
            for (int j = 0; j < scales.length; j++) {
                if (!x.missing(row, j)) {
                    double d = (x.at(row, j) - centres[k * scales.length + j]) / scales[j];
                    distances[k] += d * d;
                }
            }
        }
        return distances;
    }

    /** The squared distance between one centre of each, in the unit of this. */
    double distance(int state, JumpCentres other, int otherState) {
        double distance = 0;
        for (int j = 0; j < scales.length; j++) {
            double d = (centre(state, j) - other.centre(otherState, j)) / scales[j];
            distance += d * d;
        }
        return distance;
    }

    /** The means of the rows that a path assigns to each state; a state without any number in a column keeps its centre there. */
    JumpCentres means(Observations x, int[] path) {
        double[] means = centres.clone();
        for (int k = 0; k < states; k++) {
            for (int j = 0; j < scales.length; j++) {
                CompensatedSum sum = new CompensatedSum();
                int count = 0;
                for (int row = 0; row < path.length; row++) {
                    if (path[row] == k && !x.missing(row, j)) {
                        sum.add(x.at(row, j));
                        count++;
                    }
                }
                means[k * scales.length + j] = count == 0 ? centre(k, j) : sum.value() / count;
            }
        }
        return new JumpCentres(states, means, scales);
    }

    JumpCentres ordered(int[] order) {
        int d = scales.length;
        double[] turned = new double[centres.length];
        for (int k = 0; k < states; k++) {
            System.arraycopy(centres, order[k] * d, turned, k * d, d);
        }
        return new JumpCentres(states, turned, scales);
    }

    @Override
    public String toString() {
        return "centres " + Arrays.toString(centres) + " in units of " + Arrays.toString(scales);
    }
}
