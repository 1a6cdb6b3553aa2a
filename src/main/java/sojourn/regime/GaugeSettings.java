package sojourn.regime;

/** What gauge to fit, and how. */
public interface GaugeSettings {
    /** The fewest observations of one series that such a fit needs. */
    int leastObservations();

    /** The same for so many series, each there on every row. */
    default int leastObservations(int series) {
        return leastObservations();
    }

    /**
     * Fits it. What it returns depends on the request alone, not on {@code runner} or its threads. Data that cannot be fitted give a
     * refused fit with its reason, never an exception.
     */
    Fit fit(FitRequest request, StartRunner runner);
}
