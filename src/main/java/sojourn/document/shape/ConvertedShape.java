package sojourn.document.shape;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.Optional;
import java.util.function.Function;
import sojourn.document.Node;
import sojourn.document.Problems;
import sojourn.document.Shape;

/** A shape whose value is given another form. */
public record ConvertedShape<S, T>(Shape<S> source, Function<? super S, ? extends T> conversion) implements Shape<T> {
    @Override
    public Optional<T> read(Node node, Problems problems) {
        return source.read(node, problems).map(conversion);
    }

    @Override
    public JsonNode resolved(Node node) {
        return source.resolved(node);
    }

    @Override
    public ObjectNode schema() {
        return source.schema();
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
