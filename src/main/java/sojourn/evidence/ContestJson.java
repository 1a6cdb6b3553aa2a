package sojourn.evidence;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;

/** Contests as JSON. */
final class ContestJson {
    private static final String CHOSEN =
            "the same losses chose the two; the tests take them as named beforehand, so their p-values are too small";

    private ContestJson() {}

    static void add(ObjectNode node, WalkedRegimes subject, ScoreContest contest) {
        window(node, subject, contest.bars(), contest.firstBar(), contest.lastBar());
        ArrayNode rows = node.putArray("gauges");
        for (ScoreContest.Row row : contest.rows()) {
            ObjectNode one = rows.addObject();
            one.put("gauge", row.gauge());
            one.put("mean_log_score", row.mean());
            row.duel().ifPresent(duel -> one.set("own_ahead", duel(duel)));
        }
    }

    static void add(ObjectNode node, WalkedRegimes subject, ForecastContest contest) {
        window(node, subject, contest.bars(), contest.firstBar(), contest.lastBar());
        node.put("best_by_qlike", contest.best());
        contest.bestAgainstNext().ifPresent(duel -> {
            ObjectNode next = duel(duel);
            next.put("next", duel.second());
            next.put("chosen", CHOSEN);
            node.set("best_ahead_of_next", next);
        });
        ArrayNode rows = node.putArray("forecasters");
        for (ForecastContest.Row row : contest.rows()) {
            ObjectNode one = rows.addObject();
            one.put("gauge", row.gauge());
            one.put("mean_qlike", row.qlike());
            one.put("mean_squared_error", row.squaredError());
            one.set("calibration", calibration(row.calibration()));
            row.byQlike().ifPresent(duel -> one.set("own_ahead_by_qlike", duel(duel)));
            row.bySquaredError().ifPresent(duel -> one.set("own_ahead_by_squared_error", duel(duel)));
        }
    }

    private static void window(ObjectNode node, WalkedRegimes subject, int bars, int first, int last) {
        node.put("bars", bars);
        node.put("from", subject.date(first).toString());
        node.put("to", subject.date(last).toString());
    }

    private static ObjectNode calibration(Calibration calibration) {
        ObjectNode node = com.fasterxml.jackson.databind.node.JsonNodeFactory.instance.objectNode();
        node.set("came_over_forecast", EstimateNodes.of(calibration.ratio(), calibration.ratioError()));
        node.set("intercept", EstimateNodes.of(calibration.intercept()));
        node.set("slope", EstimateNodes.of(calibration.slope(), calibration.slopeError()));
        node.set("explained", EstimateNodes.of(calibration.explained()));
        node.set("intercept_0_and_slope_1", EstimateNodes.test(calibration.right()));
        return node;
    }

    private static ObjectNode duel(Duel duel) {
        ObjectNode node = EstimateNodes.of(duel.robust().mean());
        node.set("diebold_mariano_robust", EstimateNodes.test(duel.robust().corrected()));
        node.set("diebold_mariano", EstimateNodes.test(duel.plain().corrected()));
        node.set("giacomini_white", EstimateNodes.test(duel.conditional()));
        node.put("stands_on", duel.ground().words());
        return node;
    }
}
