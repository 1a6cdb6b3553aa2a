package sojourn.report;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.Map;
import sojourn.archive.Caution;
import sojourn.document.JsonText;
import sojourn.evidence.Answer;
import sojourn.latest.AssetOutlook;
import sojourn.latest.Latest;
import sojourn.latest.SealContent;
import sojourn.latest.TippingReturns;

/** What a strategy would do now, for machines. Fractions, not percents; what is undefined has a reason. */
public final class LatestJson {
    private LatestJson() {}

    /** The whole, with tipping returns by observed asset. */
    public static String of(Latest latest, Map<String, Answer<TippingReturns>> tipping) {
        ObjectNode root = JsonNodeFactory.instance.objectNode();
        root.put("caution", Caution.TEXT);
        root.put("strategy", latest.ready().file().strategy().name());
        root.put("as_of", latest.standing().asOf().toString());
        root.put("bars", latest.standing().table().size());
        latest.regime().ifPresent(regime -> {
            ObjectNode node = root.putObject("regime");
            node.put("most_likely", regime.regimes().get(regime.mostLikely()));
            node.put("age_bars", regime.ageBars());
            ObjectNode filtered = node.putObject("filtered");
            ObjectNode predicted = node.putObject("predicted");
            for (int k = 0; k < regime.regimes().size(); k++) {
                filtered.put(regime.regimes().get(k), regime.filtered().get(k));
                predicted.put(regime.regimes().get(k), regime.predicted().get(k));
            }
        });
        ObjectNode forecast = root.putObject("forecast");
        for (AssetOutlook one : latest.outlook()) {
            ObjectNode node = forecast.putObject(one.asset());
            node.put("last_close", one.close());
            node.put("mean", one.mean());
            node.put("volatility", one.volatility());
        }
        root.set("decision", SealContent.decision(latest));
        ObjectNode returns = root.putObject("tipping");
        latest.next().ifPresent(next -> {
            root.put("next_bar", next.date().toString());
            root.put("refit_at_next_bar", next.refit().word());
        });
        tipping.forEach((asset, answer) -> returns.set(asset, tipping(answer)));
        return JsonText.indented(root);
    }

    private static ObjectNode tipping(Answer<TippingReturns> answer) {
        ObjectNode node = JsonNodeFactory.instance.objectNode();
        if (answer.found().isEmpty()) {
            return node.put("undefined_because", answer.because());
        }
        TippingReturns found = answer.found().get();
        ArrayNode calm = node.putArray("unchanged");
        found.calm().forEach(one -> {
            ObjectNode interval = calm.addObject();
            interval.put("from", one.low());
            interval.put("to", one.high());
        });
        ArrayNode borders = node.putArray("borders");
        found.borders().forEach(one -> {
            ObjectNode border = borders.addObject();
            border.put("return", one.at());
            border.put("tips", one.tips().word());
            border.put("because", one.because());
        });
        return node.put("probability_of_tipping", found.chance());
    }
}
