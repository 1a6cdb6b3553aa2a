package sojourn.archive;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.List;
import sojourn.document.JsonText;
import sojourn.measure.CalendarTable;
import sojourn.measure.Drawdown;
import sojourn.measure.Measure;
import sojourn.measure.Measured;
import sojourn.measure.RegimeTable;
import sojourn.measure.Yardstick;

/** {@code measures.json}: every measure of a variant and of its yardsticks, with interval, unit and definition. */
public final class MeasuresFile {
    private static final JsonNodeFactory JSON = JsonNodeFactory.instance;

    private static final String SYMBOLS =
            "W_0..W_n wealth at closes, r_1..r_n its simple returns, c_1..c_n those of cash, e = r - c, n bars, P = bars_per_year,"
                    + " years = calendar days / 365.25";

    private MeasuresFile() {}

    private static final String PARTS =
            "Parts of the difference to buy-and-hold that add up to it, bar by bar: exposure (M - g'), what the strategy's mean weights held"
                    + " through every bar would have gained less buy-and-hold's price gains; timing (g - M), its own price gains less"
                    + " that; cash, its interest less buy-and-hold's; costs, buy-and-hold's less its own. Fractions of wealth at the close"
                    + " before, linked by (ln(1 + r) - ln(1 + r')) / (r - r') and scaled to the difference.";

    /** The text of the file. */
    public static String of(VariantMeasures all) {
        ObjectNode root = JSON.objectNode();
        root.put("caution", Caution.TEXT);
        ComparisonRow.Judged strategy = all.strategy();
        ObjectNode window = root.putObject("window");
        window.put("from", strategy.from().toString());
        window.put("to", strategy.to().toString());
        window.put("bars", strategy.bars());
        root.put("outcome", strategy.outcome());
        root.put("parameters", all.parameters().word());
        root.set("strategy", measures(strategy));
        root.set("worst_drawdown", drawdown(strategy.scorecard().drawdown()));
        ObjectNode difference = root.putObject("difference_to_buy_and_hold");
        difference.set("growth_per_year", DifferenceJson.of(all.differencePerYear()));
        difference.set("total_return", DifferenceJson.of(all.differenceOverTheWindow()));
        all.randomSwitches().ifPresent(switches -> root.set("random_switcher", DifferenceJson.of(switches)));
        root.set("by_regime", byRegime(all.byRegime(), all.regimes()));
        root.set("by_year", periods(strategy.scorecard().calendar().years()));
        root.set("by_month", periods(strategy.scorecard().calendar().months()));
        ObjectNode against = root.putObject("yardsticks");
        all.yardsticks().forEach((name, judged) -> against.set(name, measures(judged)));
        all.absent().forEach((name, none) -> against.set(name, measured(none)));
        root.put("bars_per_year", all.barsPerYear());
        root.put("symbols", SYMBOLS);
        root.set("definitions", definitions());
        root.set("yardstick_definitions", yardsticks());
        root.put("difference_definition", PARTS);
        return JsonText.indented(root);
    }

    private static ObjectNode measures(ComparisonRow.Judged judged) {
        ObjectNode all = JSON.objectNode();
        for (Measure measure : Measure.values()) {
            all.set(measure.key(), measured(judged.get(measure)));
        }
        return all;
    }

    /** A number with its interval, or the reason why there is none. */
    static ObjectNode measured(Measured measured) {
        ObjectNode node = JSON.objectNode();
        if (measured instanceof Measured.Undefined none) {
            node.put("undefined", none.reason().name());
            node.put("because", none.because());
        } else if (measured instanceof Measured.Value value) {
            node.put("value", value.amount());
            value.interval().ifPresent(interval -> {
                node.put("low", interval.low());
                node.put("high", interval.high());
                node.put("interval", interval.definition());
            });
        }
        return node;
    }

    private static ObjectNode drawdown(Drawdown drawdown) {
        ObjectNode node = JSON.objectNode();
        drawdown.episode().ifPresent(episode -> {
            node.put("peak", episode.peakDate().toString());
            node.put("trough", episode.troughDate().toString());
            node.put("recovered", episode.recoveryDate().map(Object::toString).orElse("not within the window"));
        });
        return node;
    }

    private static ArrayNode byRegime(RegimeTable table, List<String> regimes) {
        ArrayNode rows = JSON.arrayNode();
        for (RegimeTable.Row row : table.rows()) {
            ObjectNode node = rows.addObject();
            node.put("regime_known_the_close_before", regimes.get(row.regime()));
            node.put("bars", row.bars());
            node.set("share", measured(row.share()));
            node.set("mean_per_bar", measured(row.mean()));
            node.set("deviation_per_bar", measured(row.deviation()));
            node.put("compounded", row.compounded());
        }
        return rows;
    }

    private static ArrayNode periods(List<CalendarTable.Period> periods) {
        ArrayNode rows = JSON.arrayNode();
        for (CalendarTable.Period period : periods) {
            ObjectNode node = rows.addObject();
            node.put("period", period.name());
            node.put("bars", period.bars());
            node.put("compounded", period.compounded());
            node.put("whole", period.coverage() == CalendarTable.Coverage.WHOLE);
        }
        return rows;
    }

    private static ObjectNode yardsticks() {
        ObjectNode all = JSON.objectNode();
        for (Yardstick yardstick : Yardstick.values()) {
            all.put(yardstick.column(), yardstick.definition());
        }
        return all;
    }

    private static ObjectNode definitions() {
        ObjectNode all = JSON.objectNode();
        for (Measure measure : Measure.values()) {
            ObjectNode node = all.putObject(measure.key());
            node.put("label", measure.label());
            node.put("unit", measure.unit().word());
            node.put("definition", measure.definition());
        }
        return all;
    }
}
