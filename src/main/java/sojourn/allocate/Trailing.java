package sojourn.allocate;

import java.util.Arrays;

/** Probabilities of regimes, averaged over the closes so far. Immutable. */
public final class Trailing {
    private final double[] probabilities;

    private Trailing(double[] probabilities) {
        this.probabilities = probabilities;
    }

    /** Copies {@code probabilities}. */
    static Trailing of(double[] probabilities) {
        return new Trailing(probabilities.clone());
    }

    /** These, moved by {@code part} of the way to {@code now}; not modified. */
    Trailing toward(double[] now, double part) {
        double[] next = new double[probabilities.length];
        for (int k = 0; k < next.length; k++) {
            next[k] = probabilities[k] + part * (now[k] - probabilities[k]);
        }
        return new Trailing(next);
    }

    /** One a regime, a copy. */
    double[] probabilities() {
        return probabilities.clone();
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof Trailing that && Arrays.equals(probabilities, that.probabilities);
    }

    @Override
    public int hashCode() {
        return Arrays.hashCode(probabilities);
    }

    @Override
    public String toString() {
        return Arrays.toString(probabilities);
    }
}
