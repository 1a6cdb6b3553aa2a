package sojourn.report;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.time.LocalDate;
import java.util.List;
import sojourn.archive.Caution;
import sojourn.compare.Prepared;
import sojourn.document.JsonText;
import sojourn.market.InputFile;
import sojourn.market.Known;
import sojourn.market.PriceTable;
import sojourn.strategy.Strategy;
import sojourn.walk.FitPlan;

/** The plan for machines. */
public final class PlanJson {
    private PlanJson() {}

    /** An array with an object a strategy. */
    public static String of(List<Prepared> prepared) {
        ObjectNode root = JsonNodeFactory.instance.objectNode();
        root.put("caution", Caution.TEXT);
        ArrayNode plans = root.putArray("plans");
        for (Prepared one : prepared) {
            ObjectNode plan = plans.addObject();
            plan.put("variant", one.file().slug());
            plan.put("file", one.file().shownName());
            plan.set("settings", one.file().resolved());
            if (one instanceof Prepared.Ready ready) {
                add(plan, ready);
            } else if (one instanceof Prepared.Unreadable unreadable) {
                ArrayNode faults = plan.putArray("faults");
                unreadable.problems().forEach(problem -> faults.add(problem.toString()));
            }
        }
        return JsonText.indented(root);
    }

    private static void add(ObjectNode plan, Prepared.Ready ready) {
        Strategy strategy = ready.file().strategy();
        PriceTable table = ready.market().table();
        Known last = table.knownAt(table.size() - 1);
        plan.put("timeline", ready.timelineKey());
        plan.put("bars", table.size());
        plan.put("first_bar", last.date(0).toString());
        plan.put("last_bar", last.date().toString());
        FitPlan fits = FitPlan.of(table, strategy.regimes(), strategy.refit());
        plan.put("observations", fits.observations());
        ArrayNode dates = plan.putArray("fit_dates");
        for (LocalDate date : fits.fitDates()) {
            dates.add(date.toString());
        }
        ArrayNode inputs = plan.putArray("inputs");
        for (InputFile file : ready.market().files()) {
            ObjectNode input = inputs.addObject();
            input.put("role", file.role());
            input.put("file", file.file());
            input.put("sha256", file.sha256());
            input.put("rows", file.rows());
            input.put("first", file.first().toString());
            input.put("last", file.last().toString());
        }
        ArrayNode findings = plan.putArray("findings");
        PlanText.findings(ready).forEach(findings::add);
    }
}
