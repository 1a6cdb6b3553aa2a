package sojourn.regime;

import java.util.ArrayList;
import java.util.List;

/** Which numbers of a row are there, and which are missing, in ascending order of columns. */
record Pattern(List<Integer> present, List<Integer> absent) {
    /** Copies its lists. */
    Pattern {
        present = List.copyOf(present);
        absent = List.copyOf(absent);
    }

    /** The pattern of a row. */
    static Pattern of(Observations x, int row) {
        List<Integer> present = new ArrayList<>();
        List<Integer> absent = new ArrayList<>();
        for (int i = 0; i < x.dimension(); i++) {
            (x.missing(row, i) ? absent : present).add(i);
        }
        return new Pattern(present, absent);
    }
}
