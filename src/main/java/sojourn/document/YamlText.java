package sojourn.document;

import com.fasterxml.jackson.databind.JsonNode;
import java.io.StringWriter;
import java.util.ArrayList;
import java.util.List;
import java.util.regex.Pattern;
import org.yaml.snakeyaml.DumperOptions;
import org.yaml.snakeyaml.DumperOptions.FlowStyle;
import org.yaml.snakeyaml.DumperOptions.ScalarStyle;
import org.yaml.snakeyaml.Yaml;
import org.yaml.snakeyaml.nodes.MappingNode;
import org.yaml.snakeyaml.nodes.NodeTuple;
import org.yaml.snakeyaml.nodes.SequenceNode;
import org.yaml.snakeyaml.nodes.Tag;

/**
 * A tree as YAML text that {@link Document} reads back to the same tree: keys in the tree's own order, each double as the
 * shortest decimal that reads back to it, text in quotes wherever a reader of YAML might take it for something else. Lists of
 * single values stand on one line.
 */
public final class YamlText {
    private static final Pattern PLAIN = Pattern.compile("[A-Za-z_/.][A-Za-z0-9_/.+-]*( [A-Za-z0-9_/.+(),-]+)*");

    private YamlText() {}

    /** The text, with a line end at the end. */
    public static String of(JsonNode tree) {
        DumperOptions options = new DumperOptions();
        options.setDefaultFlowStyle(FlowStyle.BLOCK);
        options.setLineBreak(DumperOptions.LineBreak.UNIX);
        options.setSplitLines(false);
        options.setWidth(Integer.MAX_VALUE);
        options.setIndent(2);
        StringWriter text = new StringWriter();
        new Yaml(options).serialize(node(tree), text);
        return text.toString();
    }

    private static org.yaml.snakeyaml.nodes.Node node(JsonNode tree) {
        if (tree.isObject()) {
            List<NodeTuple> entries = new ArrayList<>();
            tree.properties()
                    .forEach(entry -> entries.add(new NodeTuple(text(entry.getKey()), node(entry.getValue()))));
            return new MappingNode(Tag.MAP, entries, FlowStyle.BLOCK);
        }
        if (tree.isArray()) {
            List<org.yaml.snakeyaml.nodes.Node> items = new ArrayList<>();
            boolean singleValues = true;
            for (JsonNode item : tree) {
                items.add(node(item));
                singleValues &= item.isValueNode();
            }
            return new SequenceNode(Tag.SEQ, items, singleValues ? FlowStyle.FLOW : FlowStyle.BLOCK);
        }
        if (tree.isTextual()) {
            return text(tree.textValue());
        }
        if (tree.isNumber()) {
            return scalar(tree.isIntegralNumber() ? Tag.INT : Tag.FLOAT, JsonText.number(tree), ScalarStyle.PLAIN);
        }
        if (tree.isBoolean()) {
            return scalar(Tag.BOOL, tree.asText(), ScalarStyle.PLAIN);
        }
        if (tree.isNull()) {
            return scalar(Tag.NULL, "null", ScalarStyle.PLAIN);
        }
        throw new IllegalArgumentException("a " + tree.getNodeType() + " has no text");
    }

    private static org.yaml.snakeyaml.nodes.Node text(String text) {
        // SnakeYAML itself quotes plain text that YAML 1.1 would read otherwise: no, on, 2020-01-01.
        boolean plain = PLAIN.matcher(text).matches()
                && PlainScalar.refusal(text).isEmpty()
                && PlainScalar.kind(text) == ScalarNode.Kind.TEXT;
        return scalar(Tag.STR, text, plain ? ScalarStyle.PLAIN : ScalarStyle.DOUBLE_QUOTED);
    }

    private static org.yaml.snakeyaml.nodes.Node scalar(Tag tag, String text, ScalarStyle style) {
        return new org.yaml.snakeyaml.nodes.ScalarNode(tag, text, null, null, style);
    }
}
