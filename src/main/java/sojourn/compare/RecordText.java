package sojourn.compare;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalInt;
import sojourn.archive.Caution;
import sojourn.archive.Digest;
import sojourn.archive.RecordParts;
import sojourn.archive.RunFacts;
import sojourn.document.JsonText;
import sojourn.market.InputFile;
import sojourn.strategy.StrategyFile;
import sojourn.walk.RegimeTimeline;

/** The text of {@code record.json}: what went in, what was run, what came out, and, apart from that, how this run went. */
final class RecordText {
    private static final JsonNodeFactory JSON = JsonNodeFactory.instance;

    private RecordText() {}

    static String of(String name, Compared compared, RunFacts facts) {
        ObjectNode root = JSON.objectNode();
        root.put("caution", Caution.TEXT);
        root.put("comparison", name);
        root.put("digest", compared.digest());
        root.put("ranked_by", compared.rankBy().key());
        root.set("counts", counts(compared));
        root.set("variants", variants(compared));
        root.set("inputs", inputs(compared.prepared()));
        root.set("timelines", timelines(compared));
        ArrayNode warnings = root.putArray("warnings");
        Warnings.of(compared).forEach(warnings::add);
        root.set("outside_the_digest", RecordParts.outsideTheDigest(facts));
        return JsonText.indented(root);
    }

    private static ObjectNode counts(Compared compared) {
        ObjectNode counts = JSON.objectNode();
        counts.put("variants", compared.ranked().size() + compared.failed().size());
        counts.put("ran", compared.ranked().size());
        counts.put("failed", compared.failed().size());
        counts.put("timelines", compared.timelines().size());
        int fits = 0;
        for (RegimeTimeline timeline : compared.timelines().values()) {
            fits += timeline.fits().size();
        }
        counts.put("fits", fits);
        return counts;
    }

    private static ArrayNode variants(Compared compared) {
        ArrayNode variants = JSON.arrayNode();
        int rank = 1;
        for (Judgement one : compared.ranked()) {
            ObjectNode node = variant(variants.addObject(), one.run().file());
            node.put("outcome", one.strategy().outcome());
            node.put("rank", rank++);
            node.put("timeline", one.run().timelineKey());
            node.put("digest", one.run().digest());
            node.put("orders_unfilled_at_the_end", one.run().track().unfilled().size());
            OptionalInt ruined = one.run().track().ruinedOn();
            if (ruined.isPresent()) {
                node.put(
                        "ruined_on",
                        one.run()
                                .ready()
                                .market()
                                .table()
                                .fillPrices()
                                .axis()
                                .date(ruined.getAsInt())
                                .toString());
            }
        }
        for (Run.Failed one : compared.failed()) {
            ObjectNode node = variant(variants.addObject(), one.file());
            node.put("outcome", "failed");
            node.put("reason", one.reason());
        }
        return variants;
    }

    private static ObjectNode variant(ObjectNode node, StrategyFile file) {
        node.put("variant", file.slug());
        node.put("strategy", file.strategy().name());
        file.strategy().hypothesis().ifPresent(text -> node.put("hypothesis", text.strip()));
        node.put("file", file.shownName());
        node.put("seed", file.strategy().refit().seed());
        node.put("settings_sha256", Digest.of(JsonText.bytes(file.resolved())));
        node.set("settings", file.resolved());
        if (file.strategy().regimes().fixed().isPresent()) {
            node.put("parameters", "external prior: declared in the strategy file, not fitted");
        }
        if (file.strategy().regimes().given().isPresent()) {
            node.put("parameters", "computed elsewhere: not audited for how they were computed");
        }
        return node;
    }

    private static ArrayNode inputs(List<Prepared> prepared) {
        List<InputFile> read = new ArrayList<>();
        for (Prepared one : prepared) {
            if (one instanceof Prepared.Ready ready) {
                read.addAll(ready.market().files());
            }
        }
        return RecordParts.inputs(read);
    }

    private static ArrayNode timelines(Compared compared) {
        ArrayNode timelines = JSON.arrayNode();
        compared.timelines().forEach((key, timeline) -> {
            ObjectNode node = timelines.addObject();
            node.put("timeline", key);
            FitTally tally = FitTally.of(timeline);
            ObjectNode fits = node.putObject("fits");
            tally.outcomes().forEach(fits::put);
            ObjectNode events = node.putObject("fits_with_event");
            tally.events().forEach(events::put);
        });
        return timelines;
    }
}
