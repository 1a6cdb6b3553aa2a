package sojourn.document;

import java.util.List;
import java.util.Optional;

/**
 * What came of reading a text by a shape.
 *
 * @param document the tree, if there was one
 * @param value the value, if there was no fault in the shape
 * @param problems every message
 */
record Reading<T>(Optional<Document> document, Optional<T> value, List<String> problems) {
    /** Reads a document as {@code t.yaml}. */
    static <T> Reading<T> of(String text, Shape<T> shape) {
        Problems problems = new Problems();
        Optional<Document> document = Document.parse("t.yaml", text, problems);
        Optional<T> value = document.flatMap(d -> shape.read(d.root(), problems));
        return new Reading<>(
                document, value, problems.list().stream().map(Problem::toString).toList());
    }

    /** Reads the value of the one key {@code x}. */
    static <T> Reading<T> ofValue(String yaml, Shape<T> shape) {
        Field<T> x = Field.required("x", shape, "a value");
        return of("x: " + yaml + "\n", Shapes.object("test", f -> f.get(x), x));
    }
}
