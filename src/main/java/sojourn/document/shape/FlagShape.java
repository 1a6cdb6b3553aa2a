package sojourn.document.shape;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.BooleanNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import sojourn.document.Json;
import sojourn.document.Node;
import sojourn.document.Problems;
import sojourn.document.ScalarNode;
import sojourn.document.Shape;
import sojourn.document.Wording;

/** true or false. */
public record FlagShape() implements Shape<Boolean> {
    private static final List<String> TRUE_LIKE = List.of("true", "yes", "on", "y", "1");
    private static final List<String> FALSE_LIKE = List.of("false", "no", "off", "n", "0");

    @Override
    public Optional<Boolean> read(Node node, Problems problems) {
        return mayBe(node) ? Optional.of(value(node)) : Wording.mismatch(this, node, problems);
    }

    @Override
    public JsonNode resolved(Node node) {
        return BooleanNode.valueOf(value(node));
    }

    private static boolean value(Node node) {
        return ((ScalarNode) node).text().equals("true");
    }

    @Override
    public ObjectNode schema() {
        return Json.typed("boolean");
    }

    @Override
    public String expected() {
        return "true or false";
    }

    @Override
    public boolean mayBe(Node node) {
        return node instanceof ScalarNode scalar && scalar.kind() == ScalarNode.Kind.FLAG;
    }

    @Override
    public String hint(Node node) {
        String word = node instanceof ScalarNode scalar ? scalar.text().toLowerCase(Locale.ROOT) : "";
        if (TRUE_LIKE.contains(word)) {
            return "did you mean true, without quotes? ";
        }
        return FALSE_LIKE.contains(word) ? "did you mean false, without quotes? " : "";
    }
}
