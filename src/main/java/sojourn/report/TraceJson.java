package sojourn.report;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.List;
import sojourn.allocate.Stance;
import sojourn.archive.Caution;
import sojourn.document.JsonText;
import sojourn.latest.FilterStep;
import sojourn.latest.SealContent;
import sojourn.latest.Standing;
import sojourn.latest.Trace;
import sojourn.market.QuotedBar;
import sojourn.trade.Fill;
import sojourn.trade.LedgerEntry;
import sojourn.trade.Track;
import sojourn.walk.Observation;

/** One bar with every number behind it, for machines. */
public final class TraceJson {
    private TraceJson() {}

    /** The whole. */
    public static String of(Trace trace) {
        Standing standing = trace.standing();
        ObjectNode root = JsonNodeFactory.instance.objectNode();
        root.put("caution", Caution.TEXT);
        root.put("strategy", standing.strategy().name());
        root.put("date", standing.asOf().toString());
        root.put("bar", standing.bar() + 1);
        root.set("prices", prices(standing));
        trace.step()
                .ifPresent(step -> root.set(
                        "filter", filter(step, standing.strategy().regimes().observe())));
        ObjectNode parameters = root.putObject("fit");
        trace.parameters().forEach(parameters::put);
        standing.asked().ifPresent(asked -> {
            List<String> assets = standing.table().assets();
            root.set("held", SealContent.weights(asked.situation().weights(), assets));
            root.set("stance_before", stance(asked.stance(), standing));
            root.set("stance_after", stance(asked.decision().next(), standing));
        });
        root.set("decision", SealContent.decision(trace.latest()));
        root.set("filled_here", fills(trace.filledHere(), trace));
        root.set("filled_later", fills(trace.filledLater(), trace));
        standing.track().ifPresent(track -> root.set("money", money(track, standing.bar())));
        root.set("ledger", ledger(trace));
        return JsonText.indented(root);
    }

    /** As quoted, with the simple return of a holder where there is a bar before. */
    private static ObjectNode prices(Standing standing) {
        ObjectNode node = JsonNodeFactory.instance.objectNode();
        for (int asset = 0; asset < standing.table().assets().size(); asset++) {
            ObjectNode one = node.putObject(standing.table().assets().get(asset));
            QuotedBar now = QuotedBar.of(standing.table(), asset, standing.bar());
            one.put("close", now.close());
            now.dividend().ifPresent(money -> one.put("dividend", money));
            now.split().ifPresent(ratio -> one.put("split", ratio));
            if (standing.bar() > 0) {
                double before = QuotedBar.of(standing.table(), asset, standing.bar() - 1)
                        .close();
                one.put("close_before", before);
                one.put("return", now.simpleReturn(before));
            }
        }
        return node;
    }

    private static ArrayNode ledger(Trace trace) {
        ArrayNode all = JsonNodeFactory.instance.arrayNode();
        for (LedgerEntry entry : trace.ledger()) {
            ObjectNode node = all.addObject();
            node.put("kind", entry.kind().word());
            entry.asset()
                    .ifPresent(asset ->
                            node.put("asset", trace.standing().table().assets().get(asset)));
            node.put("amount", entry.amount());
        }
        return all;
    }

    private static ObjectNode filter(FilterStep step, List<Observation> observe) {
        ObjectNode node = JsonNodeFactory.instance.objectNode();
        ObjectNode observed = node.putObject("observed");
        for (int i = 0; i < observe.size(); i++) {
            if (step.observed().get(i).isPresent()) {
                observed.put(observe.get(i).column(), step.observed().get(i).getAsDouble());
            }
        }
        byRegime(node, "prior", step.regimes(), step.prior());
        byRegime(node, "predicted", step.regimes(), step.predicted());
        byRegime(node, "ln_density", step.regimes(), step.logDensities());
        byRegime(node, "posterior", step.regimes(), step.posterior());
        return node;
    }

    private static void byRegime(ObjectNode node, String name, List<String> regimes, List<Double> values) {
        ObjectNode all = node.putObject(name);
        for (int k = 0; k < values.size(); k++) {
            all.put(regimes.get(k), values.get(k));
        }
    }

    private static ObjectNode stance(Stance stance, Standing standing) {
        ObjectNode node = JsonNodeFactory.instance.objectNode();
        node.put("lived", stance.lived());
        node.put("candidate", stance.candidate());
        node.put("run", stance.run());
        node.put("decided", stance.decided());
        if (stance.switchedOn() != Stance.NONE) {
            node.put("switched_on", standing.known().date(stance.switchedOn()).toString());
        }
        stance.wanted()
                .ifPresent(wanted -> node.set(
                        "wanted", SealContent.weights(wanted, standing.table().assets())));
        return node;
    }

    private static ArrayNode fills(List<Fill> fills, Trace trace) {
        ArrayNode all = JsonNodeFactory.instance.arrayNode();
        for (Fill fill : fills) {
            ObjectNode node = all.addObject();
            node.put("decided_on", date(trace, fill.decidedOn()));
            node.put("filled_on", date(trace, fill.filledOn()));
            node.put("asset", trace.standing().table().assets().get(fill.asset()));
            node.put("units", fill.units());
            node.put("price", fill.price());
            node.put("notional", fill.notional());
            node.put("commission", fill.charges().commission());
            node.put("fixed_fee", fill.charges().fixedFee());
            node.put("half_spread", fill.charges().halfSpread());
            node.put("stamp_duty", fill.charges().stampDuty());
            node.put("impact", fill.charges().impact());
            node.put("weight_before", fill.weightBefore());
            node.put("weight_after", fill.weightAfter());
            node.put("because", fill.because().sentence());
        }
        return all;
    }

    private static String date(Trace trace, int bar) {
        return trace.ready().market().table().knownAt(bar).date().toString();
    }

    private static ObjectNode money(Track track, int bar) {
        ObjectNode node = JsonNodeFactory.instance.objectNode();
        node.put("wealth", track.wealth(bar));
        if (bar > track.firstBar()) {
            node.put("cash_before", track.cash(bar - 1));
        }
        node.put("cash", track.cash(bar));
        node.put("interest", track.interest(bar));
        return node.put("cost", track.cost(bar));
    }
}
