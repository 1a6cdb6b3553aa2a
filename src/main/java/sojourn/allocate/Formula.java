package sojourn.allocate;

import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import sojourn.document.Field;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.market.AssetName;

/**
 * The weight of each asset by an expression in the Common Expression Language over the names of {@link FormulaNames}. Limits bind
 * what it asks for, as they bind every rule. A result that is no finite number, of any asset, is no decision.
 *
 * @param weights an expression by asset; assets that have none get 0
 */
public record Formula(Map<String, String> weights, Manner manner) implements Sizing {
    /** The key under {@code allocate}. */
    static final String WORD = "formula";

    private static final String POINTER = "/" + WORD + "/weights";
    private static final Pattern OF_ASSET =
            Pattern.compile("(?:forecast\\s*\\.\\s*(?:mean|volatility)|weight)\\s*\\.\\s*([a-z][a-z0-9_]*)");

    private static final Field<Map<String, String>> WEIGHTS = Field.required(
            "weights",
            Shapes.named(Shapes.text(), Shapes.text()),
            "for each asset, an expression for the fraction of wealth in it; the rest is cash");

    /** Reads the map under {@code formula}. */
    public static final Shape<Formula> SHAPE =
            Shapes.object(WORD, f -> new Formula(f.get(WEIGHTS), Manner.from(f)), RuleKeys.and(WEIGHTS));

    /** Copies the expressions, in order. */
    public Formula {
        weights = RuleKeys.ordered(weights);
    }

    @Override
    public String word() {
        return WORD;
    }

    /** Those that get a weight, and those that the expressions ask about. */
    @Override
    public Set<String> namedAssets() {
        Set<String> named = new LinkedHashSet<>(weights.keySet());
        for (String expression : weights.values()) {
            for (Matcher found = OF_ASSET.matcher(expression); found.find(); ) {
                named.add(found.group(1));
            }
        }
        named.remove(AssetName.CASH);
        return named;
    }

    /** Names, syntax and types: every expression is compiled. */
    @Override
    public List<Misfit> misfits(List<String> regimes, List<String> assets) {
        List<Misfit> misfits = new ArrayList<>(Misfit.inWeights(POINTER, weights.keySet(), assets));
        FormulaLanguage language = new FormulaLanguage(new FormulaNames(regimes, assets));
        weights.forEach((asset, expression) -> {
            for (FormulaFault fault : language.faults(expression)) {
                misfits.add(new Misfit(
                        RuleKeys.child(POINTER, asset), Misfit.At.VALUE, fault.at(), fault.what(), fault.remedy()));
            }
        });
        return misfits;
    }

    @Override
    public Mechanism mechanism(List<String> regimes, List<String> assets, Limits limits) {
        return new Sized(this, List.copyOf(regimes), new FormulaSizer(this, regimes, assets));
    }
}
