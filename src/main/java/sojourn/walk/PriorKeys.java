package sojourn.walk;

import java.util.ArrayList;
import java.util.List;
import sojourn.document.Field;
import sojourn.document.Refusal;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.regime.Prior;

/** How a strategy file says what is believed of its regimes before a window is seen, and what that goes together with. */
final class PriorKeys {
    private static final String KEY = "prior";

    private static final Field<Double> STAY = Field.defaulted(
            "stay",
            Shapes.number().atLeast(0).atMost(1_000_000),
            "10", // our own choice, no source
            "stays in each regime, from one bar to the next, that count as seen before the window");
    private static final Field<Prior.Spread> VARIANCE = Field.defaulted(
            "variance",
            Shapes.word(List.of(Prior.Spread.values()), Prior.Spread::word),
            "window",
            "what holds each regime's variance: window, about five observations at the scale of the window; or none");

    static final Shape<Prior> SHAPE = Shapes.object(KEY, f -> new Prior(f.get(STAY), f.get(VARIANCE)), STAY, VARIANCE);

    private PriorKeys() {}

    /** What is wrong between that prior and the rest of the section. */
    static List<Refusal> faults(Prior prior, RegimeSettings regimes) {
        List<Refusal> faults = new ArrayList<>();
        if (prior.stay() == 0 && prior.variance() == Prior.Spread.NONE) {
            faults.add(refused("a prior with stay: 0 and variance: none says nothing", "leave 'prior' out"));
        }
        if (!regimes.emission().takesPrior()) {
            faults.add(refused(
                    "a prior goes with the emissions normal and normal-zero-mean, not with "
                            + regimes.emission().word(),
                    "change the emission, or leave 'prior' out"));
        }
        if (regimes.observe().size() > 1) {
            faults.add(refused(
                    "a prior is that of one series, and " + regimes.observe().size() + " are observed",
                    "observe one, or leave 'prior' out"));
        }
        if (regimes.fixed().isPresent()) {
            faults.add(
                    refused("declared parameters are not fitted, with a prior or without", "leave one of the two out"));
        }
        if (regimes.states().size() == 1) {
            faults.add(refused("a prior is on how several regimes differ, and there is one", "leave 'prior' out"));
        }
        return faults;
    }

    private static Refusal refused(String what, String remedy) {
        return new Refusal(KEY, what, remedy);
    }
}
