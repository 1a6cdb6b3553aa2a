package sojourn.document;

import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import org.yaml.snakeyaml.error.Mark;
import org.yaml.snakeyaml.error.MarkedYAMLException;
import org.yaml.snakeyaml.error.YAMLException;
import org.yaml.snakeyaml.reader.ReaderException;

/** Turns the parser's syntax errors into one message each, in our own words and at the place that needs mending. */
final class SyntaxFault {
    private static final String QUOTE_IT = "put the text in quotes if it is meant as text";
    private static final List<Known> KNOWN = List.of(
            new Known("", "\\t", At.ERROR, "a tab stands where only spaces can", "indent with spaces"),
            new Known(
                    "quoted scalar",
                    "end of stream",
                    At.START,
                    "the quote that opens here is never closed",
                    "close it with the same quote"),
            new Known(
                    "simple key",
                    "could not find expected ':'",
                    At.START,
                    "a key has no colon after it",
                    "write 'key: value' with a space after the colon"),
            new Known(
                    "flow sequence",
                    "",
                    At.START,
                    "the list that opens here with [ is not closed",
                    "put commas between its items and close it with ]"),
            new Known(
                    "flow mapping",
                    "",
                    At.START,
                    "the map that opens here with { is not closed",
                    "put commas between its entries and close it with }"),
            new Known(
                    "double-quoted scalar",
                    "",
                    At.ERROR,
                    "a double-quoted text holds an unknown escape after its backslash",
                    "double the backslash, or use single quotes"),
            new Known(
                    "",
                    "mapping values are not allowed",
                    At.ERROR,
                    "a colon stands where no key can",
                    "put the text in quotes, or check the indentation"),
            new Known(
                    "",
                    "expected <block end>",
                    At.ERROR,
                    "the indentation does not match the lines above",
                    "line keys of one map up in one column, under the key they belong to"),
            new Known("", "cannot start any token", At.ERROR, "a value cannot begin with this character", QUOTE_IT),
            new Known("directive", "", At.ERROR, "this line with % is not a directive that YAML knows", "remove it"),
            new Known("", "(version", At.ERROR, "this version of YAML is not known", "remove the line with %YAML"),
            new Known("alias", "", At.ERROR, "an alias has no proper name", QUOTE_IT),
            new Known("anchor", "", At.ERROR, "an anchor has no proper name", QUOTE_IT),
            new Known("block scalar", "", At.ERROR, "a text block (| or >) is not written properly", QUOTE_IT));
    private static final Known OTHER = new Known("", "", At.ERROR, "this is not YAML", "check what stands before it");

    private SyntaxFault() {}

    /** Which of the parser's two marks shows what needs mending: where the construct began, or where it failed. */
    private enum At {
        START,
        ERROR
    }

    /** An error recognised by what the parser says it was doing and what it found; "" matches anything. */
    private record Known(String context, String problem, At at, String what, String remedy) {
        boolean fits(MarkedYAMLException error) {
            return contains(error.getContext(), context) && contains(error.getProblem(), problem);
        }

        private static boolean contains(@Nullable String said, String part) {
            return part.isEmpty() || (said != null && said.contains(part));
        }
    }

    static Problem of(YAMLException error, String file, String text) {
        if (error instanceof ReaderException reader) {
            Place place = TextPlace.ofCodePoint(file, text, reader.getPosition());
            String what = String.format(Locale.ROOT, "the control character U+%04X stands here", reader.getCodePoint());
            return new Problem(file, place.line(), place.column(), what, "remove it");
        }
        if (error instanceof MarkedYAMLException marked) {
            Known known = KNOWN.stream().filter(k -> k.fits(marked)).findFirst().orElse(OTHER);
            Mark there = marked.getProblemMark();
            Mark mark = known.at() == At.START
                    ? Optional.ofNullable(marked.getContextMark()).orElse(there)
                    : there;
            return new Problem(file, mark.getLine() + 1, mark.getColumn() + 1, known.what(), known.remedy());
        }
        return new Problem(file, 0, 0, OTHER.what(), "check the file's syntax");
    }
}
