package sojourn.document.shape;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.Optional;
import sojourn.document.Json;
import sojourn.document.MapNode;
import sojourn.document.Node;
import sojourn.document.Problems;
import sojourn.document.Shape;

/** A map that is of one shape where a certain key stands in it, and of another where it does not. */
public record KeyedShape<T>(String key, Shape<? extends T> with, Shape<? extends T> without) implements Shape<T> {
    private Shape<? extends T> of(Node node) {
        return node instanceof MapNode map && map.keys().contains(key) ? with : without;
    }

    @Override
    public Optional<T> read(Node node, Problems problems) {
        return of(node).read(node, problems).map(value -> value);
    }

    @Override
    public JsonNode resolved(Node node) {
        return of(node).resolved(node);
    }

    @Override
    public ObjectNode schema() {
        ObjectNode schema = Json.object();
        schema.putObject("if").putArray("required").add(key);
        schema.set("then", with.schema());
        schema.set("else", without.schema());
        return schema;
    }

    @Override
    public String expected() {
        return without.expected();
    }

    @Override
    public boolean mayBe(Node node) {
        return node instanceof MapNode;
    }
}
