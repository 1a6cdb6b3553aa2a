package sojourn.strategy;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.nio.file.Path;
import java.util.Locale;
import java.util.Map;
import sojourn.document.JsonText;
import sojourn.market.GivenColumns;

/**
 * A strategy and where it was read.
 *
 * @param shownName what messages call the file
 * @param folder the folder that its paths are relative to, absolute
 * @param strategy what it says
 * @param resolved what it says, written out in full
 */
public record StrategyFile(String shownName, Path folder, Strategy strategy, JsonNode resolved) {
    private static final String GIVEN = "given";

    /** The strategy's name as a folder can bear it: lower-case letters, digits and hyphens. */
    public String slug() {
        String plain = strategy.name().toLowerCase(Locale.ROOT).replaceAll("[^a-z0-9]+", "-");
        String trimmed = plain.replaceAll("^-+|-+$", "");
        return trimmed.length() <= 60 ? trimmed : trimmed.substring(0, 60).replaceAll("-+$", "");
    }

    /** The settings that a walk depends on besides prices, in one fixed form. */
    public byte[] walkSettings() {
        ObjectNode settings = JsonNodeFactory.instance.objectNode();
        settings.set("assets", JsonNodeFactory.instance.textNode(String.join(",", strategy.usedAssets())));
        settings.set("regimes", regimes("by content"));
        settings.set("refit", resolved.get("refit"));
        return JsonText.bytes(settings);
    }

    /** The resolved settings with each price and rate file replaced by the digest of what was read from it; no path. */
    public byte[] settingsByContent(Map<String, String> contentByRole) {
        ObjectNode settings = resolved.deepCopy();
        ObjectNode prices = (ObjectNode) settings.get("prices");
        for (String asset : strategy.prices().keySet()) {
            if (contentByRole.containsKey(asset)) {
                prices.put(asset, contentByRole.get(asset));
            }
        }
        if (contentByRole.containsKey(GivenColumns.ROLE)) {
            settings.set("regimes", regimes(contentByRole.get(GivenColumns.ROLE)));
        }
        if (contentByRole.containsKey("cash")) {
            settings.put(
                    "cash",
                    contentByRole.get("cash") + " "
                            + settings.get("cash").path("day-count").asText());
        }
        return JsonText.bytes(settings);
    }

    /** The section {@code regimes}, with {@code content} in place of a file of probabilities. */
    private JsonNode regimes(String content) {
        ObjectNode regimes = resolved.get("regimes").deepCopy();
        return regimes.has(GIVEN) ? regimes.put(GIVEN, content) : regimes;
    }

    /** The resolved settings with every path rewritten to be relative to {@code target}. */
    public JsonNode resolvedFor(Path target) {
        ObjectNode settings = resolved.deepCopy();
        for (JsonNode source : settings.get("prices")) {
            rewrite((ObjectNode) source, target);
        }
        if (settings.get("cash").has("csv")) {
            rewrite((ObjectNode) settings.get("cash"), target);
        }
        if (settings.get("regimes").has(GIVEN)) {
            rewrite((ObjectNode) settings.get("regimes").get(GIVEN), target);
        }
        return settings;
    }

    private void rewrite(ObjectNode source, Path target) {
        Path file = folder.resolve(source.get("csv").asText()).normalize();
        Path relative = target.toAbsolutePath().normalize().relativize(file);
        source.put("csv", relative.toString().replace('\\', '/'));
    }
}
