package sojourn.market;

import java.util.Optional;
import java.util.Set;
import sojourn.document.Refusal;
import sojourn.document.Shape;
import sojourn.document.Shapes;

/** What an asset may be called: names stand in formulas and in the headers of result files. */
public final class AssetName {
    /** What the strategy file calls money that is not invested; no asset may take the name. */
    public static final String CASH = "cash";

    /** Identifiers and keywords that the Common Expression Language reserves (its specification, section Syntax). */
    private static final Set<String> RESERVED = Set.of(
            "true",
            "false",
            "null",
            "in",
            "as",
            "break",
            "const",
            "continue",
            "else",
            "for",
            "function",
            "if",
            "import",
            "let",
            "loop",
            "package",
            "namespace",
            "return",
            "var",
            "void",
            "while");

    /** A lower-case name, not {@link #CASH} and not a word of the formula language. */
    public static final Shape<String> SHAPE = Shapes.textLike(
                    "[a-z][a-z0-9_]*", "a name of lower-case letters, digits and _ that starts with a letter")
            .refuse(AssetName::refusal);

    private AssetName() {}

    private static Optional<Refusal> refusal(String name) {
        if (name.equals(CASH)) {
            return Optional.of(new Refusal("", "'cash' is what the rest of the money is called", "give another name"));
        }
        if (RESERVED.contains(name)) {
            return Optional.of(
                    new Refusal("", "'" + name + "' is a word of the formula language", "give another name"));
        }
        return Optional.empty();
    }
}
