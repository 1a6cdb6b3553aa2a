package sojourn.trade;

import java.util.List;
import sojourn.document.Shape;
import sojourn.document.Shapes;

/** At which prices an order's quantities are settled. */
public enum SizeAt {
    /** At the prices of the fill: the target weights are met exactly, which nobody who sends quantities beforehand can do. */
    FILL("fill"),
    /** At the closes of the decision: the quantities are fixed, and the weights after the fill are off by what prices did since. */
    DECISION("decision");

    /** Reads the word of the strategy file. */
    public static final Shape<SizeAt> SHAPE = Shapes.word(List.of(values()), SizeAt::word);

    private final String word;

    SizeAt(String word) {
        this.word = word;
    }

    /** The word of the strategy file. */
    public String word() {
        return word;
    }
}
