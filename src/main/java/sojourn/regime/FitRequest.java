package sojourn.regime;

import java.util.Arrays;
import java.util.BitSet;
import java.util.Optional;
import sojourn.numeric.Check;

/** What one fit may use: the observations of its window, and what names and measures the regimes. Immutable. */
public final class FitRequest {
    private final Observations observations;
    private final double[] orderBy;
    /** Rows whose return to order by is not known. */
    private final BitSet withheld;

    private final Companions companions;
    private final Optional<Fit> previous;
    private final long masterSeed;
    private final String date;

    private FitRequest(
            Observations observations,
            double[] orderBy,
            BitSet withheld,
            Companions companions,
            Optional<Fit> previous,
            long masterSeed,
            String date) {
        this.observations = observations;
        this.orderBy = orderBy;
        this.withheld = withheld;
        this.companions = companions;
        this.previous = previous;
        this.masterSeed = masterSeed;
        this.date = date;
    }

    /**
     * A first fit. Copies {@code orderBy}; not modified.
     *
     * @param observations of the window, of dimension 1 to 6
     * @param orderBy one simple return a row, whose volatility orders the regimes; ignored where the observation is missing,
     *     otherwise finite
     * @param companions the simple returns of all assets on the same rows
     * @param masterSeed of the whole run
     * @param date of the fit, names the random streams
     */
    public static FitRequest of(
            Observations observations, double[] orderBy, Companions companions, long masterSeed, String date) {
        int rows = observations.size();
        Check.within(observations.dimension(), 1, FitSettings.MOST_SERIES, "dimension of the observations");
        Check.that(
                orderBy.length == rows && companions.size() == rows,
                rows + " observations, " + orderBy.length + " returns to order by, " + companions.size()
                        + " rows of asset returns");
        double[] copy = new double[rows];
        for (int row = 0; row < rows; row++) {
            copy[row] = observations.missing(row) ? 0 : Check.finite(orderBy[row], "return to order by in row", row);
        }
        return new FitRequest(observations, copy, new BitSet(), companions, Optional.empty(), masterSeed, date);
    }

    /** The same request, made after {@code accepted}: it gives one more start, and is what the new states are matched to. */
    public FitRequest after(Fit accepted) {
        Check.that(
                accepted.outcome().accepted(),
                "a refused fit (" + accepted.outcome().word() + ") as the previous one");
        return new FitRequest(observations, orderBy, withheld, companions, Optional.of(accepted), masterSeed, date);
    }

    /** The same without the returns to order by of some rows, because they are not known: those rows order nothing. */
    public FitRequest withholding(BitSet rows) {
        return new FitRequest(observations, orderBy, (BitSet) rows.clone(), companions, previous, masterSeed, date);
    }

    /** The same of the rows from {@code start} on. */
    FitRequest from(int start) {
        return new FitRequest(
                observations.range(start, observations.size()),
                Arrays.copyOfRange(orderBy, start, orderBy.length),
                withheld.get(start, orderBy.length),
                companions.from(start),
                previous,
                masterSeed,
                date);
    }

    /** The observations of the window. */
    public Observations observations() {
        return observations;
    }

    /** Whether a row says anything of what orders the regimes: its observation is there and its return is known. */
    boolean orders(int row) {
        return !withheld.get(row) && !observations.missing(row);
    }

    /** The return to order by in a row that {@link #orders(int) orders}. */
    double orderBy(int row) {
        return orderBy[row];
    }

    /** The simple returns of all assets. */
    public Companions companions() {
        return companions;
    }

    /** The last accepted fit before this one. */
    public Optional<Fit> previous() {
        return previous;
    }

    /** The master seed. */
    public long masterSeed() {
        return masterSeed;
    }

    /** The date of the fit. */
    public String date() {
        return date;
    }
}
