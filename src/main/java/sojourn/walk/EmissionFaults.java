package sojourn.walk;

import java.util.ArrayList;
import java.util.List;
import sojourn.document.Refusal;
import sojourn.regime.EmissionFamily;

/** What is wrong between the emission that a strategy states and what it observes. */
final class EmissionFaults {
    private EmissionFaults() {}

    static List<Refusal> of(RegimeSettings regimes) {
        EmissionFamily emission = regimes.emission();
        int series = regimes.observe().size();
        List<Refusal> faults = new ArrayList<>();
        if (emission.equals(EmissionFamily.NORMAL_ZERO_MEAN)) {
            regimes.observe().stream()
                    .filter(one -> !one.aroundZero())
                    .findFirst()
                    .ifPresent(one -> faults.add(sized(one)));
        }
        if (emission.equals(EmissionFamily.NORMAL_DIAGONAL) && series == 1) {
            faults.add(new Refusal(
                    "emission",
                    "normal-diagonal says that several series are independent within a regime, and one is observed",
                    "set emission: normal"));
        }
        if (series > 1 && !emission.multivariate()) {
            faults.add(new Refusal(
                    "emission",
                    "the emission " + emission.word() + " is that of one series, and " + series + " are observed",
                    "set emission: normal or normal-diagonal, or observe one"));
        }
        return faults;
    }

    private static Refusal sized(Observation one) {
        return new Refusal(
                "emission",
                "normal-zero-mean takes the mean of the observation for 0 in every regime, which that of " + one.word()
                        + " is not",
                "set emission: normal, or observe a return");
    }
}
