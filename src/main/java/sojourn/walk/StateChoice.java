package sojourn.walk;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import sojourn.document.Field;
import sojourn.document.Refusal;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.regime.FitSettings;

/**
 * Among which numbers of regimes each fit chooses, and by what.
 *
 * @param regimes for each number the names that its regimes carry, from lowest to highest volatility; the smallest number first
 * @param by what decides
 */
public record StateChoice(List<List<String>> regimes, By by) {
    /** What decides between the numbers of regimes that were accepted at a fit. */
    public enum By {
        /** The least -2 l + p ln n on the window. */
        BIC("bic"),
        /** The highest total log score of observations before they were fitted to. */
        PREDICTIVE("predictive");

        private final String word;

        By(String word) {
            this.word = word;
        }

        /** The word of the strategy file. */
        public String word() {
            return word;
        }
    }

    private static final Field<By> BY = Field.required(
            "by",
            Shapes.word(List.of(By.values()), By::word),
            "what decides at each fit: bic, the information criterion of Bayes on the fit's window; predictive, the log score"
                    + " so far of each number's own forecasts, one bar ahead");
    private static final Field<List<List<String>>> STATES = Field.required(
            "states",
            Shapes.list(StateNames.SHAPE, 2, FitSettings.MOST_STATES).refuse(StateChoice::asMany),
            "the numbers of regimes to choose among, each as the list of its regimes' names out of the 'states' above, e.g."
                    + " [[all], [calm, stormy]]");

    static final Shape<StateChoice> SHAPE =
            Shapes.object("choose", f -> new StateChoice(f.get(STATES), f.get(BY)), STATES, BY);

    /** Copies its lists, the shortest first. */
    public StateChoice {
        regimes = regimes.stream()
                .map(List::copyOf)
                .sorted(Comparator.comparingInt(List::size))
                .toList();
    }

    private static Optional<Refusal> asMany(List<List<String>> lists) {
        Set<Integer> seen = new HashSet<>();
        return lists.stream()
                .map(List::size)
                .filter(size -> !seen.add(size))
                .findFirst()
                .map(size -> new Refusal(
                        "", "two of the lists name " + size + " regimes", "give one list for each number of regimes"));
    }

    /** Faults against the list of all regimes that the section names. */
    List<Refusal> faultsAgainst(List<String> states) {
        List<Refusal> faults = new ArrayList<>();
        for (List<String> list : regimes) {
            if (!inOrder(list, states)) {
                faults.add(new Refusal(
                        "choose",
                        list.size() + (list.size() == 1 ? " regime, " : " regimes, ") + String.join(", ", list)
                                + ", not found among 'states' (" + String.join(", ", states) + ") in that order",
                        "name in 'states' every regime of every number, from lowest to highest volatility"));
            }
        }
        states.stream()
                .filter(name -> regimes.stream().noneMatch(list -> list.contains(name)))
                .findFirst()
                .ifPresent(name -> faults.add(new Refusal(
                        "states", "the regime '" + name + "' belongs to no number of 'choose'", "leave it out")));
        return faults;
    }

    private static boolean inOrder(List<String> list, List<String> states) {
        int after = -1;
        for (String name : list) {
            int at = states.indexOf(name);
            if (at <= after) {
                return false;
            }
            after = at;
        }
        return true;
    }
}
