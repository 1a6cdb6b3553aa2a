package sojourn.allocate;

import java.util.LinkedHashMap;
import java.util.Map;
import sojourn.document.Shape;
import sojourn.document.Shapes;

/** The registry of rules: a new rule is one file and one line here. */
public final class Rules {
    /** Reads the section {@code allocate}: exactly one rule. */
    public static final Shape<Rule> SHAPE = Shapes.oneKey(byWord());

    private Rules() {}

    private static Map<String, Shape<? extends Rule>> byWord() {
        Map<String, Shape<? extends Rule>> shapes = new LinkedHashMap<>();
        shapes.put(Switch.WORD, Switch.SHAPE);
        shapes.put(Table.WORD, Table.SHAPE);
        shapes.put(Blend.WORD, Blend.SHAPE);
        return shapes;
    }
}
