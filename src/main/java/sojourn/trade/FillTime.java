package sojourn.trade;

import java.util.List;
import sojourn.document.Shape;
import sojourn.document.Shapes;

/** When orders fill, as the strategy file says it. */
public enum FillTime {
    /** At the close of the bar after the decision. */
    NEXT_CLOSE("next-close") {
        @Override
        public FillRule delayed(int bars) {
            return new NextClose(bars);
        }
    },
    /** At the open of the bar after the decision. */
    NEXT_OPEN("next-open") {
        @Override
        public FillRule delayed(int bars) {
            return new NextOpen(bars);
        }
    };

    /** Reads the word of the strategy file. */
    public static final Shape<FillTime> SHAPE = Shapes.word(List.of(values()), FillTime::word);

    private final String word;

    FillTime(String word) {
        this.word = word;
    }

    /** The word of the strategy file. */
    public String word() {
        return word;
    }

    /** The rule, {@code bars} further bars later. */
    public abstract FillRule delayed(int bars);
}
