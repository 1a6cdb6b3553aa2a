package sojourn.allocate;

import com.google.common.collect.ImmutableList;
import dev.cel.common.CelFunctionDecl;
import dev.cel.common.CelOverloadDecl;
import dev.cel.common.types.CelType;
import dev.cel.common.types.SimpleType;
import dev.cel.runtime.CelEvaluationException;
import dev.cel.runtime.CelFunctionBinding;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import sojourn.numeric.Exp;

/** The functions that formulas may call besides operators; of fixed bits on every machine. */
final class FormulaFunctions {
    private static final Map<String, Integer> ARGUMENTS = new LinkedHashMap<>();

    static {
        ARGUMENTS.put("min", 2);
        ARGUMENTS.put("max", 2);
        ARGUMENTS.put("abs", 1);
        ARGUMENTS.put("sqrt", 1);
        ARGUMENTS.put("exp", 1);
        ARGUMENTS.put("log", 1);
    }

    private FormulaFunctions() {}

    static List<String> names() {
        return List.copyOf(ARGUMENTS.keySet());
    }

    static List<CelFunctionDecl> declarations() {
        List<CelFunctionDecl> declarations = new ArrayList<>();
        ARGUMENTS.forEach((name, count) -> {
            List<CelType> numbers = new ArrayList<>();
            for (int i = 0; i < count; i++) {
                numbers.add(SimpleType.DOUBLE);
            }
            declarations.add(CelFunctionDecl.newFunctionDeclaration(
                    name,
                    CelOverloadDecl.newGlobalOverload(name + "_of", SimpleType.DOUBLE, ImmutableList.copyOf(numbers))));
        });
        return declarations;
    }

    static List<CelFunctionBinding> bindings() {
        return List.of(
                CelFunctionBinding.from("min_of", Double.class, Double.class, Math::min),
                CelFunctionBinding.from("max_of", Double.class, Double.class, Math::max),
                CelFunctionBinding.from("abs_of", Double.class, Math::abs),
                CelFunctionBinding.from("sqrt_of", Double.class, FormulaFunctions::root),
                CelFunctionBinding.from("exp_of", Double.class, Exp::of),
                CelFunctionBinding.from("log_of", Double.class, FormulaFunctions::logarithm));
    }

    private static double root(double x) throws CelEvaluationException {
        if (!(x >= 0)) {
            throw new CelEvaluationException("sqrt of " + x);
        }
        return Math.sqrt(x);
    }

    private static double logarithm(double x) throws CelEvaluationException {
        if (!(x > 0)) {
            throw new CelEvaluationException("log of " + x);
        }
        return StrictMath.log(x);
    }
}
