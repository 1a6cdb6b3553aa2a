package sojourn.document;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;
import sojourn.document.shape.ConvertedShape;
import sojourn.document.shape.DescribedShape;
import sojourn.document.shape.RefusingShape;

/**
 * One declaration of what a piece of a document looks like: it reads a located node into a {@code T}, writes the node
 * out resolved, and emits the JSON Schema that accepts the same nodes.
 *
 * @param <T> what a well-formed node means
 */
public interface Shape<T> {
    /** Reads {@code node}; every fault is added to {@code problems}; empty exactly if this node had a fault. */
    Optional<T> read(Node node, Problems problems);

    /** The node written out in full: defaults filled in, numbers as numbers. Only for a node that reads without fault. */
    JsonNode resolved(Node node);

    /** The JSON Schema (draft 2020-12) of this shape; a fresh object each time. */
    ObjectNode schema();

    /** What is expected, for messages: "a number from 0 to 1", "one of daily, weekly, monthly". */
    String expected();

    /** Whether a node of this kind could be meant for this shape (a map, a list, a number, a word); decides between alternatives. */
    boolean mayBe(Node node);

    /** What a node that is not of this shape was probably meant to be: "did you mean 'weekly'? ", or "" if there is no telling. */
    default String hint(Node node) {
        return "";
    }

    /** The same shape with a sentence in its schema: for the variants of a choice, which are no {@link Field}s. */
    default Shape<T> described(String help) {
        return new DescribedShape<>(this, help);
    }

    /** The same shape with its value converted; {@code conversion} must not fail. */
    default <U> Shape<U> as(Function<? super T, ? extends U> conversion) {
        return new ConvertedShape<>(this, conversion);
    }

    /**
     * The same shape with a rule that no JSON Schema can state; {@code rule} gives the refusal of a bad value. A refusal may
     * name a key of the node, at whose value the fault is then placed.
     */
    default Shape<T> refuse(Function<? super T, Optional<Refusal>> rule) {
        return refuseEach(value -> rule.apply(value).map(List::of).orElse(List.of()));
    }

    /** The same for a rule that may have several refusals of one value. */
    default Shape<T> refuseEach(Function<? super T, List<Refusal>> rule) {
        return new RefusingShape<>(this, rule);
    }
}
