package sojourn.regime;

import sojourn.numeric.Check;

/**
 * What is believed of a chain and of its volatilities before a window is seen; the fit is then the mode of the posterior. In every
 * row of the transition matrix a Dirichlet density, worth {@code stay} steps from each regime to itself, and on every variance, at
 * will, an inverse gamma density at the scale of the window (Fraley and Raftery 2007, J. Classification 24, 155-181, with one
 * dimension). The first keeps a short window from seeing changes of regime at every outlier, the second keeps a regime from closing
 * in on a few equal observations.
 *
 * @param stay steps from each regime to itself that count as seen beforehand, from 0 on; 0 says nothing
 * @param variance what is believed of the variances
 */
public record Prior(double stay, Spread variance) {
    private static final double SHAPE = 1.5;
    private static final double FLAT = -1;

    /** What is believed of the variances. */
    public enum Spread {
        /**
         * Inverse gamma with shape 1.5 and scale s^2 / (2 K^2), s^2 being the window's variance and K the number of regimes: worth five
         * observations.
         */
        WINDOW("window"),
        /** Nothing. */
        NONE("none");

        private final String word;

        Spread(String word) {
            this.word = word;
        }

        /** The word of the strategy file. */
        public String word() {
            return word;
        }
    }

    /** Refuses a number of stays that is negative or not finite. */
    public Prior {
        Check.atLeast(stay, 0, "stay");
        Check.finite(stay, "stay");
    }

    /** Its density for that many regimes of a window of variance 1. */
    PriorDensity density(int states) {
        return variance == Spread.WINDOW
                ? new PriorDensity(0, stay, SHAPE, 0.5 / ((double) states * states))
                : new PriorDensity(0, stay, FLAT, 0);
    }
}
