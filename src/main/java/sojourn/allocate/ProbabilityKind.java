package sojourn.allocate;

import java.util.List;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.walk.Reading;

/** Which probability of a regime a rule goes by. */
public enum ProbabilityKind {
    /** Of the regime at this close. */
    FILTERED("filtered", "") {
        @Override
        double[] of(Reading reading) {
            return reading.filtered();
        }
    },
    /** Of the regime one bar ahead. */
    PREDICTED("predicted", "predicted ") {
        @Override
        double[] of(Reading reading) {
            return reading.predicted(1);
        }
    };

    /** Reads the word of the strategy file. */
    public static final Shape<ProbabilityKind> SHAPE = Shapes.word(List.of(values()), ProbabilityKind::word);

    private final String word;
    private final String prefix;

    ProbabilityKind(String word, String prefix) {
        this.word = word;
        this.prefix = prefix;
    }

    /** The word of the strategy file. */
    public String word() {
        return word;
    }

    /** What stands before a regime's name in a sentence. */
    String prefix() {
        return prefix;
    }

    /** One probability a regime. */
    abstract double[] of(Reading reading);
}
