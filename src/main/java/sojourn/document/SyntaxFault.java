package sojourn.document;

import java.util.Optional;
import org.yaml.snakeyaml.error.Mark;
import org.yaml.snakeyaml.error.MarkedYAMLException;
import org.yaml.snakeyaml.error.YAMLException;
import org.yaml.snakeyaml.reader.ReaderException;

/**
 * A syntax error of the text, in our own words and at one place.
 *
 * @param place says where, once the text is at hand
 * @param what what is wrong
 * @param remedy what to do
 */
record SyntaxFault(Where place, String what, String remedy) {
    private static final String CHECK_INDENTATION =
            "line keys of one map up in one column, under the key they belong to";

    /** A line and column, both 1-based, or the index of a code point. */
    private record Where(int line, int column, Optional<Integer> codePoint) {
        static Where of(Mark mark) {
            return new Where(mark.getLine() + 1, mark.getColumn() + 1, Optional.empty());
        }
    }

    static SyntaxFault of(YAMLException error) {
        if (error instanceof ReaderException reader) {
            return new SyntaxFault(
                    new Where(0, 0, Optional.of(reader.getPosition())),
                    String.format(
                            java.util.Locale.ROOT, "the control character U+%04X stands here", reader.getCodePoint()),
                    "remove it");
        }
        if (error instanceof MarkedYAMLException marked) {
            return of(marked);
        }
        return new SyntaxFault(new Where(0, 0, Optional.empty()), "this is not YAML", "check the file's syntax");
    }

    private static SyntaxFault of(MarkedYAMLException error) {
        String context = Optional.ofNullable(error.getContext()).orElse("");
        String problem = Optional.ofNullable(error.getProblem()).orElse("");
        Where there = Where.of(error.getProblemMark());
        Where start = Optional.ofNullable(error.getContextMark()).map(Where::of).orElse(there);
        if (problem.contains("\\t")) {
            return new SyntaxFault(there, "a tab stands where only spaces can", "indent with spaces");
        }
        if (context.contains("quoted scalar") && problem.contains("end of stream")) {
            return new SyntaxFault(start, "the quote that opens here is never closed", "close it with the same quote");
        }
        if (problem.contains("could not find expected ':'")) {
            return new SyntaxFault(
                    start, "a key has no colon after it", "write 'key: value' with a space after the colon");
        }
        if (context.contains("flow sequence")) {
            return new SyntaxFault(
                    start,
                    "the list that opens here with [ is not closed",
                    "put commas between its items and close it with ]");
        }
        if (context.contains("flow mapping")) {
            return new SyntaxFault(
                    start,
                    "the map that opens here with { is not closed",
                    "put commas between its entries and close it with }");
        }
        if (context.contains("directive") || problem.contains("YAML document (version")) {
            return new SyntaxFault(there, "this line with % is not a directive that YAML knows", "remove it");
        }
        if (context.contains("double-quoted scalar")) {
            String what = "a double-quoted text holds an unknown escape after its backslash";
            return new SyntaxFault(there, what, "double the backslash, or use single quotes");
        }
        return new SyntaxFault(there, sentence(problem, context), remedy(problem));
    }

    private static String sentence(String problem, String context) {
        if (problem.contains("mapping values are not allowed")) {
            return "a colon stands where no key can";
        }
        if (problem.contains("expected <block end>")) {
            return "the indentation does not match the lines above";
        }
        if (problem.contains("cannot start any token")) {
            return "a value cannot begin with this character";
        }
        if (context.contains("alias") || context.contains("anchor")) {
            return "an anchor or alias has no proper name";
        }
        if (context.contains("block scalar")) {
            return "a text block (| or >) is not written properly";
        }
        return "this is not YAML";
    }

    private static String remedy(String problem) {
        if (problem.contains("mapping values are not allowed")) {
            return "put the text in quotes, or check the indentation";
        }
        if (problem.contains("expected <block end>")) {
            return CHECK_INDENTATION;
        }
        return "put the text in quotes if it is meant as text";
    }

    Problem problem(String file, String text) {
        if (place.codePoint().isPresent()) {
            Place found = TextPlace.ofCodePoint(file, text, place.codePoint().get());
            return new Problem(file, found.line(), found.column(), what, remedy);
        }
        return new Problem(file, place.line(), place.column(), what, remedy);
    }
}
