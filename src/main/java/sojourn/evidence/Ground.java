package sojourn.evidence;

import java.util.Set;
import sojourn.regime.ModelKind;

/** What a test of two forecasts stands on; it is told beside every p-value. Giacomini and White (2006), Econometrica 74, 1545-1578. */
public enum Ground {
    /** Windows of bounded length. */
    ROLLING("rolling windows: Giacomini and White's test is made for this, estimation included, for nested models too"),
    /** Growing windows, one model a special case of the other. */
    EXPANDING_NESTED(
            "expanding windows and nested models: the statistics do not have their usual distribution; take the p-values of Diebold"
                    + " and Mariano for a rough guide and those of Giacomini and White for none"),
    /** Growing windows, neither model a special case of the other. */
    EXPANDING(
            "expanding windows: Diebold and Mariano's test takes the forecasts as given; Giacomini and White's would want rolling"
                    + " windows"),
    /** Nothing was estimated. */
    DECLARED(
            "this strategy's parameters are declared, not fitted: if they were estimated on this period, the comparison flatters"
                    + " them"),
    /** Nothing was estimated here. */
    COMPUTED_ELSEWHERE(
            "this strategy's probabilities were computed elsewhere: if that looked at this period, the comparison flatters them");

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
        if (subject.regimes().fixed().isPresent() && (first.equals(own) || second.equals(own))) {
            return DECLARED;
        }
        if (subject.regimes().given().isPresent() && (first.equals(own) || second.equals(own))) {
            return COMPUTED_ELSEWHERE;
        }
        if (subject.refit().rolling().isPresent()) {
            return ROLLING;
        }
        boolean nested =
                EACH_A_SPECIAL_CASE_OF_THE_NEXT.contains(first) && EACH_A_SPECIAL_CASE_OF_THE_NEXT.contains(second);
        return nested ? EXPANDING_NESTED : EXPANDING;
    }
}
