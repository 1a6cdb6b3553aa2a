package sojourn.walk;

import java.util.function.Function;
import sojourn.document.Field;
import sojourn.document.Fields;
import sojourn.document.Shape;
import sojourn.document.Shapes;

/** How a strategy file says of which asset an observation is: its name alone, or a map that can say more. */
final class Observed {
    /** The asset. */
    static final Field<String> OF = Field.required("of", Shapes.text(), "the asset whose prices are observed");

    /** How late the observation is. */
    static final Field<Integer> KNOWN_AFTER = Field.defaulted(
            "known-after",
            Shapes.integer().atLeast(0),
            "0",
            "how many bars late it is known: a close sees only what is dated at least so many bars before");

    private Observed() {}

    /** An observation that needs nothing but its asset; {@code help} is one sentence on it, with its formula. */
    static Shape<Observation> shape(String word, Function<String, Observation> of, String help) {
        Shape<Observation> name = Shapes.text().as(of);
        Shape<Observation> map = Shapes.object(word, f -> late(of.apply(f.get(OF)), f), OF, KNOWN_AFTER);
        return Shapes.<Observation>either(name, map).described(help);
    }

    /** The observation, as late as the map says. */
    static Observation late(Observation observation, Fields fields) {
        int bars = fields.get(KNOWN_AFTER);
        return bars == 0 ? observation : new KnownAfter(observation, bars);
    }
}
