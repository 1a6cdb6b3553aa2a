package sojourn.regime;

import sojourn.numeric.CompensatedSum;

/** How much of a window each state accounts for, and the order-by series' mean and standard deviation in it. */
final class StateWeights {
    private final double[] occupancy;
    private final double[] means;
    private final double[] deviations;

    private StateWeights(double[] occupancy, double[] means, double[] deviations) {
        this.occupancy = occupancy;
        this.means = means;
        this.deviations = deviations;
    }

    /**
     * Posterior-weighted, over the rows that order. A state that accounts for practically none of them gets their plain mean and
     * standard deviation. The occupancy is that of all rows whose observation is present.
     */
    static StateWeights of(Membership membership, FitRequest request) {
        int states = membership.states();
        double[] occupancy = new double[states];
        double[] means = new double[states];
        double[] deviations = new double[states];
        Observations x = request.observations();
        for (int k = 0; k < states; k++) {
            occupancy[k] = PosteriorMoments.weight(membership, x, k) / x.present();
            boolean empty = ordering(membership, request, k) < PosteriorMoments.LEAST_WEIGHT;
            CompensatedSum weights = new CompensatedSum();
            CompensatedSum first = new CompensatedSum();
            for (int t = 0; t < x.size(); t++) {
                if (request.orders(t)) {
                    double g = empty ? 1 : membership.at(t, k);
                    weights.add(g);
                    first.add(g * request.orderBy(t));
                }
            }
            means[k] = first.value() / weights.value();
            CompensatedSum second = new CompensatedSum();
            for (int t = 0; t < x.size(); t++) {
                if (request.orders(t)) {
                    double d = request.orderBy(t) - means[k];
                    second.add((empty ? 1 : membership.at(t, k)) * d * d);
                }
            }
            deviations[k] = Math.sqrt(second.value() / weights.value());
        }
        return new StateWeights(occupancy, means, deviations);
    }

    private static double ordering(Membership membership, FitRequest request, int k) {
        CompensatedSum total = new CompensatedSum();
        for (int t = 0; t < request.observations().size(); t++) {
            if (request.orders(t)) {
                total.add(membership.at(t, k));
            }
        }
        return total.value();
    }

    double[] occupancy() {
        return occupancy.clone();
    }

    double[] deviations() {
        return deviations.clone();
    }

    double mean(int k) {
        return means[k];
    }

    double deviation(int k) {
        return deviations[k];
    }
}
