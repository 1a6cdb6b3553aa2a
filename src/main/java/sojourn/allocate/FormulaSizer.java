package sojourn.allocate;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.regex.Pattern;

/** {@link Formula} at work. */
final class FormulaSizer implements Sizer {
    private static final MathContext SHOWN = new MathContext(3);
    /** What a close says by itself, unlike weights held, which are known of this close alone. */
    private static final String OF_THE_CLOSE = "(probability|forecast)\\..*";

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
    public String sentence(Close close) {
        int[] chosen =
                rule.weights().keySet().stream().mapToInt(assets::indexOf).toArray();
        String found = "the formula asks for " + Figure.weights(weights(close), assets, chosen);
        FormulaMoment now = moment(close);
        Optional<FormulaMoment> before = close.closeBefore().map(this::moment);
        List<String> used = new ArrayList<>();
        names.numbers().forEach((name, value) -> {
            if (uses(name)) {
                Optional<FormulaMoment> then = before.filter(moment -> name.matches(OF_THE_CLOSE));
                used.add(name + " " + shown(value.apply(now))
                        + then.map(moment -> " (the bar before " + shown(value.apply(moment)) + ")")
                                .orElse(""));
            }
        });
        names.truths().forEach((name, value) -> {
            if (uses(name)) {
                used.add((value.apply(now) ? "" : "not ") + name);
            }
        });
        return used.isEmpty() ? found : found + " at " + String.join(", ", used);
    }

    private FormulaMoment moment(Close close) {
        return new FormulaMoment(rule, close.situation(), close.probabilities(), close.lived());
    }

    private static String shown(double value) {
        return new BigDecimal(value).round(SHOWN).stripTrailingZeros().toPlainString();
    }

    private boolean uses(String name) {
        Pattern whole = Pattern.compile("(?<![\\w.])" + Pattern.quote(name) + "(?![\\w.])");
        return rule.weights().values().stream()
                .anyMatch(text -> whole.matcher(text).find());
    }
}
