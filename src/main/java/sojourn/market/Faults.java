package sojourn.market;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.stream.Stream;
import sojourn.document.Problem;
import sojourn.document.Problems;

/** The faults of one file: the first of them by place, and the number of the rest. */
final class Faults {
    private static final int SHOWN = 20;

    private final List<Problem> first = new ArrayList<>();
    private int count;

    void add(Problem problem) {
        count++;
        if (first.size() < SHOWN) {
            first.add(problem);
        }
    }

    void add(Faults others) {
        List<Problem> both = Stream.concat(first.stream(), others.first.stream())
                .sorted(Comparator.comparingInt(Problem::line).thenComparingInt(Problem::column))
                .limit(SHOWN)
                .toList();
        first.clear();
        first.addAll(both);
        count += others.count;
    }

    int count() {
        return count;
    }

    boolean none() {
        return count == 0;
    }

    void addTo(Problems problems) {
        first.forEach(problems::add);
        if (count > first.size()) {
            Problem last = first.get(first.size() - 1);
            problems.add(new Problem(
                    last.file(),
                    last.line(),
                    last.column(),
                    count - first.size() + (count == first.size() + 1 ? " more fault follows" : " more faults follow"),
                    "mend those above first"));
        }
    }
}
