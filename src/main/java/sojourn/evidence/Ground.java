package sojourn.evidence;

import java.util.Set;
import sojourn.regime.ModelKind;
import sojourn.walk.StateChoice;

/** What a test of two forecasts stands on; it is told beside every p-value. Giacomini and White (2006), Econometrica 74, 1545-1578. */
public enum Ground {
    /** Windows of bounded length, and nothing chosen by what lies before them. */
    ROLLING("rolling windows: Giacomini and White's test is made for this, estimation included, for nested models too"),
    /** Growing windows, or a choice by all that was forecast; one model a special case of the other. */
    EXPANDING_NESTED(
            "expanding windows, or a choice by all past scores, and nested models: the statistics do not have their usual distribution; take the p-values of Diebold"
                    + " and Mariano for a rough guide and those of Giacomini and White for none"),
    /** Growing windows, or a choice by all that was forecast; neither model a special case of the other. */
    EXPANDING(
            "expanding windows, or a choice by all past scores: Diebold and Mariano's test takes the forecasts as given; Giacomini and White's would want rolling"
                    + " windows"),
    /** Neither has a parameter that was estimated. */
    NOTHING_ESTIMATED("neither forecast has an estimated parameter: Diebold and Mariano's test is made for this"),
    /** Nothing was estimated. */
    DECLARED(
            "this strategy's parameters are declared, not fitted: if they were estimated on this period, the comparison flatters"
                    + " them"),
    /** Nothing was estimated here. */
    COMPUTED_ELSEWHERE(
            "this strategy's probabilities were computed elsewhere: if that looked at this period, the comparison flatters them");

    private static final Set<String> ESTIMATES_NOTHING = Set.of(RegimeEvidence.EXPONENTIAL, RegimeEvidence.ROLLING);

    private static final Set<String> EACH_A_SPECIAL_CASE_OF_THE_NEXT =
            Set.of(ModelKind.ONE_REGIME.word(), ModelKind.MIXTURE.word(), ModelKind.HIDDEN_MARKOV.word());

    private final String words;

    Ground(String words) {
        this.words = words;
    }

    /** A clause or two, in words. */
    public String words() {
        return words;
    }

    /** Of a test between two of a subject's gauges, named by their words. */
    static Ground of(WalkedRegimes subject, String first, String second) {
        String own = subject.gauge();
        if (subject.regimes().fixed().isPresent() && involved(own, first, second)) {
            return DECLARED;
        }
        if (subject.regimes().given().isPresent() && involved(own, first, second)) {
            return COMPUTED_ELSEWHERE;
        }
        if (ESTIMATES_NOTHING.contains(first) && ESTIMATES_NOTHING.contains(second)) {
            return NOTHING_ESTIMATED;
        }
        if (subject.refit().rolling().isPresent() && !(choosesByThePast(subject) && involved(own, first, second))) {
            return ROLLING;
        }
        return nested(first, second) ? EXPANDING_NESTED : EXPANDING;
    }

    private static boolean involved(String own, String first, String second) {
        return first.equals(own) || second.equals(own);
    }

    /** The scores that choose a number of regimes are totals over all that was forecast, however short the windows of the fits. */
    private static boolean choosesByThePast(WalkedRegimes subject) {
        return subject.regimes()
                .particulars()
                .choose()
                .filter(choice -> choice.by() == StateChoice.By.PREDICTIVE)
                .isPresent();
    }

    /** Of a volatility threshold and a jump model, too, one regime is what is left where all bars fall into one. */
    private static boolean nested(String first, String second) {
        boolean chain =
                EACH_A_SPECIAL_CASE_OF_THE_NEXT.contains(first) && EACH_A_SPECIAL_CASE_OF_THE_NEXT.contains(second);
        String one = ModelKind.ONE_REGIME.word();
        return chain
                || (first.equals(one) && !ESTIMATES_NOTHING.contains(second))
                || (second.equals(one) && !ESTIMATES_NOTHING.contains(first));
    }
}
