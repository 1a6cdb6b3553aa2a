package sojourn.document.shape;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.Optional;
import sojourn.document.Json;
import sojourn.document.Node;
import sojourn.document.Problems;
import sojourn.document.Shape;

/** A shape that its schema says a sentence on. */
public record DescribedShape<T>(Shape<T> source, String help) implements Shape<T> {
    @Override
    public Optional<T> read(Node node, Problems problems) {
        return source.read(node, problems);
    }

    @Override
    public JsonNode resolved(Node node) {
        return source.resolved(node);
    }

    @Override
    public ObjectNode schema() {
        ObjectNode schema = Json.object().put("description", help);
        schema.setAll(source.schema());
        return schema;
    }

    @Override
    public String expected() {
        return source.expected();
    }

    @Override
    public boolean mayBe(Node node) {
        return source.mayBe(node);
    }

    @Override
    public String hint(Node node) {
        return source.hint(node);
    }
}
