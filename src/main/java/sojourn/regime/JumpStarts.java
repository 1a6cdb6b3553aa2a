package sojourn.regime;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import sojourn.numeric.RandomStream;

/**
 * Where the descents of one jump fit start. Start 0 is deterministic: rows sorted by the first column, cut in as many equal groups
 * as there are states. The others draw rows for centres, each row with a probability proportional to its squared distance from the
 * nearest centre drawn before (Arthur and Vassilvitskii 2007, Proc. SODA, 1027-1035). The previous accepted fit, if any, comes last.
 */
final class JumpStarts {
    private final int states;
    private final double[] scales;
    private final Observations x;
    private final List<Integer> rows = new ArrayList<>();

    /** {@code scales} is not modified. */
    JumpStarts(int states, double[] scales, Observations x) {
        this.states = states;
        this.scales = scales;
        this.x = x;
        for (int row = 0; row < x.size(); row++) {
            if (whole(x, row)) {
                rows.add(row);
            }
        }
    }

    /** All of them, in the order in which ties are decided. */
    List<JumpCentres> all(FitRequest request, int starts) {
        List<JumpCentres> all = new ArrayList<>();
        all.add(sorted());
        for (int index = 1; index < starts; index++) {
            String number = String.format(Locale.ROOT, "%d", index);
            all.add(drawn(RandomStream.of(request.masterSeed(), "jump", request.date(), number)));
        }
        request.previous()
                .flatMap(Fit::gauge)
                .filter(gauge -> gauge instanceof Jump jump && fits(jump.centres()))
                .ifPresent(gauge -> all.add(inThisUnit(((Jump) gauge).centres())));
        return all;
    }

    private boolean fits(JumpCentres earlier) {
        return earlier.states() == states && earlier.dimension() == scales.length;
    }

    private JumpCentres inThisUnit(JumpCentres earlier) {
        double[] centres = new double[states * scales.length];
        for (int i = 0; i < centres.length; i++) {
            centres[i] = earlier.centre(i / scales.length, i % scales.length);
        }
        return JumpCentres.of(states, centres, scales);
    }

    private JumpCentres sorted() {
        List<Integer> ascending = new ArrayList<>(rows);
        ascending.sort(Comparator.comparingDouble((Integer row) -> x.at(row, 0)));
        int[] group = new int[x.size()];
        Arrays.fill(group, -1);
        for (int i = 0; i < ascending.size(); i++) {
            group[ascending.get(i)] = (int) ((long) i * states / ascending.size());
        }
        return JumpCentres.of(states, new double[states * scales.length], scales)
                .means(x, group);
    }

    private JumpCentres drawn(RandomStream random) {
        double[] centres = new double[states * scales.length];
        place(centres, 0, rows.get(random.nextInt(rows.size())));
        double[] nearest = new double[rows.size()];
        for (int k = 1; k < states; k++) {
            JumpCentres before = JumpCentres.of(states, centres, scales);
            double total = 0;
            for (int i = 0; i < nearest.length; i++) {
                double distance = before.distances(x, rows.get(i))[k - 1];
                nearest[i] = k == 1 ? distance : StrictMath.min(nearest[i], distance);
                total += nearest[i];
            }
            place(centres, k, rows.get(draw(nearest, random.nextDouble() * total)));
        }
        return JumpCentres.of(states, centres, scales);
    }

    /** The first index at which the sum of weights exceeds {@code at}. */
    private static int draw(double[] weights, double at) {
        double sum = 0;
        for (int i = 0; i < weights.length; i++) {
            sum += weights[i];
            if (sum > at) {
                return i;
            }
        }
        return weights.length - 1;
    }

    private void place(double[] centres, int state, int row) {
        for (int j = 0; j < scales.length; j++) {
            centres[state * scales.length + j] = x.at(row, j);
        }
    }

    /** Whether there is a row to start from. */
    static boolean possible(Observations x) {
        boolean found = false;
        for (int row = 0; row < x.size(); row++) {
            found |= whole(x, row);
        }
        return found;
    }

    private static boolean whole(Observations x, int row) {
        for (int j = 0; j < x.dimension(); j++) {
            if (x.missing(row, j)) {
                return false;
            }
        }
        return true;
    }
}
