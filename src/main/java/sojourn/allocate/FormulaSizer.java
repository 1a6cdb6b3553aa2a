package sojourn.allocate;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.regex.Pattern;

/** {@link Formula} at work. */
final class FormulaSizer implements Sizer {
    private static final MathContext SHOWN = new MathContext(3);

    private final Formula rule;
    private final List<String> assets;
    private final FormulaNames names;
    private final Map<String, FormulaProgram> programs = new LinkedHashMap<>();

    FormulaSizer(Formula rule, List<String> regimes, List<String> assets) {
        this.rule = rule;
        this.assets = List.copyOf(assets);
        this.names = new FormulaNames(regimes, assets);
        FormulaLanguage language = new FormulaLanguage(names);
        rule.weights().forEach((asset, expression) -> programs.put(asset, language.program(expression)));
    }

    @Override
    public Wish weights(Situation situation, double[] probabilities, Stance lived) {
        FormulaMoment moment = new FormulaMoment(rule, situation, probabilities, lived);
        double[] weights = new double[assets.size()];
        for (Map.Entry<String, FormulaProgram> one : programs.entrySet()) {
            FormulaProgram.Result result = one.getValue().at(moment);
            if (result instanceof FormulaProgram.None none) {
                return Wish.Undefined.because("the formula of " + one.getKey() + " gives " + none.instead());
            }
            weights[assets.indexOf(one.getKey())] = ((FormulaProgram.Weight) result).value();
        }
        return Weights.of(weights);
    }

    @Override
    public Because because(Situation situation, double[] probabilities, Stance lived) {
        return () -> sentence(situation, probabilities, lived);
    }

    private String sentence(Situation situation, double[] probabilities, Stance lived) {
        int[] chosen =
                rule.weights().keySet().stream().mapToInt(assets::indexOf).toArray();
        String found =
                "the formula asks for " + Figure.weights(weights(situation, probabilities, lived), assets, chosen);
        FormulaMoment moment = new FormulaMoment(rule, situation, probabilities, lived);
        List<String> used = new ArrayList<>();
        names.numbers().forEach((name, value) -> {
            if (uses(name)) {
                used.add(name + " "
                        + new BigDecimal(value.apply(moment))
                                .round(SHOWN)
                                .stripTrailingZeros()
                                .toPlainString());
            }
        });
        names.truths().forEach((name, value) -> {
            if (uses(name)) {
                used.add((value.apply(moment) ? "" : "not ") + name);
            }
        });
        return used.isEmpty() ? found : found + " at " + String.join(", ", used);
    }

    private boolean uses(String name) {
        Pattern whole = Pattern.compile("(?<![\\w.])" + Pattern.quote(name) + "(?![\\w.])");
        return rule.weights().values().stream()
                .anyMatch(text -> whole.matcher(text).find());
    }
}
