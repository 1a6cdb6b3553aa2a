package sojourn.document;

import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonGenerator;
import com.fasterxml.jackson.core.util.DefaultIndenter;
import com.fasterxml.jackson.core.util.DefaultPrettyPrinter;
import com.fasterxml.jackson.core.util.Separators;
import com.fasterxml.jackson.databind.JsonNode;
import java.io.IOException;
import java.io.StringWriter;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Map;
import sojourn.numeric.ShortestDecimal;

/**
 * A tree as JSON text: keys in the tree's own order, each double as the shortest decimal that reads back to it, {@code \n} at
 * line ends; the same characters on every machine.
 */
public final class JsonText {
    private static final JsonFactory FACTORY = new JsonFactory();

    private JsonText() {}

    /** On one line, without spaces. */
    public static String compact(JsonNode tree) {
        StringWriter text = new StringWriter();
        try (JsonGenerator json = FACTORY.createGenerator(text)) {
            write(tree, json);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
        return text.toString();
    }

    /** {@link #compact} in UTF-8: the bytes that digests are taken of. */
    public static byte[] bytes(JsonNode tree) {
        return compact(tree).getBytes(StandardCharsets.UTF_8);
    }

    /** Indented by two spaces, with a line end at the end: for people. */
    public static String indented(JsonNode tree) {
        StringWriter text = new StringWriter();
        DefaultIndenter indenter = new DefaultIndenter("  ", "\n");
        Separators separators =
                Separators.createDefaultInstance().withObjectFieldValueSpacing(Separators.Spacing.AFTER);
        DefaultPrettyPrinter printer = new DefaultPrettyPrinter(separators);
        printer.indentObjectsWith(indenter);
        printer.indentArraysWith(indenter);
        try (JsonGenerator json = FACTORY.createGenerator(text)) {
            json.setPrettyPrinter(printer);
            write(tree, json);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
        return text + "\n";
    }

    private static void write(JsonNode tree, JsonGenerator json) throws IOException {
        if (tree.isObject()) {
            json.writeStartObject();
            for (Map.Entry<String, JsonNode> entry : tree.properties()) {
                json.writeFieldName(entry.getKey());
                write(entry.getValue(), json);
            }
            json.writeEndObject();
        } else if (tree.isArray()) {
            json.writeStartArray();
            for (JsonNode item : tree) {
                write(item, json);
            }
            json.writeEndArray();
        } else if (tree.isTextual()) {
            json.writeString(tree.textValue());
        } else if (tree.isNumber()) {
            json.writeNumber(number(tree));
        } else if (tree.isBoolean()) {
            json.writeBoolean(tree.booleanValue());
        } else if (tree.isNull()) {
            json.writeNull();
        } else {
            throw new IllegalArgumentException("a " + tree.getNodeType() + " has no text");
        }
    }

    /** A number as JSON and our YAML write it. */
    static String number(JsonNode number) {
        return number.isIntegralNumber() ? number.asText() : ShortestDecimal.of(number.doubleValue());
    }
}
