package sojourn.archive;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import sojourn.measure.Drawdown;
import sojourn.measure.Measure;
import sojourn.measure.Unit;

/** {@code comparison.csv}: a row a variant and a yardstick, failures included. */
public final class ComparisonFile {
    private ComparisonFile() {}

    /** The table, in the order of {@code rows}. */
    public static Table of(List<ComparisonRow> rows) {
        List<String> header =
                new ArrayList<>(List.of("variant", "kind", "timeline", "outcome", "reason", "from", "to", "bars"));
        for (Measure measure : Measure.values()) {
            header.add(measure.key());
        }
        header.addAll(List.of("drawdown_peak", "drawdown_trough", "drawdown_recovered", "parameters"));
        Table table = new Table(header);
        for (ComparisonRow line : rows) {
            Table.Row row = table.row()
                    .add(line.variant())
                    .add(line.kind().word())
                    .add(line.timeline())
                    .add(line.outcome())
                    .add(line.reason());
            if (line.judged().isPresent()) {
                addJudged(row, line.judged().get());
            } else {
                for (int blank = 5; blank < header.size() - 1; blank++) {
                    row.blank();
                }
            }
            row.add(line.parameters().word()).end();
        }
        return table;
    }

    private static void addJudged(Table.Row row, ComparisonRow.Judged judged) {
        row.add(judged.from()).add(judged.to()).add(Integer.toString(judged.bars()));
        for (Measure measure : Measure.values()) {
            OptionalDouble number = judged.get(measure).number();
            if (measure.unit() == Unit.BARS && number.isPresent()) {
                row.add(Long.toString((long) number.getAsDouble()));
            } else {
                row.add(number);
            }
        }
        Optional<Drawdown.Episode> episode = judged.scorecard().drawdown().episode();
        row.add(episode.map(e -> e.peakDate().toString()).orElse(""));
        row.add(episode.map(e -> e.troughDate().toString()).orElse(""));
        row.add(episode.flatMap(Drawdown.Episode::recoveryDate)
                .map(Object::toString)
                .orElse(""));
    }
}
