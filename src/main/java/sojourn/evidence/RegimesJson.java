package sojourn.evidence;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.List;
import java.util.function.BiConsumer;
import sojourn.archive.Caution;
import sojourn.archive.ComparisonRow;
import sojourn.document.JsonText;
import sojourn.walk.RegimeSettings;

/** {@code regimes.json}: every finding, or why there is none, with its definition. */
public final class RegimesJson {
    private static final JsonNodeFactory JSON = JsonNodeFactory.instance;
    private static final int SHOWN_BARS = 20;

    private RegimesJson() {}

    /** The text of the file. */
    public static String of(RegimeInquiry inquiry) {
        RegimeFindings found = inquiry.findings();
        WalkedRegimes subject = found.subject();
        ObjectNode root = JSON.objectNode();
        root.put("caution", Caution.TEXT);
        root.put("strategy", inquiry.ready().file().strategy().name());
        root.put("comparison_digest", inquiry.comparisonDigest());
        root.put("timeline", inquiry.ready().timelineKey());
        root.put("gauge", subject.gauge());
        ArrayNode observations = root.putArray("observations");
        subject.regimes().observe().forEach(one -> observations.add(one.column()));
        root.put("asset", subject.assetName());
        root.put("parameters", parameters(subject.regimes()));
        root.put("bars_per_year", subject.barsPerYear());
        root.set("fits", fits(found.fits()));
        section(root, "identity", found.cards(), (node, cards) -> CardsJson.add(node, subject, cards));
        section(root, "lineage", found.lineage(), (node, lineage) -> CardsJson.add(node, lineage, subject));
        section(root, "log_score_of_observation", found.ofObservation(), (n, c) -> ContestJson.add(n, subject, c));
        section(root, "log_score_of_next_return", found.ofReturn(), (n, c) -> ContestJson.add(n, subject, c));
        section(root, "forecasts_of_squared_return", found.forecasts(), (n, c) -> ContestJson.add(n, subject, c));
        ObjectNode absent = root.putObject("gauges_not_compared");
        found.absent().forEach(absent::put);
        section(root, "pseudo_residuals", found.residuals(), (node, all) -> residuals(node, subject, all));
        section(root, "reproduction", found.reproduction(), RegimesJson::reproduction);
        section(root, "single_bars", found.influence(), (node, all) -> influence(node, subject, all));
        root.set("definitions", Definitions.node());
        return JsonText.indented(root);
    }

    private static String parameters(RegimeSettings regimes) {
        if (regimes.given().isPresent()) {
            return ComparisonRow.Parameters.COMPUTED_ELSEWHERE.word();
        }
        return (regimes.fixed().isPresent() ? ComparisonRow.Parameters.EXTERNAL_PRIOR : ComparisonRow.Parameters.FITTED)
                .word();
    }

    /** A section with what was found, or the reason why there is nothing. */
    private static <T> void section(ObjectNode root, String name, Answer<T> answer, BiConsumer<ObjectNode, T> add) {
        ObjectNode node = root.putObject(name);
        answer.found().ifPresentOrElse(value -> add.accept(node, value), () -> {
            node.put("undefined", "NOT_APPLICABLE");
            node.put("because", answer.because());
        });
    }

    private static ObjectNode fits(FitsTold fits) {
        ObjectNode node = JSON.objectNode();
        node.put("made", fits.fits());
        ObjectNode outcomes = node.putObject("outcomes");
        fits.outcomes().forEach(outcomes::put);
        node.put("searched_from_several_starts", fits.searched());
        node.put("all_starts_agreed", fits.allAgreed());
        node.put("least_share_of_starts_agreeing", fits.leastShare());
        node.put("with_a_second_maximum_within_2_nats", fits.rivalled());
        ObjectNode numbers = node.putObject("accepted_by_number_of_regimes");
        fits.numbers().forEach((number, count) -> numbers.put(Integer.toString(number), count));
        node.put("changes_of_the_number", fits.changes());
        ArrayNode refused = node.putArray("refused");
        fits.refused().forEach(refused::add);
        return node;
    }

    private static void residuals(ObjectNode node, WalkedRegimes subject, PseudoResiduals residuals) {
        node.put("count", residuals.count());
        node.put("clipped", residuals.clipped());
        node.put("lags", PseudoResiduals.LAGS);
        node.set("jarque_bera", EstimateNodes.test(residuals.jarqueBera()));
        node.set("ljung_box", EstimateNodes.test(residuals.ljungBox()));
        node.set("ljung_box_of_squares", EstimateNodes.test(residuals.ljungBoxOfSquares()));
        node.set("kolmogorov_smirnov", EstimateNodes.test(residuals.kolmogorovSmirnov()));
        ArrayNode bars = node.putArray("most_surprising");
        List<Integer> most = residuals.surprising();
        for (int bar : most.subList(0, Math.min(SHOWN_BARS, most.size()))) {
            ObjectNode one = bars.addObject();
            one.put("date", subject.date(bar).toString());
            one.put("observation", subject.observed().at(bar).orElseThrow());
            one.put("pseudo_residual", residuals.normal().at(bar).orElseThrow());
            one.put("once_in_bars", residuals.onceIn(bar).orElseThrow());
        }
    }

    private static void reproduction(ObjectNode node, Reproduction reproduction) {
        node.put("fit", reproduction.fit());
        node.put("observations", reproduction.observations());
        node.put("series_drawn", Reproduction.DRAWN);
        ArrayNode figures = node.putArray("figures");
        for (Reproduction.Figure figure : reproduction.figures()) {
            ObjectNode one = figures.addObject();
            one.put("property", figure.what().words());
            if (figure.lag() > 0) {
                one.put("lag", figure.lag());
            }
            one.set("sample", EstimateNodes.of(figure.sample()));
            one.set("implied", EstimateNodes.of(figure.implied()));
            one.set("drawn_low", EstimateNodes.of(figure.low()));
            one.set("drawn_high", EstimateNodes.of(figure.high()));
            figure.reproduced().ifPresent(yes -> one.put("reproduced", yes));
        }
    }

    private static void influence(ObjectNode node, WalkedRegimes subject, Influence influence) {
        List<Influence.LeftOut> decisive = influence.decisive();
        List<String> regimes = subject.timeline().regimes();
        node.put("left_out", influence.bars().size());
        node.put("decisive_at_their_own_close", influence.atTheirOwnClose());
        node.put("decisive_at_any_close", decisive.size());
        ArrayNode bars = node.putArray("most_decisive");
        for (Influence.LeftOut bar : decisive.subList(0, Math.min(SHOWN_BARS, decisive.size()))) {
            ObjectNode one = bars.addObject();
            one.put("date", subject.date(bar.bar()).toString());
            subject.observed().at(bar.bar()).ifPresent(value -> one.put("observation", value));
            one.put("most_likely", regimes.get(bar.mostLikely()));
            one.put("without", regimes.get(bar.without()));
            one.put("closes_changed", bar.changed());
            one.put("until", subject.date(bar.until()).toString());
        }
    }
}
