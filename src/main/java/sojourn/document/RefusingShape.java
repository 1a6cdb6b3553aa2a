package sojourn.document;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.Optional;
import java.util.function.Function;

/** A shape with a rule on its value that its schema does not show. */
record RefusingShape<T>(Shape<T> source, Function<? super T, Optional<Refusal>> rule) implements Shape<T> {
    @Override
    public Optional<T> read(Node node, Problems problems) {
        Optional<T> value = source.read(node, problems);
        Optional<Refusal> refusal = value.flatMap(rule);
        if (refusal.isEmpty()) {
            return value;
        }
        Refusal told = refusal.get();
        Node at = node instanceof MapNode map ? map.get(told.key()).orElse(node) : node;
        problems.add(at, told.what(), told.remedy());
        return Optional.empty();
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
