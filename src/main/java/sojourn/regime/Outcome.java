package sojourn.regime;

/** How a fit ended. */
public enum Outcome {
    /** At a maximum of the likelihood. */
    CONVERGED("converged"),
    /** Usable, but the search had not come to rest at the last iteration allowed. */
    ITERATION_LIMIT("iteration-limit"),
    /** A state closed in on a handful of observations: its parameters mean nothing. */
    DEGENERATE("degenerate"),
    /** There is no model. */
    FAILED("failed"),
    /** The parameters were given, not estimated. */
    GIVEN("given");

    private final String word;

    Outcome(String word) {
        this.word = word;
    }

    /** The word written in results. */
    public String word() {
        return word;
    }

    /** Whether decisions may rest on the fit. */
    public boolean accepted() {
        return this == CONVERGED || this == ITERATION_LIMIT || this == GIVEN;
    }
}
