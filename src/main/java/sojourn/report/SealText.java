package sojourn.report;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.List;
import java.util.Optional;
import sojourn.document.JsonText;
import sojourn.latest.SealVerdict;
import sojourn.latest.SealVerdict.Difference;
import sojourn.latest.SealVerdict.RowChange;

/** Whether a seal still holds, for people and for machines. */
public final class SealText {
    private static final int SHOWN = 20;

    private SealText() {}

    /** For people. */
    public static String of(SealVerdict verdict) {
        StringBuilder text = new StringBuilder(Lines.wrapped(
                verdict.seal() + ", sealed at " + verdict.sealedAt() + " for the close of " + verdict.asOf() + ": "
                        + (verdict.holds() ? "it holds. The same inputs give the same decision." : "it does not hold."),
                0));
        text.append(Lines.after("  Hash      ", verdict.sha256() + ", " + vouched(verdict), 12));
        verdict.chain().forEach(fault -> text.append(Lines.after("  Chain     ", fault + ".", 12)));
        if (verdict.rows().isEmpty()) {
            text.append(Lines.after(
                    "  Rows      ", "which price rows have changed cannot be told, since the chain is broken.", 12));
        }
        List<RowChange> rows = verdict.rows().orElse(List.of());
        if (!rows.isEmpty()) {
            text.append("  Rows      ").append(rows.size()).append(rows.size() == 1 ? " cell has" : " cells have");
            text.append(" changed since:\n");
            Grid grid = new Grid(List.of("            bar", "date", "column", "sealed", "now"));
            rows.stream()
                    .limit(SHOWN)
                    .forEach(one -> grid.add(List.of(
                            "            " + one.row(),
                            one.date(),
                            one.column().isEmpty() ? "(row)" : one.column(),
                            shown(one.before()),
                            shown(one.now()))));
            text.append(grid.text());
            if (rows.size() > SHOWN) {
                text.append("            and ").append(rows.size() - SHOWN).append(" more; --json lists all\n");
            }
        }
        for (Difference one : verdict.differences().stream().limit(SHOWN).toList()) {
            text.append(Lines.after(
                    "  Differs   ",
                    one.where() + " was " + shown(one.sealed()) + " and is " + shown(one.now()) + ".",
                    12));
        }
        if (verdict.differences().size() > SHOWN) {
            text.append("            and ")
                    .append(verdict.differences().size() - SHOWN)
                    .append(" more; --json lists all\n");
        }
        return text.toString();
    }

    private static String vouched(SealVerdict verdict) {
        return verdict.vouchedBy()
                .map(next -> "which " + next + " names as that of the seal before it.")
                .orElse(
                        "and no later seal vouches for it: compare it with a note of the hash that was kept elsewhere.");
    }

    private static String shown(String value) {
        return value.isEmpty() ? "nothing" : value;
    }

    /** For machines. */
    public static String json(SealVerdict verdict) {
        ObjectNode root = JsonNodeFactory.instance.objectNode();
        root.put("seal", verdict.seal());
        root.put("as_of", verdict.asOf());
        root.put("sealed_at", verdict.sealedAt());
        root.put("sha256", verdict.sha256());
        verdict.vouchedBy().ifPresent(next -> root.put("vouched_by", next));
        root.put("holds", verdict.holds());
        verdict.chain().forEach(root.putArray("chain_faults")::add);
        Optional<List<RowChange>> rows = verdict.rows();
        if (rows.isEmpty()) {
            root.put("rows_unknown_because", "the chain is broken");
        }
        ArrayNode changed = root.putArray("changed_rows");
        for (RowChange one : rows.orElse(List.of())) {
            ObjectNode node = changed.addObject();
            node.put("bar", one.row());
            node.put("date", one.date());
            node.put("column", one.column());
            node.put("sealed", one.before());
            node.put("now", one.now());
        }
        ArrayNode differences = root.putArray("differences");
        for (Difference one : verdict.differences()) {
            ObjectNode node = differences.addObject();
            node.put("where", one.where());
            node.put("sealed", one.sealed());
            node.put("now", one.now());
        }
        return JsonText.indented(root);
    }
}
