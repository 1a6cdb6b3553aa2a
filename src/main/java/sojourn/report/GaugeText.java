package sojourn.report;

import java.math.BigDecimal;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.OptionalDouble;
import java.util.stream.Collectors;
import sojourn.market.GivenColumns;
import sojourn.market.PriceTable;
import sojourn.regime.ModelKind;
import sojourn.regime.Prior;
import sojourn.regime.RecentVolatility;
import sojourn.regime.VolatilityThresholdSettings;
import sojourn.walk.FitPlan;
import sojourn.walk.FixedParameters;
import sojourn.walk.Observation;
import sojourn.walk.RefitSchedule;
import sojourn.walk.RefitSettings;
import sojourn.walk.RegimeSettings;
import sojourn.walk.StateChoice;

/** The sections {@code regimes} and {@code refit} in plain English. */
final class GaugeText {
    private GaugeText() {}

    /** What it looks at, and what regimes it tells apart. */
    static String watches(RegimeSettings regimes) {
        if (regimes.given().isPresent()) {
            return given(regimes.given().get(), regimes.orderedBy());
        }
        String observed = regimes.observe().stream().map(Observation::inWords).collect(Collectors.joining(", "));
        String ordered = ", ordered by the volatility of " + regimes.orderedBy() + " at every fit";
        boolean named = regimes.model() == ModelKind.ONE_REGIME || regimes.model() == ModelKind.VOLATILITY_THRESHOLD;
        return observed + "; " + model(regimes) + "; regimes " + named(regimes) + (named ? "" : ordered);
    }

    private static String named(RegimeSettings regimes) {
        return regimes.particulars()
                .choose()
                .map(choice -> choice.regimes().stream()
                                .map(names -> names.size() + " (" + String.join(", ", names) + ")")
                                .collect(Collectors.joining(" or "))
                        + ", chosen at every fit by "
                        + (choice.by() == StateChoice.By.BIC
                                ? "the information criterion of Bayes on its window"
                                : "the log score of each number's own forecasts so far"))
                .orElseGet(() -> String.join(", ", regimes.states()));
    }

    private static String given(GivenColumns given, String asset) {
        return "nothing itself: the probabilities of " + String.join(", ", given.states())
                + " were computed elsewhere ("
                + given.source().layout().csv()
                + ") and are not audited for how they were computed; a row counts from the"
                + " first close on or after its " + given.source().knownOn() + "; the returns of " + asset
                + " tell how volatile each regime is";
    }

    private static String model(RegimeSettings regimes) {
        String kind = regimes.model().word();
        return regimes.particulars()
                .threshold()
                .map(threshold -> kind + ": " + threshold(threshold, regimes.states()))
                .orElseGet(() -> kind + ", " + within(regimes));
    }

    private static String within(RegimeSettings regimes) {
        OptionalDouble penalty = regimes.particulars().penalty();
        return penalty.isPresent()
                ? "each change of regime costs " + penalty.getAsDouble() + " squared deviations"
                : regimes.emission().word() + degrees(regimes) + " emissions"
                        + regimes.particulars().prior().map(GaugeText::believed).orElse("");
    }

    private static String believed(Prior prior) {
        String stays = BigDecimal.valueOf(prior.stay()).stripTrailingZeros().toPlainString() + " stays in each regime";
        return prior.variance() == Prior.Spread.WINDOW
                ? ", taken to have been seen beforehand: " + stays
                        + " and about five observations at the window's scale"
                : ", taken to have been seen beforehand: " + stays;
    }

    /** What should be known before such regimes are relied on. */
    static List<String> findings(RegimeSettings regimes) {
        boolean signed = regimes.observe().stream().allMatch(Observation::aroundZero);
        return regimes.model() == ModelKind.JUMP && signed
                ? List.of(
                        "the model jump tells regimes apart by the level of what it observes, and a return has the same"
                                + " level in calm and in storm: these regimes are of rises and falls; observe absolute-return"
                                + " or log-realised-volatility to tell storms")
                : List.of();
    }

    private static String threshold(VolatilityThresholdSettings threshold, List<String> states) {
        return states.get(1) + " when " + volatility(threshold.volatility()) + " lies above the "
                + threshold.stormAbove()
                + " quantile of the window's, " + states.get(0) + " again when at or below the "
                + threshold.calmBelow() + " quantile";
    }

    private static String volatility(RecentVolatility measure) {
        if (measure instanceof RecentVolatility.Rolling rolling) {
            return "the standard deviation of the last " + rolling.observations();
        }
        double decay = ((RecentVolatility.Exponential) measure).decay();
        return "the exponentially weighted volatility of decay " + decay;
    }

    /** The parameters that were declared, in words. */
    static String declared(RegimeSettings regimes, FixedParameters fixed, PriceTable table) {
        List<String> each = new ArrayList<>();
        double year = Math.sqrt(table.barLength().periodsPerYear());
        for (int k = 0; k < regimes.states().size(); k++) {
            each.add(String.format(
                    Locale.ROOT,
                    "%s has mean %s and deviation %s a bar (%.1f %% a year), stays with probability %s",
                    regimes.states().get(k),
                    fixed.mean().get(k),
                    fixed.sd().get(k),
                    100 * year * fixed.sd().get(k),
                    fixed.transition().get(k).get(k)));
        }
        return String.join("; ", each);
    }

    private static String degrees(RegimeSettings regimes) {
        OptionalDouble fixed = regimes.emission().fixedDegreesOfFreedom();
        return fixed.isPresent() ? " of " + fixed.getAsDouble() + " degrees of freedom" : "";
    }

    /** When and on what it is fitted. */
    static String fits(RefitSettings refit, RegimeSettings regimes, FitPlan plan) {
        if (plan.fitDates().isEmpty()) {
            return "none: first-fit-after is " + refit.firstFitAfter() + " and there are " + plan.observations()
                    + " observations; this strategy will fail";
        }
        List<LocalDate> dates = plan.fitDates();
        if (regimes.fixed().isPresent()) {
            return "none: its parameters are declared (an external prior), in use from " + dates.get(0)
                    + " on; the filter begins" + " afresh " + every(refit.schedule());
        }
        if (regimes.given().isPresent()) {
            return "none: what each regime meant for returns, and how they followed each other, is taken "
                    + dates.size()
                    + " times from " + dates.get(0) + " to " + dates.get(dates.size() - 1) + ", "
                    + every(refit.schedule()) + ", " + window(refit);
        }
        String from = " from " + refit.starts() + " starts and the fit before (seed " + refit.seed() + "), ";
        String what = regimes.model().hasLikelihood()
                ? (regimes.particulars().prior().isPresent() ? "mode of the posterior" : "maximum likelihood") + from
                : regimes.model() == ModelKind.JUMP ? "centres and path of least cost" + from : "quantiles taken ";
        return what + dates.size() + " times from " + dates.get(0) + " to " + dates.get(dates.size() - 1) + ", "
                + every(refit.schedule()) + ", " + window(refit) + "; parameters are frozen in between";
    }

    private static String window(RefitSettings refit) {
        return refit.rolling().isPresent()
                ? "on the last " + refit.rolling().getAsInt() + " observations"
                : "on all observations so far";
    }

    private static String every(RefitSchedule schedule) {
        if (schedule instanceof RefitSchedule.EveryObservations count) {
            return count.observations() == 1
                    ? "at every observation"
                    : "every " + count.observations() + " observations";
        }
        return "on the first bar of each " + schedule.toString().toLowerCase(Locale.ROOT);
    }
}
