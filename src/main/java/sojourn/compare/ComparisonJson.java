package sojourn.compare;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.nio.file.Path;
import java.util.OptionalDouble;
import sojourn.archive.Caution;
import sojourn.archive.ComparisonRow;
import sojourn.archive.DifferenceJson;
import sojourn.document.JsonText;
import sojourn.measure.Measure;
import sojourn.measure.Unit;

/** A comparison for machines: the rows of {@code comparison.csv} with undefined values as null, the digest and the folder. */
public final class ComparisonJson {
    private ComparisonJson() {}

    /** The text. */
    public static String of(Compared compared, Path folder) {
        ObjectNode root = JsonNodeFactory.instance.objectNode();
        root.put("caution", Caution.TEXT);
        root.put("digest", compared.digest());
        root.put("folder", folder.toString());
        root.put("ranked_by", compared.rankBy().key());
        ArrayNode rows = root.putArray("rows");
        for (ComparisonRow row : compared.rows()) {
            ObjectNode node = rows.addObject();
            node.put("variant", row.variant());
            node.put("kind", row.kind().word());
            node.put("timeline", row.timeline());
            node.put("parameters", row.parameters().word());
            node.put("outcome", row.outcome());
            node.put("reason", row.reason());
            row.judged().ifPresent(judged -> add(node, judged));
        }
        ObjectNode differences = root.putObject("differences_to_buy_and_hold");
        ObjectNode switchers = root.putObject("random_switchers");
        for (Judgement one : compared.ranked()) {
            String name = one.run().file().slug();
            differences.set(name, DifferenceJson.of(one.difference().perYear()));
            one.randomSwitches().ifPresent(switches -> switchers.set(name, DifferenceJson.of(switches)));
        }
        return JsonText.indented(root);
    }

    private static void add(ObjectNode node, ComparisonRow.Judged judged) {
        node.put("from", judged.from().toString());
        node.put("to", judged.to().toString());
        node.put("bars", judged.bars());
        for (Measure measure : Measure.values()) {
            OptionalDouble number = judged.get(measure).number();
            if (number.isPresent() && measure.unit() == Unit.BARS) {
                node.put(measure.key(), (long) number.getAsDouble());
            } else if (number.isPresent()) {
                node.put(measure.key(), number.getAsDouble());
            } else {
                node.putNull(measure.key());
            }
        }
    }
}
