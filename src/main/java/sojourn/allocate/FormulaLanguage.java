package sojourn.allocate;

import dev.cel.checker.CelStandardDeclarations;
import dev.cel.checker.CelStandardDeclarations.StandardFunction;
import dev.cel.common.CelAbstractSyntaxTree;
import dev.cel.common.CelIssue;
import dev.cel.common.CelMutableAst;
import dev.cel.common.CelOptions;
import dev.cel.common.CelValidationException;
import dev.cel.common.CelValidationResult;
import dev.cel.common.ast.CelConstant;
import dev.cel.common.ast.CelExpr.ExprKind.Kind;
import dev.cel.common.ast.CelMutableExpr;
import dev.cel.common.types.SimpleType;
import dev.cel.compiler.CelCompiler;
import dev.cel.compiler.CelCompilerBuilder;
import dev.cel.compiler.CelCompilerFactory;
import dev.cel.runtime.CelEvaluationException;
import dev.cel.runtime.CelRuntime;
import dev.cel.runtime.CelRuntimeFactory;
import java.util.ArrayList;
import java.util.List;

/**
 * The part of the Common Expression Language that formulas are written in: numbers, truths, {@code + - * /}, comparisons,
 * {@code && || ! ?:}, the names of {@link FormulaNames} and the functions of {@link FormulaFunctions}. No macros, so that nothing
 * repeats and the length of an expression bounds its cost. Every number is a double, also one written without a point: otherwise
 * {@code 1/2} would be 0 and {@code 1 - p} a fault of types.
 */
final class FormulaLanguage {
    private static final int MOST_CHARACTERS = 2_000;
    private static final int MOST_NODES = 500;
    private static final int DEEPEST = 40;

    private static final CelOptions OPTIONS = CelOptions.current()
            .maxExpressionCodePointSize(MOST_CHARACTERS)
            .maxParseExpressionNodeCount(MOST_NODES)
            .maxParseRecursionDepth(DEEPEST)
            .enableComprehension(false)
            .enableHeterogeneousNumericComparisons(true)
            .build();

    private final FormulaNames names;
    private final CelCompiler compiler;

    FormulaLanguage(FormulaNames names) {
        this.names = names;
        CelCompilerBuilder builder = CelCompilerFactory.standardCelCompilerBuilder()
                .setOptions(OPTIONS)
                .setStandardMacros()
                .setStandardEnvironmentEnabled(false)
                .setStandardDeclarations(operators())
                .addFunctionDeclarations(FormulaFunctions.declarations())
                .setResultType(SimpleType.DOUBLE);
        names.numbers().keySet().forEach(name -> builder.addVar(name, SimpleType.DOUBLE));
        names.truths().keySet().forEach(name -> builder.addVar(name, SimpleType.BOOL));
        this.compiler = builder.build();
    }

    private static CelStandardDeclarations operators() {
        return CelStandardDeclarations.newBuilder()
                .includeFunctions(
                        StandardFunction.CONDITIONAL,
                        StandardFunction.LOGICAL_AND,
                        StandardFunction.LOGICAL_OR,
                        StandardFunction.LOGICAL_NOT,
                        StandardFunction.EQUALS,
                        StandardFunction.NOT_EQUALS,
                        StandardFunction.LESS,
                        StandardFunction.LESS_EQUALS,
                        StandardFunction.GREATER,
                        StandardFunction.GREATER_EQUALS,
                        StandardFunction.ADD,
                        StandardFunction.SUBTRACT,
                        StandardFunction.MULTIPLY,
                        StandardFunction.DIVIDE,
                        StandardFunction.NEGATE)
                .build();
    }

    /** What is wrong with an expression; empty if it can be run. */
    List<FormulaFault> faults(String expression) {
        FormulaFaults faults = new FormulaFaults(expression, names);
        CelValidationResult parsed = compiler.parse(expression);
        if (parsed.hasError()) {
            return List.of(faults.ofSyntax(parsed.getErrors().get(0)));
        }
        CelAbstractSyntaxTree tree = tree(parsed);
        List<FormulaFault> found = new ArrayList<>();
        for (CelIssue issue : compiler.check(allDouble(tree)).getErrors()) {
            Integer at = tree.getSource().getPositionsMap().get(issue.getExprId());
            found.add(faults.ofMeaning(issue, at == null ? 0 : at));
        }
        return found.stream().distinct().toList();
    }

    /** The expression, ready to run; it must be without faults. */
    FormulaProgram program(String expression) {
        try {
            CelAbstractSyntaxTree tree = tree(compiler.parse(expression));
            CelRuntime runtime = CelRuntimeFactory.plannerRuntimeBuilder()
                    .setOptions(OPTIONS)
                    .addFunctionBindings(FormulaFunctions.bindings())
                    .build();
            CelRuntime.Program program = runtime.createProgram(tree(compiler.check(allDouble(tree))));
            return new FormulaProgram(program, names);
        } catch (CelEvaluationException e) {
            throw new IllegalArgumentException("formula '" + expression + "' cannot be run: " + e.getMessage(), e);
        }
    }

    private static CelAbstractSyntaxTree tree(CelValidationResult result) {
        try {
            return result.getAst();
        } catch (CelValidationException e) {
            throw new IllegalArgumentException(e.getMessage(), e);
        }
    }

    private static CelAbstractSyntaxTree allDouble(CelAbstractSyntaxTree tree) {
        CelMutableAst copy = CelMutableAst.fromCelAst(tree);
        makeDouble(copy.expr());
        return copy.toParsedAst();
    }

    private static void makeDouble(CelMutableExpr node) {
        if (node.getKind() == Kind.CONSTANT && node.constant().getKind() == CelConstant.Kind.INT64_VALUE) {
            node.setConstant(CelConstant.ofValue((double) node.constant().int64Value()));
        } else if (node.getKind() == Kind.SELECT) {
            makeDouble(node.select().operand());
        } else if (node.getKind() == Kind.LIST) {
            node.list().elements().forEach(FormulaLanguage::makeDouble);
        } else if (node.getKind() == Kind.CALL) {
            node.call().target().ifPresent(FormulaLanguage::makeDouble);
            node.call().args().forEach(FormulaLanguage::makeDouble);
        }
    }
}
