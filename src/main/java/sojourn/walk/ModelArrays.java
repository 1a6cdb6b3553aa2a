package sojourn.walk;

import sojourn.regime.Gauge;

/** A fit's parameters laid out flat, as readings hold them. */
final class ModelArrays {
    private ModelArrays() {}

    /** Transition probabilities of an accepted fit, row-major. */
    static double[] transition(FitRecord record) {
        Gauge gauge = record.fit().gauge().orElseThrow();
        int states = gauge.states();
        double[] flat = new double[states * states];
        for (int i = 0; i < states; i++) {
            for (int j = 0; j < states; j++) {
                flat[i * states + j] = gauge.transition(i, j);
            }
        }
        return flat;
    }
}
