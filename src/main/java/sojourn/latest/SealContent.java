package sojourn.latest;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.List;
import java.util.Optional;
import sojourn.allocate.Decision;
import sojourn.allocate.Weights;
import sojourn.archive.Digest;
import sojourn.archive.RecordParts;
import sojourn.document.JsonText;
import sojourn.market.AssetName;
import sojourn.trade.Basket;
import sojourn.trade.Fill;
import sojourn.trade.Holdings;

/** A decision and what it rests on, for machines: what a seal holds, and what stands in the output of {@code latest}. */
public final class SealContent {
    private SealContent() {}

    /** All but the rows of prices. */
    static ObjectNode of(Latest latest) {
        ObjectNode node = JsonNodeFactory.instance.objectNode();
        node.put("strategy", latest.ready().file().strategy().name());
        node.put("as_of", latest.standing().asOf().toString());
        node.put("bars", latest.standing().table().size());
        node.put(
                "settings_sha256",
                Digest.of(JsonText.bytes(latest.ready().file().resolved())));
        node.set("settings", latest.ready().file().resolved());
        node.set("inputs", RecordParts.inputs(latest.ready().market().files()));
        latest.holdings().ifPresent(holdings -> node.set("holdings", holdings(latest, holdings)));
        node.set("decision", decision(latest));
        return node;
    }

    private static ObjectNode holdings(Latest latest, Holdings holdings) {
        ObjectNode node = JsonNodeFactory.instance.objectNode();
        List<String> assets = latest.standing().table().assets();
        for (int asset = 0; asset < assets.size(); asset++) {
            node.put(assets.get(asset), holdings.units().get(asset));
        }
        return node.put(AssetName.CASH, holdings.cash());
    }

    /** What was decided: regimes, target, reason, orders. */
    public static ObjectNode decision(Latest latest) {
        ObjectNode node = JsonNodeFactory.instance.objectNode();
        latest.regime().ifPresent(regime -> {
            ObjectNode probabilities = node.putObject("probability");
            for (int k = 0; k < regime.regimes().size(); k++) {
                probabilities.put(regime.regimes().get(k), regime.filtered().get(k));
            }
            node.put("fit", regime.fit().number());
            node.put("fitted_on", regime.fit().fittedOn().toString());
        });
        latest.decision().ifPresentOrElse(decision -> add(node, decision, latest), () -> node.put("kind", "ruined"));
        ArrayNode orders = node.putArray("orders");
        latest.orders().forEach(order -> orders.add(order(latest, order)));
        return node;
    }

    private static void add(ObjectNode node, Decision decision, Latest latest) {
        node.put("kind", KindWords.of(decision.kind()));
        decision.target()
                .ifPresent(target -> node.set(
                        "target", weights(target, latest.standing().table().assets())));
        node.put("because", decision.because().sentence());
    }

    /** Weights by asset, and cash. */
    public static ObjectNode weights(Weights weights, List<String> assets) {
        ObjectNode node = JsonNodeFactory.instance.objectNode();
        for (int asset = 0; asset < assets.size(); asset++) {
            node.put(assets.get(asset), weights.at(asset));
        }
        return node.put(AssetName.CASH, weights.cash());
    }

    private static ObjectNode order(Latest latest, ProposedOrder proposed) {
        List<String> assets = latest.standing().table().assets();
        ObjectNode node = JsonNodeFactory.instance.objectNode();
        node.put(
                "decided_on",
                latest.standing().known().date(proposed.order().decidedOn()).toString());
        node.put("bars_to_fill", proposed.barsToFill(latest.standing()));
        node.set("target", weights(proposed.order().target(), assets));
        Optional<Basket> basket = proposed.basket();
        if (basket.isEmpty()) {
            return node.put("undefined", "nothing would be left after its costs");
        }
        ArrayNode legs = node.putArray("legs");
        for (Fill leg : basket.get().legs()) {
            ObjectNode one = legs.addObject();
            one.put("asset", assets.get(leg.asset()));
            one.put("units", leg.units());
            one.put("price", leg.price());
            one.put("notional", leg.notional());
            one.put("estimated_cost", leg.charges().total());
        }
        ArrayNode hindrances = node.putArray("hindrances");
        basket.get()
                .hindrances()
                .forEach(one -> hindrances.add(
                        assets.get(one.asset()) + " " + one.kind().sentence()));
        node.put("estimated_cost", basket.get().cost());
        return node;
    }
}
