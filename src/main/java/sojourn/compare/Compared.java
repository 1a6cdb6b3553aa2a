package sojourn.compare;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import sojourn.archive.ComparisonFile;
import sojourn.archive.ComparisonRow;
import sojourn.archive.Digest;
import sojourn.measure.Measure;
import sojourn.measure.Yardstick;
import sojourn.walk.RegimeSettings;
import sojourn.walk.RegimeTimeline;

/**
 * A finished comparison.
 *
 * @param prepared every strategy, in the order given
 * @param timelines by address
 * @param ranked the variants that ran, best first by {@code rankBy}
 * @param failed the variants that did not, by name
 * @param faults of the program, each of which cost a variant its row
 * @param rankBy the declared measure
 * @param rows the table: ranked variants, failed ones, yardsticks
 * @param digest of the variants' digests in order and of the table
 */
public record Compared(
        List<Prepared> prepared,
        Map<String, RegimeTimeline> timelines,
        List<Judgement> ranked,
        List<Run.Failed> failed,
        List<RuntimeException> faults,
        Measure rankBy,
        List<ComparisonRow> rows,
        String digest) {

    static Compared of(
            List<Prepared> prepared,
            Map<String, RegimeTimeline> timelines,
            List<Judgement> ranked,
            List<Run.Failed> failed,
            List<RuntimeException> faults,
            Measure rankBy) {
        List<Run.Failed> byName = new ArrayList<>(failed);
        byName.sort(Comparator.comparing(one -> one.file().slug()));
        List<ComparisonRow> rows = rows(ranked, byName);
        Digest digest = Digest.begin();
        for (Judgement one : ranked) {
            digest.text(one.run().file().slug()).text(one.run().digest());
        }
        for (Run.Failed one : byName) {
            digest.text(one.file().slug()).bytes(one.file().settingsByContent(Map.of()));
        }
        digest.text(ComparisonFile.of(rows).csv());
        return new Compared(
                List.copyOf(prepared),
                timelines,
                List.copyOf(ranked),
                byName,
                List.copyOf(faults),
                rankBy,
                rows,
                digest.hex());
    }

    private static List<ComparisonRow> rows(List<Judgement> ranked, List<Run.Failed> failed) {
        List<ComparisonRow> rows = new ArrayList<>();
        for (Judgement one : ranked) {
            rows.add(new ComparisonRow(
                    one.run().file().slug(),
                    ComparisonRow.Kind.STRATEGY,
                    one.run().timelineKey(),
                    parameters(one.run()),
                    "",
                    Optional.of(one.strategy())));
        }
        for (Run.Failed one : failed) {
            rows.add(new ComparisonRow(
                    one.file().slug(),
                    ComparisonRow.Kind.STRATEGY,
                    one.timelineKey(),
                    parameters(one),
                    one.reason(),
                    Optional.empty()));
        }
        for (Judgement one : ranked) {
            one.yardsticks().forEach((name, judged) -> rows.add(yardstick(name, one, "", Optional.of(judged))));
            one.absent().forEach((name, none) -> rows.add(yardstick(name, one, none.because(), Optional.empty())));
        }
        return List.copyOf(rows);
    }

    private static ComparisonRow yardstick(
            String name, Judgement owner, String reason, Optional<ComparisonRow.Judged> judged) {
        boolean causal = false;
        for (Yardstick yardstick : Yardstick.values()) {
            causal |= yardstick.column().equals(name) && yardstick.knowledge() == Yardstick.Knowledge.CAUSAL;
        }
        return new ComparisonRow(
                name + " of " + owner.run().file().slug(),
                causal ? ComparisonRow.Kind.YARDSTICK : ComparisonRow.Kind.AFTER_THE_FACT,
                owner.run().timelineKey(),
                parameters(owner.run()),
                reason,
                judged);
    }

    /** Whether the regime model of a variant was fitted or declared, or its probabilities computed elsewhere. */
    public static ComparisonRow.Parameters parameters(Run run) {
        RegimeSettings regimes = run.file().strategy().regimes();
        if (regimes.given().isPresent()) {
            return ComparisonRow.Parameters.COMPUTED_ELSEWHERE;
        }
        return regimes.fixed().isPresent() ? ComparisonRow.Parameters.EXTERNAL_PRIOR : ComparisonRow.Parameters.FITTED;
    }
}
