package sojourn.latest;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import sojourn.market.AnotherEnd;
import sojourn.market.PriceTable;
import sojourn.regime.StartRunner;
import sojourn.strategy.Strategy;
import sojourn.walk.FitPlan;
import sojourn.walk.Reading;
import sojourn.walk.RefitSchedule;
import sojourn.walk.RefitSettings;
import sojourn.walk.RegimeTimeline;
import sojourn.walk.Walk;

/**
 * The bar after a standing's last one, invented: whatever it brings, the walk goes on with it and the simulation runs on, exactly as
 * if such a row stood in the files.
 */
public final class NextBar {
    /** Observations of the window times starts up to which a refit is made anew for every return that is tried. */
    private static final long AFFORDABLE = 60_000;

    private static final RefitSchedule NEVER_AGAIN = new RefitSchedule.EveryObservations(Integer.MAX_VALUE);

    private final Standing standing;
    private final LocalDate date;
    private final List<Double> expected;
    private final Refit refit;

    /** What the next bar means for the fit in force. */
    public enum Refit {
        /** No fit is due. */
        NOT_DUE("not-due"),
        /** A fit is due, and made anew for every return that is tried. */
        MADE("made"),
        /** A fit is due that takes too long to make so often: the parameters in force are kept. */
        FROZEN("parameters-frozen");

        private final String word;

        Refit(String word) {
            this.word = word;
        }

        /** The word in files. */
        public String word() {
            return word;
        }
    }

    private NextBar(Standing standing, LocalDate date, List<Double> expected, Refit refit) {
        this.standing = standing;
        this.date = date;
        this.expected = expected;
        this.refit = refit;
    }

    /** After {@code standing}, which has a reading. */
    static NextBar of(Standing standing, Reading reading) {
        List<Double> expected = AssetOutlook.of(standing, reading).stream()
                .map(AssetOutlook::mean)
                .toList();
        LocalDate date = AnotherEnd.nextDate(standing.table());
        NextBar plain = new NextBar(standing, date, expected, Refit.NOT_DUE);
        Strategy strategy = standing.strategy();
        FitPlan plan = FitPlan.of(plain.table(expected), strategy.regimes(), strategy.refit());
        boolean due = plan.fitDates().contains(date);
        long work = (long) strategy.refit().rolling().orElse(plan.observations())
                * (strategy.refit().starts() + 1);
        Refit refit = !due ? Refit.NOT_DUE : work <= AFFORDABLE ? Refit.MADE : Refit.FROZEN;
        return new NextBar(standing, date, expected, refit);
    }

    /** The date that it is given. */
    public LocalDate date() {
        return date;
    }

    /** Whether a fit is due, and what is done about it. */
    public Refit refit() {
        return refit;
    }

    /** Whether the strategy decides at its close. */
    boolean decides() {
        PriceTable table = table(expected);
        return standing.strategy().trade().decide().decides(table.knownAt(table.size() - 1));
    }

    /** Where the strategy stands after it if {@code asset} returns that, and every other one what is forecast of it. */
    Standing ifReturns(int asset, double simpleReturn) {
        List<Double> returns = new ArrayList<>(expected);
        returns.set(asset, simpleReturn);
        PriceTable table = table(returns);
        Strategy strategy = standing.strategy();
        RegimeTimeline timeline = Walk.onward(
                standing.timeline(),
                table,
                strategy.regimes(),
                refit == Refit.FROZEN ? frozen(strategy.refit()) : strategy.refit(),
                StartRunner.sequential(),
                bar -> {});
        return Standing.of(strategy, standing.policy(), table, timeline);
    }

    private static RefitSettings frozen(RefitSettings refit) {
        return new RefitSettings(
                refit.firstFitAfter(), NEVER_AGAIN, refit.rolling(), refit.starts(), refit.seed(), refit.onFailure());
    }

    private PriceTable table(List<Double> returns) {
        return AnotherEnd.longer(standing.table(), date, returns);
    }
}
