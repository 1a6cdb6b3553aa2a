package sojourn.document.shape;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import sojourn.document.Node;
import sojourn.document.Shape;

/** A shape that is another one but for what it says otherwise. */
interface Wrapping<S, T> extends Shape<T> {
    /** The other one. */
    Shape<S> source();

    @Override
    default JsonNode resolved(Node node) {
        return source().resolved(node);
    }

    @Override
    default ObjectNode schema() {
        return source().schema();
    }

    @Override
    default String expected() {
        return source().expected();
    }

    @Override
    default boolean mayBe(Node node) {
        return source().mayBe(node);
    }

    @Override
    default String hint(Node node) {
        return source().hint(node);
    }
}
