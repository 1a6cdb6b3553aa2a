package sojourn.allocate;

import dev.cel.runtime.CelEvaluationException;
import dev.cel.runtime.CelRuntime;
import dev.cel.runtime.CelVariableResolver;
import java.util.Optional;
import java.util.function.Function;

/** One expression, compiled. */
final class FormulaProgram {
    private final CelRuntime.Program program;
    private final FormulaNames names;

    FormulaProgram(CelRuntime.Program program, FormulaNames names) {
        this.program = program;
        this.names = names;
    }

    /** What came of running an expression. */
    sealed interface Result {}

    /** A finite number. */
    record Weight(double value) implements Result {}

    /** No finite number, and what instead. */
    record None(String instead) implements Result {}

    /** The value at one close. */
    Result at(FormulaMoment moment) {
        try {
            CelVariableResolver values = name -> value(name, moment);
            double value = (Double) program.eval(values);
            return Double.isFinite(value)
                    ? new Weight(value + 0.0) // a zero without sign
                    : new None(Double.isNaN(value) ? "no number" : "an infinite number");
        } catch (CelEvaluationException e) {
            return new None("no number (" + cause(e) + ")");
        }
    }

    private static String cause(CelEvaluationException e) {
        Throwable deepest = e;
        while (deepest.getCause() != null) {
            deepest = deepest.getCause();
        }
        return String.valueOf(deepest.getMessage());
    }

    private Optional<Object> value(String name, FormulaMoment moment) {
        Function<FormulaMoment, Double> number = names.numbers().get(name);
        if (number != null) {
            return Optional.of(number.apply(moment));
        }
        return Optional.ofNullable(names.truths().get(name)).map(truth -> truth.apply(moment));
    }
}
