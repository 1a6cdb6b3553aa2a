package sojourn.walk;

import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import sojourn.document.Refusal;
import sojourn.regime.EmissionFamily;
import sojourn.regime.ModelKind;

/** What keys of the section {@code regimes}, each sound by itself, do not go together. */
final class RegimeFaults {
    private final RegimeSettings given;

    private RegimeFaults(RegimeSettings given) {
        this.given = given;
    }

    static List<Refusal> of(RegimeSettings settings) {
        return new RegimeFaults(settings).faults();
    }

    private List<Refusal> faults() {
        List<Refusal> faults = new ArrayList<>();
        faults.addAll(faultsOfModel());
        faults.addAll(EmissionFaults.of(given));
        faults.addAll(faultsOfInitial());
        given.fixed().ifPresent(declared -> faults.addAll(faultsOf(declared)));
        given.particulars().choose().ifPresent(choice -> faults.addAll(faultsOf(choice)));
        given.particulars().prior().ifPresent(prior -> faults.addAll(PriorKeys.faults(prior, given)));
        return faults;
    }

    private List<Refusal> faultsOfModel() {
        List<Refusal> faults = new ArrayList<>();
        if (given.model() == ModelKind.ONE_REGIME && given.states().size() != 1) {
            faults.add(new Refusal(
                    "states",
                    "the model one-regime has one regime, not " + given.states().size(),
                    "name one, or choose another model"));
        }
        if (given.model() == ModelKind.JUMP && given.particulars().penalty().isEmpty()) {
            faults.add(new Refusal("", "the model jump lacks 'penalty'", "add one, e.g. penalty: 50"));
        }
        if (given.model() == ModelKind.VOLATILITY_THRESHOLD) {
            faults.addAll(faultsOfThreshold());
        }
        return faults;
    }

    private List<Refusal> faultsOfInitial() {
        List<Refusal> faults = new ArrayList<>();
        if (given.initial().isPresent() && given.model() != ModelKind.HIDDEN_MARKOV) {
            faults.add(new Refusal(
                    "initial",
                    "'initial' says where a chain starts, and the model "
                            + given.model().word() + " has no chain",
                    "set model: hidden-markov, or leave 'initial' out"));
        }
        if (given.initial().isPresent() && given.fixed().isPresent()) {
            faults.add(new Refusal(
                    "initial",
                    "declared parameters say themselves where the chain starts, in 'parameters'",
                    "leave this 'initial' out"));
        }
        return faults;
    }

    private List<Refusal> faultsOfThreshold() {
        List<Refusal> faults = new ArrayList<>();
        if (given.particulars().threshold().isEmpty()) {
            faults.add(new Refusal(
                    "",
                    "the model volatility-threshold lacks 'threshold'",
                    "add one, e.g. threshold: {volatility: {ewma: 0.94}, storm-above: 0.8, calm-below: 0.6}"));
        }
        if (given.states().size() != 2) {
            faults.add(new Refusal(
                    "states",
                    "the model volatility-threshold has two regimes, not "
                            + given.states().size(),
                    "name two, the calmer first, or choose another model"));
        }
        if (given.observe().size() > 1) {
            faults.add(new Refusal(
                    "observe",
                    "volatility-threshold measures one series, and "
                            + given.observe().size() + " are observed",
                    "observe one, or choose another model"));
        }
        given.observe().stream()
                .filter(one -> !one.aroundZero())
                .findFirst()
                .ifPresent(one -> faults.add(new Refusal(
                        "observe",
                        "volatility-threshold measures volatility from returns, and " + one.word()
                                + " is a size already",
                        "observe a return, or choose another model")));
        return faults;
    }

    private List<Refusal> faultsOf(StateChoice choice) {
        List<Refusal> faults = new ArrayList<>(choice.faultsAgainst(given.states()));
        if (given.fixed().isPresent()) {
            faults.add(new Refusal(
                    "choose", "declared parameters leave no number of regimes to choose", "leave one of the two out"));
        }
        return faults;
    }

    private List<Refusal> faultsOf(FixedParameters declared) {
        List<Refusal> faults = new ArrayList<>();
        if (declared.initial().size() != given.states().size()) {
            faults.add(new Refusal(
                    "parameters",
                    "'parameters' describe " + declared.initial().size() + " regimes, 'states' names "
                            + given.states().size(),
                    "make the two agree"));
        }
        if (given.model() != ModelKind.HIDDEN_MARKOV) {
            faults.add(new Refusal(
                    "parameters",
                    "declared parameters are those of the model hidden-markov, not of "
                            + given.model().word(),
                    "set model: hidden-markov, or leave the parameters out"));
        }
        if (given.observe().size() > 1) {
            faults.add(new Refusal(
                    "parameters",
                    "declared parameters are those of one series, and "
                            + given.observe().size() + " are observed",
                    "observe one, or leave the parameters out and let them be fitted"));
        }
        faults.addAll(faultsOfTails(declared));
        if (given.emission().form() == EmissionFamily.Form.NORMAL_TIED
                && declared.sd().stream().distinct().count() > 1) {
            faults.add(new Refusal(
                    "parameters",
                    "the standard deviations differ, those of the emission normal-tied are one",
                    "write the same 'sd' for each, or set emission: normal"));
        }
        if (given.emission().form() == EmissionFamily.Form.NORMAL_ZERO_MEAN) {
            declared.mean().stream()
                    .filter(mean -> mean != 0)
                    .findFirst()
                    .ifPresent(mean -> faults.add(new Refusal(
                            "parameters",
                            "a mean is "
                                    + BigDecimal.valueOf(mean)
                                            .stripTrailingZeros()
                                            .toPlainString() + ", those of the emission normal-zero-mean are 0",
                            "write 0 for each, or set emission: normal")));
        }
        return faults;
    }

    private List<Refusal> faultsOfTails(FixedParameters declared) {
        boolean written = !declared.degreesOfFreedom().isEmpty();
        boolean student = given.emission().form() == EmissionFamily.Form.STUDENT_T;
        boolean fixedBefore = given.emission().fixedDegreesOfFreedom().isPresent();
        if (student && !fixedBefore && !written) {
            return List.of(new Refusal(
                    "parameters",
                    "declared parameters of the emission student-t lack their degrees of freedom",
                    "add degrees-of-freedom, one for each regime"));
        }
        if (student && fixedBefore && written) {
            return List.of(new Refusal(
                    "parameters",
                    "degrees-of-freedom stands in 'emission' and in 'parameters'",
                    "write it in one of the two"));
        }
        return student || !written
                ? List.of()
                : List.of(new Refusal(
                        "parameters",
                        "degrees-of-freedom belongs to the emission student-t, not to "
                                + given.emission().word(),
                        "set emission: student-t, or leave degrees-of-freedom out"));
    }
}
