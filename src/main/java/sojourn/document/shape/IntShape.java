package sojourn.document.shape;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.Optional;
import sojourn.document.IntegerShape;
import sojourn.document.Json;
import sojourn.document.Node;
import sojourn.document.Problems;
import sojourn.document.ScalarNode;
import sojourn.document.Wording;

/** A whole number from {@code low} to {@code high}. */
public record IntShape(int low, int high) implements IntegerShape {
    public static final IntShape ANY = new IntShape(Integer.MIN_VALUE, Integer.MAX_VALUE);

    @Override
    public IntegerShape atLeast(int bound) {
        return new IntShape(bound, high);
    }

    @Override
    public IntegerShape atMost(int bound) {
        return new IntShape(low, bound);
    }

    @Override
    public Optional<Integer> read(Node node, Problems problems) {
        Optional<Integer> value = WholeNumbers.read(node, low, high).map(Math::toIntExact);
        return value.isPresent() ? value : Wording.mismatch(this, node, problems);
    }

    @Override
    public JsonNode resolved(Node node) {
        return Json.number(((ScalarNode) node).decimal().longValueExact());
    }

    @Override
    public ObjectNode schema() {
        ObjectNode schema = Json.typed("integer");
        return schema.put("minimum", low).put("maximum", high);
    }

    @Override
    public String expected() {
        return WholeNumbers.expected(low, high, Integer.MIN_VALUE, Integer.MAX_VALUE);
    }

    @Override
    public boolean mayBe(Node node) {
        return WholeNumbers.isNumber(node);
    }

    @Override
    public String hint(Node node) {
        return WholeNumbers.unquoteHint(node) + WholeNumbers.beyondHint(node, Integer.MIN_VALUE, Integer.MAX_VALUE);
    }
}
