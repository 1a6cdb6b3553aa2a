package sojourn.evidence;

import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.Map;
import sojourn.archive.Caution;
import sojourn.archive.Digest;
import sojourn.archive.RecordParts;
import sojourn.archive.ResultFolder;
import sojourn.archive.RunFacts;
import sojourn.document.JsonText;
import sojourn.strategy.StrategyFile;

/** Writes an inquiry into a folder of its own, which names the comparison that it belongs to. */
public final class RegimesWriter {
    private RegimesWriter() {}

    /** Writes below {@code results} under {@code name}. */
    public static ResultFolder.Published write(Path results, String name, RegimeInquiry inquiry, RunFacts facts) {
        Map<String, String> files = new LinkedHashMap<>();
        files.put("regimes.json", RegimesJson.of(inquiry));
        files.put("bars.csv", RegimeTables.bars(inquiry.findings()).csv());
        files.put("forecasts.csv", RegimeTables.forecasts(inquiry.findings()).csv());
        files.put("lineage.csv", RegimeTables.lineage(inquiry.findings()).csv());
        files.put("influence.csv", RegimeTables.influence(inquiry.findings()).csv());
        Digest digest = Digest.begin().text("regimes").text(inquiry.comparisonDigest());
        files.forEach((file, text) -> digest.text(file).text(text));
        String hex = digest.hex();
        try (ResultFolder folder = ResultFolder.begin(results)) {
            files.forEach(folder::write);
            return folder.publish(name, hex, record(name, hex, inquiry, facts));
        }
    }

    private static String record(String name, String digest, RegimeInquiry inquiry, RunFacts facts) {
        StrategyFile file = inquiry.ready().file();
        ObjectNode root = JsonNodeFactory.instance.objectNode();
        root.put("caution", Caution.TEXT);
        root.put("regimes", name);
        root.put("digest", digest);
        root.put("comparison_digest", inquiry.comparisonDigest());
        root.put("timeline", inquiry.ready().timelineKey());
        root.put("strategy", file.strategy().name());
        root.put("file", file.shownName());
        root.put("seed", file.strategy().refit().seed());
        root.put("settings_sha256", Digest.of(JsonText.bytes(file.resolved())));
        root.set("settings", file.resolved());
        root.set("inputs", RecordParts.inputs(inquiry.ready().market().files()));
        root.set("outside_the_digest", RecordParts.outsideTheDigest(facts));
        return JsonText.indented(root);
    }
}
