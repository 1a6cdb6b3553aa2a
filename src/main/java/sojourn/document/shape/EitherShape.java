package sojourn.document.shape;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;
import sojourn.document.Json;
import sojourn.document.Node;
import sojourn.document.Problem;
import sojourn.document.Problems;
import sojourn.document.Shape;
import sojourn.document.Wording;

/**
 * One of several shapes. Of those that the node could be meant for, the first that reads it without fault; if there is
 * none, the one with the fewest faults tells them.
 */
public record EitherShape<T>(List<Shape<? extends T>> alternatives) implements Shape<T> {
    @Override
    public Optional<T> read(Node node, Problems problems) {
        Optional<Problems> least = Optional.empty();
        for (Shape<? extends T> alternative : meantFor(node)) {
            Problems faults = new Problems();
            Optional<T> value = alternative.read(node, faults).map(v -> v);
            if (value.isPresent()) {
                return value;
            }
            if (onlySaysWhatIsExpected(alternative, node, faults)) {
                continue;
            }
            if (least.isEmpty() || faults.list().size() < least.get().list().size()) {
                least = Optional.of(faults);
            }
        }
        if (least.isEmpty()) {
            return Wording.mismatch(this, node, problems);
        }
        least.get().list().forEach(problems::add);
        return Optional.empty();
    }

    private List<Shape<? extends T>> meantFor(Node node) {
        return alternatives.stream().filter(a -> a.mayBe(node)).toList();
    }

    /** Whether the faults say no more than what the alternative expects here, so that all alternatives are better told. */
    private static boolean onlySaysWhatIsExpected(Shape<?> alternative, Node node, Problems faults) {
        List<Problem> list = faults.list();
        return list.isEmpty()
                || (list.size() == 1
                        && list.get(0).what().equals(Wording.found(node))
                        && list.get(0).remedy().equals(Wording.remedy(alternative, node)));
    }

    @Override
    public JsonNode resolved(Node node) {
        for (Shape<? extends T> alternative : meantFor(node)) {
            if (alternative.read(node, new Problems()).isPresent()) {
                return alternative.resolved(node);
            }
        }
        throw new IllegalArgumentException(node.name() + " does not read without fault");
    }

    @Override
    public ObjectNode schema() {
        ObjectNode schema = Json.object();
        ArrayNode anyOf = schema.putArray("anyOf");
        alternatives.forEach(a -> anyOf.add(a.schema()));
        return schema;
    }

    @Override
    public String expected() {
        return alternatives.stream().map(Shape::expected).collect(Collectors.joining(", or "));
    }

    @Override
    public boolean mayBe(Node node) {
        return alternatives.stream().anyMatch(a -> a.mayBe(node));
    }

    @Override
    public String hint(Node node) {
        return alternatives.stream()
                .map(a -> a.hint(node))
                .filter(hint -> !hint.isEmpty())
                .findFirst()
                .orElse("");
    }
}
