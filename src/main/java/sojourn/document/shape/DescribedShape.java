package sojourn.document.shape;

import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.Optional;
import sojourn.document.Json;
import sojourn.document.Node;
import sojourn.document.Problems;
import sojourn.document.Shape;

/** A shape that its schema says a sentence on. */
public record DescribedShape<T>(Shape<T> source, String help) implements Wrapping<T, T> {
    @Override
    public Optional<T> read(Node node, Problems problems) {
        return source.read(node, problems);
    }

    @Override
    public ObjectNode schema() {
        ObjectNode schema = Json.object().put("description", help);
        schema.setAll(source.schema());
        return schema;
    }
}
