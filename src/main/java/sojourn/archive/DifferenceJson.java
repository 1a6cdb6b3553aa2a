package sojourn.archive;

import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import sojourn.measure.Attribution;
import sojourn.measure.Luck;
import sojourn.measure.RandomSwitches;

/** The parts of a difference to buy-and-hold, and the place among random switchers, as JSON. */
public final class DifferenceJson {
    private static final JsonNodeFactory JSON = JsonNodeFactory.instance;

    private DifferenceJson() {}

    /** {@code difference} and the parts that add up to it, costs one by one. */
    public static ObjectNode of(Attribution parts) {
        ObjectNode node = JSON.objectNode();
        node.set("difference", MeasuresFile.measured(parts.difference()));
        node.set("exposure", MeasuresFile.measured(parts.exposure()));
        node.set("timing", MeasuresFile.measured(parts.timing()));
        node.set("cash", MeasuresFile.measured(parts.cash()));
        node.set("costs", MeasuresFile.measured(parts.allCosts()));
        ObjectNode costs = node.putObject("costs_by_kind");
        parts.costs().forEach((kind, paid) -> costs.set(kind.word(), MeasuresFile.measured(paid)));
        return node;
    }

    /** How many draws of what, and for each measure the strategy's number, quantiles of the draws and how many did worse. */
    public static ObjectNode of(RandomSwitches switches) {
        ObjectNode node = JSON.objectNode();
        node.put("draws", switches.draws());
        node.put("how", switches.how());
        switches.figures().forEach((measure, luck) -> node.set(measure.key(), of(luck)));
        return node;
    }

    private static ObjectNode of(Luck luck) {
        ObjectNode node = JSON.objectNode();
        node.set("strategy", MeasuresFile.measured(luck.own()));
        node.set("quantile_05", MeasuresFile.measured(luck.low()));
        node.set("quantile_50", MeasuresFile.measured(luck.middle()));
        node.set("quantile_95", MeasuresFile.measured(luck.high()));
        node.set("share_of_draws_below", MeasuresFile.measured(luck.worse()));
        node.set("chance_does_as_well", MeasuresFile.measured(luck.chance()));
        return node;
    }
}
