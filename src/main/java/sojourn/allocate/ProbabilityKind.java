package sojourn.allocate;

import java.util.List;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.walk.Reading;

/** Which probability of a regime a rule goes by. */
public enum ProbabilityKind {
    /** Of the regime at this close. */
    FILTERED("filtered", "", 0) {
        @Override
        double[] of(Reading reading) {
            return reading.filtered();
        }
    },
    /** Of the regime one bar ahead. */
    PREDICTED("predicted", "predicted ", 1) {
        @Override
        double[] of(Reading reading) {
            return reading.predicted(1);
        }
    };

    /** Reads the word of the strategy file. */
    public static final Shape<ProbabilityKind> SHAPE = Shapes.word(List.of(values()), ProbabilityKind::word);

    private final String word;
    private final String prefix;
    private final int barsAhead;

    ProbabilityKind(String word, String prefix, int barsAhead) {
        this.word = word;
        this.prefix = prefix;
        this.barsAhead = barsAhead;
    }

    /** The word of the strategy file. */
    public String word() {
        return word;
    }

    /** What stands before a regime's name in a sentence. */
    String prefix() {
        return prefix;
    }

    /** Bars from the close to the one that the probabilities are of. */
    int barsAhead() {
        return barsAhead;
    }

    /** One probability a regime. */
    abstract double[] of(Reading reading);
}
