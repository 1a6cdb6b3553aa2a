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
     * Posterior-weighted, over the rows whose observation is present. A state that accounts for practically no row gets the plain
     * mean and standard deviation of the window.
     */
    static StateWeights of(Membership membership, FitRequest request) {
        int states = membership.states();
        double[] occupancy = new double[states];
        double[] means = new double[states];
        double[] deviations = new double[states];
        Observations x = request.observations();
        for (int k = 0; k < states; k++) {
            occupancy[k] = PosteriorMoments.weight(membership, x, k) / x.present();
            boolean empty = occupancy[k] * x.present() < PosteriorMoments.LEAST_WEIGHT;
            CompensatedSum weights = new CompensatedSum();
            CompensatedSum first = new CompensatedSum();
            for (int t = 0; t < x.size(); t++) {
                if (!x.missing(t)) {
                    double g = empty ? 1 : membership.at(t, k);
                    weights.add(g);
                    first.add(g * request.orderBy(t));
                }
            }
            means[k] = first.value() / weights.value();
            CompensatedSum second = new CompensatedSum();
            for (int t = 0; t < x.size(); t++) {
                if (!x.missing(t)) {
                    double d = request.orderBy(t) - means[k];
                    second.add((empty ? 1 : membership.at(t, k)) * d * d);
                }
            }
            deviations[k] = Math.sqrt(second.value() / weights.value());
        }
        return new StateWeights(occupancy, means, deviations);
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
