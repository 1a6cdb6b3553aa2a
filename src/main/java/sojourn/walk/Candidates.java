package sojourn.walk;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.function.Function;
import sojourn.market.Known;
import sojourn.regime.Fit;
import sojourn.regime.FitRequest;
import sojourn.regime.Observations;
import sojourn.regime.StartRunner;

/**
 * The numbers of regimes that each fit chooses among; one, if there is no choice. Each is fitted and filtered on its own, as a walk
 * of that number alone would do that keeps the previous fit where one is refused. Chosen is, among the numbers accepted at a fit:
 * by bic the one with the least criterion on the window; by predictive the one with the highest total log score of the
 * observations since the last of them had its first accepted fit, ties (so the very first choice) by bic. Ties of the criterion go
 * to fewer regimes. An observation counts if every number that had a fit in force scored it.
 */
final class Candidates {
    private final List<Candidate> all = new ArrayList<>();
    private final Optional<StateChoice.By> by;
    /** Row c, column e: the total log score of c since the first accepted fit of e, as far as both stand. */
    private final double[][] scores;

    /** In which order candidates had their first accepted fit; later is larger, none yet the largest. */
    private final int[] since;

    private int fits;

    Candidates(RegimeSettings regimes, int starts) {
        this.by = regimes.particulars().choose().map(StateChoice::by);
        if (regimes.particulars().choose().isPresent()) {
            for (List<String> names : regimes.particulars().choose().get().regimes()) {
                all.add(new Candidate(names, regimes.likelihood(names.size(), starts)));
            }
        } else {
            all.add(new Candidate(regimes.states(), regimes.gauge(starts)));
        }
        this.scores = new double[all.size()][all.size()];
        this.since = new int[all.size()];
        Arrays.fill(since, Integer.MAX_VALUE);
    }

    /** The candidate with those regimes. */
    Candidate named(List<String> regimes) {
        return all.stream()
                .filter(one -> one.regimes().equals(regimes))
                .findFirst()
                .orElseThrow();
    }

    Candidate get(int index) {
        return all.get(index);
    }

    /** One bar on: every filter steps, every score counts. */
    void step(Observations x, int row) {
        boolean counts = true;
        for (Candidate one : all) {
            one.step(x, row);
            counts &= !one.stands() || one.score().isPresent();
        }
        for (int c = 0; counts && c < scores.length; c++) {
            for (int e = 0; e < scores.length; e++) {
                if (get(c).stands() && get(e).stands()) {
                    scores[c][e] += get(c).score().orElseThrow();
                }
            }
        }
    }

    /** Fits every candidate to the window that ends now. Nothing is chosen or goes by the fits yet. */
    List<CandidateFit> fit(FitRequest cold, StartRunner runner) {
        List<Fit> made = all.stream().map(one -> one.fit(cold, runner)).toList();
        OptionalInt last = lastToStand(made);
        List<CandidateFit> fitted = new ArrayList<>();
        for (int c = 0; c < scores.length; c++) {
            boolean compared = by.equals(Optional.of(StateChoice.By.PREDICTIVE))
                    && last.isPresent()
                    && made.get(c).outcome().accepted();
            fitted.add(new CandidateFit(
                    get(c).regimes(),
                    made.get(c),
                    Arrays.stream(scores[c]).boxed().toList(),
                    compared ? OptionalDouble.of(scores[c][last.getAsInt()]) : OptionalDouble.empty()));
        }
        return fitted;
    }

    /** Of the candidates accepted now, the one whose first accepted fit came last. */
    private OptionalInt lastToStand(List<Fit> made) {
        OptionalInt last = OptionalInt.empty();
        for (int c = 0; c < made.size(); c++) {
            boolean later = last.isEmpty() || since[c] > since[last.getAsInt()];
            last = made.get(c).outcome().accepted() && later ? OptionalInt.of(c) : last;
        }
        return last;
    }

    /** The candidate that the fits speak for; empty if none was accepted. */
    static OptionalInt choose(List<CandidateFit> fits) {
        OptionalInt best = OptionalInt.empty();
        for (int c = 0; c < fits.size(); c++) {
            boolean accepted = fits.get(c).fit().outcome().accepted();
            if (accepted && (best.isEmpty() || better(fits.get(c), fits.get(best.getAsInt())))) {
                best = OptionalInt.of(c);
            }
        }
        return best;
    }

    private static boolean better(CandidateFit one, CandidateFit than) {
        double lead = one.compared().orElse(0) - than.compared().orElse(0);
        return lead > 0 || (lead == 0 && one.bic().orElseThrow() < than.bic().orElseThrow());
    }

    /** Every accepted fit is gone by from now on. */
    void adopt(List<CandidateFit> made, Observations window) {
        fits++;
        for (int c = 0; c < made.size(); c++) {
            if (made.get(c).fit().outcome().accepted()) {
                get(c).adopt(made.get(c).fit(), window);
                since[c] = Math.min(since[c], fits);
            }
        }
    }

    /** Stands where the walk of those records, of which there is one, stopped: at the bar that {@code known} and the log end with. */
    void resume(List<FitRecord> records, ObservationLog log, Known known) {
        FitRecord last = records.get(records.size() - 1);
        int end = log.row(known, last.fittedOn()) + 1;
        for (FitRecord record : records) {
            fits++;
            for (int c = 0; c < all.size(); c++) {
                if (record.candidates().get(c).fit().outcome().accepted()) {
                    since[c] = Math.min(since[c], fits);
                }
            }
        }
        Observations later = log.window(end);
        for (int c = 0; c < all.size(); c++) {
            takeOver(c, records, record -> log.window(log.row(known, record.windowStart())), later.size());
            List<Double> row = last.candidates().get(c).scores();
            for (int e = 0; e < scores.length; e++) {
                scores[c][e] = row.get(e);
            }
        }
        for (int row = 0; row < later.size(); row++) {
            step(later, row);
        }
    }

    private void takeOver(int c, List<FitRecord> records, Function<FitRecord, Observations> rows, int later) {
        Optional<FitRecord> accepted = records.stream()
                .filter(record -> record.candidates().get(c).fit().outcome().accepted())
                .reduce((before, after) -> after);
        accepted.ifPresent(record -> {
            Observations window = rows.apply(record);
            get(c).adopt(record.candidates().get(c).fit(), window.range(0, window.size() - later));
        });
    }
}
