package sojourn.document.shape;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.Optional;
import java.util.regex.Pattern;
import sojourn.document.Json;
import sojourn.document.Node;
import sojourn.document.Problems;
import sojourn.document.ScalarNode;
import sojourn.document.Shape;
import sojourn.document.Wording;

/** Text that is not empty and, if there is a pattern, matches it whole. */
public record TextShape(Optional<Pattern> pattern, String expected) implements Shape<String> {
    @Override
    public Optional<String> read(Node node, Problems problems) {
        if (mayBe(node)) {
            String text = ((ScalarNode) node).text();
            if (pattern.map(p -> p.matcher(text).matches()).orElse(!text.isEmpty())) {
                return Optional.of(text);
            }
        }
        return Wording.mismatch(this, node, problems);
    }

    @Override
    public JsonNode resolved(Node node) {
        return Json.text(((ScalarNode) node).text());
    }

    @Override
    public ObjectNode schema() {
        ObjectNode schema = Json.typed("string");
        pattern.ifPresentOrElse(
                p -> schema.put("pattern", "^(?:" + p.pattern() + ")$"), () -> schema.put("minLength", 1));
        return schema;
    }

    @Override
    public boolean mayBe(Node node) {
        return isText(node);
    }

    @Override
    public String hint(Node node) {
        return quoteHint(node);
    }

    static boolean isText(Node node) {
        return node instanceof ScalarNode scalar && scalar.kind() == ScalarNode.Kind.TEXT;
    }

    /** For a number or flag that would be text within quotes. */
    private static String quoteHint(Node node) {
        boolean unquoted = node instanceof ScalarNode scalar
                && (scalar.kind() == ScalarNode.Kind.NUMBER || scalar.kind() == ScalarNode.Kind.FLAG);
        return unquoted ? "did you mean \"" + ((ScalarNode) node).text() + "\", in quotes? " : "";
    }
}
