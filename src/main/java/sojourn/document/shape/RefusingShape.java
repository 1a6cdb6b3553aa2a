package sojourn.document.shape;

import java.util.List;
import java.util.Optional;
import java.util.function.Function;
import sojourn.document.MapNode;
import sojourn.document.Node;
import sojourn.document.Problems;
import sojourn.document.Refusal;
import sojourn.document.Shape;

/** A shape with a rule on its value that its schema does not show. */
public record RefusingShape<T>(Shape<T> source, Function<? super T, List<Refusal>> rule) implements Wrapping<T, T> {
    @Override
    public Optional<T> read(Node node, Problems problems) {
        Optional<T> value = source.read(node, problems);
        Optional<T> judged = value.or(
                () -> source instanceof ObjectShape<T> object ? object.withoutMisplaced(node) : Optional.empty());
        List<Refusal> refusals = judged.<List<Refusal>>map(rule).orElse(List.of());
        for (Refusal refusal : refusals) {
            Node at = node instanceof MapNode map ? map.get(refusal.key()).orElse(node) : node;
            problems.add(at, refusal.what(), refusal.remedy());
        }
        return refusals.isEmpty() ? value : Optional.empty();
    }
}
