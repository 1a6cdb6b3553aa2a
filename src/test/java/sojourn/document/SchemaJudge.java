package sojourn.document;

import com.fasterxml.jackson.databind.JsonNode;
import com.networknt.schema.Error;
import com.networknt.schema.Schema;
import com.networknt.schema.SchemaRegistry;
import com.networknt.schema.SpecificationVersion;
import java.util.List;

/** An independent validator's verdict by the schema that a shape emits; formats (dates) are asserted. */
public final class SchemaJudge {
    private final Schema schema;

    /** By the schema of {@code shape}. */
    public SchemaJudge(Shape<?> shape) {
        SchemaRegistry registry = SchemaRegistry.withDefaultDialect(SpecificationVersion.DRAFT_2020_12);
        this.schema = registry.getSchema(SchemaText.tree("test", shape));
    }

    /** What the schema finds. */
    public List<String> faults(JsonNode json) {
        return schema
                .validate(json, context -> context.executionConfig(config -> config.formatAssertionsEnabled(true)))
                .stream()
                .map(Error::toString)
                .toList();
    }

    /** Whether the schema finds no fault. */
    public boolean accepts(JsonNode json) {
        return faults(json).isEmpty();
    }
}
