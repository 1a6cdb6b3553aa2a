package sojourn.document.shape;

import java.util.Optional;
import java.util.function.Function;
import sojourn.document.Node;
import sojourn.document.Problems;
import sojourn.document.Shape;

/** A shape whose value is given another form. */
public record ConvertedShape<S, T>(Shape<S> source, Function<? super S, ? extends T> conversion)
        implements Wrapping<S, T> {
    @Override
    public Optional<T> read(Node node, Problems problems) {
        return source.read(node, problems).map(conversion);
    }
}
