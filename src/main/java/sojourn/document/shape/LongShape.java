package sojourn.document.shape;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.Optional;
import sojourn.document.Json;
import sojourn.document.Node;
import sojourn.document.Problems;
import sojourn.document.ScalarNode;
import sojourn.document.Shape;
import sojourn.document.Wording;

/** A whole number that fits a long. */
public record LongShape() implements Shape<Long> {
    @Override
    public Optional<Long> read(Node node, Problems problems) {
        Optional<Long> value = WholeNumbers.read(node, Long.MIN_VALUE, Long.MAX_VALUE);
        return value.isPresent() ? value : Wording.mismatch(this, node, problems);
    }

    @Override
    public JsonNode resolved(Node node) {
        return Json.number(((ScalarNode) node).decimal().longValueExact());
    }

    @Override
    public ObjectNode schema() {
        return Json.typed("integer").put("minimum", Long.MIN_VALUE).put("maximum", Long.MAX_VALUE);
    }

    @Override
    public String expected() {
        return "a whole number";
    }

    @Override
    public boolean mayBe(Node node) {
        return WholeNumbers.isNumber(node);
    }

    @Override
    public String hint(Node node) {
        return WholeNumbers.unquoteHint(node) + WholeNumbers.beyondHint(node, Long.MIN_VALUE, Long.MAX_VALUE);
    }
}
