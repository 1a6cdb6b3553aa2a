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
        shapes.put(
                Switch.WORD,
                Switch.SHAPE.described(
                        "two sets of weights; one regime's probability decides between them, with hysteresis"));
        shapes.put(Table.WORD, Table.SHAPE.described("the weights of the most likely regime"));
        shapes.put(Blend.WORD, Blend.SHAPE.described("the weights of all regimes, averaged by their probabilities"));
        shapes.put(
                VolatilityTarget.WORD,
                VolatilityTarget.SHAPE.described(
                        "as much of a mix, or of each asset, as keeps its forecast volatility" + " at a stated level"));
        shapes.put(
                MinimumVariance.WORD,
                MinimumVariance.SHAPE.described("weights of a stated sum with the least forecast variance"));
        shapes.put(
                MeanVariance.WORD,
                MeanVariance.SHAPE.described("the weights that forecast return and risk speak for, within the limits"));
        shapes.put(
                Formula.WORD,
                Formula.SHAPE.described(
                        "one expression an asset, in the Common Expression Language, over a few known names"));
        return shapes;
    }
}
