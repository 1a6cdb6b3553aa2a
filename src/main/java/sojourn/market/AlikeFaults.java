package sojourn.market;

import java.util.ArrayList;
import java.util.List;
import sojourn.document.Problem;

/** Faults of one kind in one column: the first few of them, and how many there are. */
final class AlikeFaults {
    private static final int EXAMPLES = 3;

    private final List<Problem> examples = new ArrayList<>();
    private String remedy = "";
    private int count;

    /** A message, and the number of faults that it stands for. */
    record Told(Problem problem, int faults) {}

    void add(Problem problem, String remedyForAll) {
        count++;
        remedy = remedyForAll;
        if (examples.size() < EXAMPLES) {
            examples.add(problem);
        }
    }

    /** One message if at least half of the rows have the fault, otherwise one for each example; the last counts the rest. */
    List<Told> told(int rows) {
        if (count > EXAMPLES && count >= rows - count) {
            return List.of(new Told(saying(examples.get(0), ", and so in " + count + " of " + rows + " rows"), count));
        }
        List<Told> told = new ArrayList<>();
        examples.forEach(example -> told.add(new Told(example, 1)));
        int more = count - examples.size();
        if (more > 0) {
            String like = ", and " + more + (more == 1 ? " more row like it" : " more rows like it");
            told.set(EXAMPLES - 1, new Told(saying(examples.get(EXAMPLES - 1), like), more + 1));
        }
        return told;
    }

    private Problem saying(Problem example, String howMany) {
        return new Problem(example.file(), example.line(), example.column(), example.what() + howMany, remedy);
    }
}
