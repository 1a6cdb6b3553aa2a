package sojourn.document;

import com.fasterxml.jackson.databind.node.ObjectNode;

/** The JSON Schema of a whole file, for editors: it accepts what the shape reads, save for rules that no schema can state. */
public final class SchemaText {
    private static final String DRAFT = "https://json-schema.org/draft/2020-12/schema";

    private SchemaText() {}

    /** The schema as a tree: draft, title, then the shape's own. */
    public static ObjectNode tree(String title, Shape<?> shape) {
        ObjectNode schema = Json.object().put("$schema", DRAFT).put("title", title);
        schema.setAll(shape.schema());
        return schema;
    }

    /** The schema as indented JSON. */
    public static String of(String title, Shape<?> shape) {
        return JsonText.indented(tree(title, shape));
    }
}
