package sojourn.allocate;

import dev.cel.common.CelIssue;
import java.util.ArrayList;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import sojourn.document.Nearest;
import sojourn.document.Quoted;

/** Puts the faults of one expression into words. */
final class FormulaFaults {
    private static final Pattern NAME = Pattern.compile("[A-Za-z_][A-Za-z0-9_]*(?:\\s*\\.\\s*[A-Za-z_][A-Za-z0-9_]*)*");
    private static final Pattern OPERATOR = Pattern.compile("[%&|^~=<>!*/+-]+");
    private static final Pattern CALLED = Pattern.compile("[A-Za-z_][A-Za-z0-9_]*\\s*$");
    private static final Pattern UNEXPECTED = Pattern.compile(
            "(?:(?:mismatched|extraneous) input '|token recognition error at: '|no viable alternative at input ')(.*?)'(?: expecting.*)?",
            Pattern.DOTALL);
    private static final Pattern OVERLOAD =
            Pattern.compile("found no matching overload for '(.*?)' applied to '\\((.*?)\\)'.*", Pattern.DOTALL);
    private static final Pattern RESULT = Pattern.compile("expected type 'double' but found '(.*?)'.*", Pattern.DOTALL);

    private final String expression;
    private final FormulaNames names;

    FormulaFaults(String expression, FormulaNames names) {
        this.expression = expression;
        this.names = names;
    }

    FormulaFault ofSyntax(CelIssue issue) {
        Matcher unexpected = UNEXPECTED.matcher(issue.getMessage());
        if (!unexpected.matches()) {
            return new FormulaFault(
                    offset(issue), "the formula cannot be read: " + firstLine(issue), "write it shorter or simpler");
        }
        boolean end = unexpected.group(1).equals("<EOF>");
        return new FormulaFault(
                offset(issue),
                end ? "the formula ends too early" : "the formula cannot go on with " + Quoted.of(unexpected.group(1)),
                end ? "finish it" : "write an operator before it, or leave it out");
    }

    private int offset(CelIssue issue) {
        int line = issue.getSourceLocation().getLine();
        int start = 0;
        for (int i = 1; i < line; i++) {
            start = expression.indexOf('\n', start) + 1;
        }
        int most = expression.codePointCount(0, expression.length());
        return Math.min(
                most,
                expression.codePointCount(0, start) + issue.getSourceLocation().getColumn());
    }

    /** {@code at}: the character of the piece at fault. */
    FormulaFault ofMeaning(CelIssue issue, int at) {
        if (issue.getMessage().startsWith("undeclared reference")) {
            return unknown(at);
        }
        Matcher overload = OVERLOAD.matcher(issue.getMessage());
        if (overload.matches()) {
            String what = overload.group(1).replaceAll("[_@]", "").replace("?:", "? :");
            return new FormulaFault(
                    at,
                    "'" + what + "' does not go with " + inWords(overload.group(2)),
                    "give it what it takes: numbers for"
                            + " arithmetic and comparisons, truths for && || ! and before ?");
        }
        Matcher result = RESULT.matcher(issue.getMessage());
        if (result.matches()) {
            return new FormulaFault(
                    at,
                    "the formula gives " + inWords(result.group(1)) + " where a number is wanted",
                    "for a truth, write: truth ? number : number");
        }
        return new FormulaFault(
                at, "the formula cannot be understood: " + firstLine(issue), "write it with numbers and truths only");
    }

    /** A call is placed at its parenthesis, a name at its first letter. */
    private FormulaFault unknown(int at) {
        int from = expression.offsetByCodePoints(0, at);
        if (expression.startsWith("(", from)) {
            Matcher called = CALLED.matcher(expression).region(0, from);
            boolean named = called.find();
            int start = named ? expression.codePointCount(0, called.start()) : at;
            return unknown(start, "function ", named ? called.group().strip() : "(", FormulaFunctions.names());
        }
        Matcher name = NAME.matcher(expression).region(from, expression.length());
        Matcher operator = OPERATOR.matcher(expression).region(from, expression.length());
        if (operator.lookingAt()) {
            return new FormulaFault(
                    at,
                    "formulas know no operator " + Quoted.of(operator.group()),
                    "known: + - * / < <= > >= == != && || ! and truth ? number : number");
        }
        String found = name.lookingAt() ? name.group().replaceAll("\\s", "") : expression.substring(from);
        List<String> known = new ArrayList<>(names.numbers().keySet());
        known.addAll(names.truths().keySet());
        return unknown(at, "name ", found, known);
    }

    private static FormulaFault unknown(int at, String kind, String found, List<String> known) {
        return new FormulaFault(
                at,
                "formulas know no " + kind + Quoted.of(found),
                Nearest.hint(found, known) + "known: " + String.join(", ", known));
    }

    private static String inWords(String types) {
        List<String> words = new ArrayList<>();
        for (String type : types.split(", ", -1)) {
            words.add(
                    switch (type) {
                        case "double", "int", "uint" -> "a number";
                        case "bool" -> "a truth";
                        case "string" -> "a text";
                        default -> type.isEmpty() ? "nothing" : "a " + type;
                    });
        }
        return String.join(" and ", words);
    }

    private static String firstLine(CelIssue issue) {
        return issue.getMessage().lines().findFirst().orElse("");
    }
}
