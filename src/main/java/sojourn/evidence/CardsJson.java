package sojourn.evidence;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.List;
import java.util.OptionalDouble;
import sojourn.inference.WeightedMoments;

/** Identity cards and lineage as JSON. */
final class CardsJson {
    private static final String NEVER_LEFT = "it is never left, or the gauge has no chain";

    private CardsJson() {}

    static void add(ObjectNode node, WalkedRegimes subject, List<IdentityCard> cards) {
        Stretch last = subject.stretches().get(subject.stretches().size() - 1);
        node.put("last_fit", last.record().number());
        node.put("fitted_on", last.record().fittedOn().toString());
        node.put("window_start", last.record().windowStart().toString());
        ArrayNode regimes = node.putArray("regimes");
        for (IdentityCard card : cards) {
            ObjectNode one = regimes.addObject();
            one.put("regime", card.regime());
            ObjectNode fit = one.putObject("last_fit");
            fit.set("share_of_observations", EstimateNodes.of(card.lastFit().share(), "the fit has no shares"));
            fit.set("stay_bars", EstimateNodes.of(card.lastFit().stay(), NEVER_LEFT));
            returns(fit, subject, card.lastFit().returns());
            asLived(one.putObject("as_lived"), subject, card.asLived());
        }
    }

    private static void asLived(ObjectNode node, WalkedRegimes subject, IdentityCard.AsLived lived) {
        node.put("mean_probability", lived.meanProbability());
        node.put("share_of_closes_most_likely", lived.mostLikely());
        node.set("stay_bars", EstimateNodes.of(lived.stay()));
        node.put("stays", lived.stays());
        returns(node.putObject("next_bar"), subject, lived.nextBar());
        ArrayNode largest = node.putArray("largest_bars");
        for (IdentityCard.Large bar : lived.largest()) {
            ObjectNode one = largest.addObject();
            one.put("date", subject.date(bar.bar()).toString());
            one.put("return", bar.earned());
        }
    }

    private static void returns(ObjectNode node, WalkedRegimes subject, WeightedMoments moments) {
        Annual annual = Annual.of(subject, moments);
        node.put("weight_in_bars", moments.weight());
        node.set("mean_per_bar", EstimateNodes.of(moments.mean(), moments.meanError()));
        node.set("deviation_per_bar", EstimateNodes.of(moments.deviation(), moments.deviationError()));
        node.set("mean_per_year", EstimateNodes.of(annual.mean(), annual.meanError()));
        node.set("volatility_per_year", EstimateNodes.of(annual.volatility(), annual.volatilityError()));
    }

    static void add(ObjectNode node, Lineage lineage, WalkedRegimes subject) {
        List<LineageStep> compared = lineage.compared();
        node.put("accepted_fits", lineage.steps().size());
        node.put("compared_with_the_fit_before", compared.size());
        node.put(
                "with_swap",
                compared.stream().filter(step -> before(step).swapped()).count());
        node.put(
                "with_birth",
                compared.stream().filter(step -> before(step).births() > 0).count());
        node.put("with_near_tie", lineage.withEvent("near-tie"));
        node.put("with_collapsed", lineage.withEvent("collapsed"));
        node.put("with_duplicated", lineage.withEvent("duplicated"));
        node.put("with_absorbing", lineage.withEvent("absorbing"));
        OptionalDouble cost =
                compared.stream().mapToDouble(step -> before(step).cost()).max();
        cost.ifPresent(most -> node.put("largest_matching_cost", most));
        lineage.furthest().ifPresent(step -> {
            node.put("largest_move_of_a_probability_60", before(step).moved().orElseThrow());
            node.put("largest_move_on", step.record().fittedOn().toString());
        });
        ArrayNode regimes = node.putArray("regimes");
        for (int k = 0; k < subject.timeline().regimes().size(); k++) {
            Drift drift = Drift.of(lineage, k);
            ObjectNode one = regimes.addObject();
            one.put("regime", subject.timeline().regimes().get(k));
            range(one.putObject("deviation_per_bar"), drift.deviation());
            range(one.putObject("stay_bars"), drift.stay());
        }
    }

    private static void range(ObjectNode node, Drift.Range range) {
        range.first().ifPresent(value -> node.put("first", value));
        range.least().ifPresent(value -> node.put("least", value));
        range.most().ifPresent(value -> node.put("most", value));
        range.last().ifPresent(value -> node.put("last", value));
        node.put("undefined_in_fits", range.undefined());
    }

    private static LineageStep.Before before(LineageStep step) {
        return step.before().orElseThrow();
    }
}
