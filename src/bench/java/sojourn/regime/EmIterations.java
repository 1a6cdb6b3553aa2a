package sojourn.regime;

/**
 * Plain EM iterations on one series, expectation and maximisation step, as the search makes them: what the benchmarks measure. Starts
 * with states around the series' mean, spread over its volatility.
 */
public final class EmIterations {
    private static final double STAY = 0.95;

    private final Expectation expectation;
    private final Maximisation maximisation;
    private final Parameters start;
    private final ExpectedSums sums;
    private final int rows;

    private EmIterations(Window window, EmissionFamily family, int states) {
        this.expectation = Expectation.of(ModelKind.HIDDEN_MARKOV, states, window, family);
        this.maximisation = new Maximisation(family);
        this.start = start(states, family);
        this.sums = new ExpectedSums(states);
        this.rows = window.size();
    }

    /** Of a chain of so many states on {@code values}, which are not modified. */
    public static EmIterations of(double[] values, EmissionFamily family, int states) {
        return new EmIterations(Window.of(Observations.univariate(values), family), family, states);
    }

    /** Number of observations. */
    public int rows() {
        return rows;
    }

    /** The log-likelihood of the standardised series before the last of so many iterations from the start. */
    public double run(int iterations) {
        Parameters at = start;
        double last = 0;
        for (int i = 0; i < iterations; i++) {
            if (!expectation.fill(at, sums)) {
                throw new IllegalStateException("the fast step gave up");
            }
            last = sums.logLikelihood;
            at = maximisation.next(at, sums);
        }
        return last;
    }

    private static Parameters start(int states, EmissionFamily family) {
        Parameters p = Parameters.blank(ModelKind.HIDDEN_MARKOV, states, family);
        for (int k = 0; k < states; k++) {
            double deviation = 0.5 + 1.5 * k / (states - 1);
            p.set(p.initial(k), 1.0 / states);
            p.set(p.variance(k), deviation * deviation);
            if (family.fatTailed()) {
                p.set(p.degreesOfFreedom(k), 8);
            }
            for (int j = 0; j < states; j++) {
                p.set(p.transition(k, j), k == j ? STAY : (1 - STAY) / (states - 1));
            }
        }
        return p;
    }
}
