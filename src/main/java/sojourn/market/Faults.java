package sojourn.market;

import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import sojourn.document.Problem;
import sojourn.document.Problems;
import sojourn.market.AlikeFaults.Told;

/** The faults of one file: those that are one mistake on many rows told together, the first of all by place, and the number of the rest. */
final class Faults {
    private static final int SHOWN = 20;

    private final String owner;
    private final Map<Kind, AlikeFaults> kinds = new LinkedHashMap<>();
    private int rows;
    private int alone;

    /** None so far. {@code owner} is what the file is for, in the plural: {@code prices of 'gold'}. */
    Faults(String owner) {
        this.owner = owner;
    }

    /**
     * What makes faults alike.
     *
     * @param name of the mistake
     * @param column of the table, counted from 0; -1 for the row as a whole
     */
    record Kind(String name, int column) {}

    /** What the file is for, in the plural. */
    String owner() {
        return owner;
    }

    /** Adds a fault that is like no other. */
    void add(Problem problem) {
        add(problem, new Kind("alone " + alone++, -1), problem.remedy());
    }

    /** Adds a fault of a row. {@code remedy} is what to do if most rows have one of its kind; the latest one given is told. */
    void add(Problem problem, Kind kind, String remedy) {
        kinds.computeIfAbsent(kind, first -> new AlikeFaults()).add(problem, remedy);
    }

    /** Adds faults of kinds that are not among these yet. */
    void add(Faults others) {
        kinds.putAll(others.kinds);
    }

    /** Says how many rows were looked at. */
    void lookedAt(int number) {
        rows = number;
    }

    boolean none() {
        return kinds.isEmpty();
    }

    void addTo(Problems problems) {
        List<Told> told = kinds.values().stream()
                .flatMap(alike -> alike.told(rows).stream())
                .sorted(Comparator.comparingInt((Told one) -> one.problem().line())
                        .thenComparingInt(one -> one.problem().column()))
                .toList();
        told.stream().limit(SHOWN).forEach(one -> problems.add(named(one.problem())));
        int more = told.stream().skip(SHOWN).mapToInt(Told::faults).sum();
        if (more > 0) {
            Problem last = told.get(SHOWN - 1).problem();
            problems.add(new Problem(
                    last.file(),
                    last.line(),
                    last.column(),
                    more + (more == 1 ? " more fault follows" : " more faults follow"),
                    "mend those above first"));
        }
    }

    /** A fault of the file as a whole says what the file is for; one at a line shows it by what stands there. */
    private Problem named(Problem problem) {
        return problem.line() > 0
                ? problem
                : new Problem(problem.file(), 0, 0, problem.what() + " (" + owner + ")", problem.remedy());
    }
}
