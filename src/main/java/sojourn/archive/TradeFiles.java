package sojourn.archive;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import sojourn.market.TimeAxis;
import sojourn.trade.Fill;
import sojourn.trade.LedgerEntry;
import sojourn.trade.Track;

/** What was traded and what cash did, as tables. */
public final class TradeFiles {
    private TradeFiles() {}

    /** {@code trades.csv}: a row a fill. */
    public static Table trades(TimeAxis axis, Track track) {
        Table table = new Table(List.of(
                "decided_on",
                "filled_on",
                "asset",
                "units",
                "price",
                "notional",
                "commission",
                "fixed_fee",
                "half_spread",
                "impact",
                "stamp_duty",
                "weight_before",
                "weight_after",
                "because"));
        for (Fill fill : track.fills()) {
            table.row()
                    .add(axis.date(fill.decidedOn()))
                    .add(axis.date(fill.filledOn()))
                    .add(track.assets().get(fill.asset()))
                    .add(fill.units())
                    .add(fill.price())
                    .add(fill.notional())
                    .add(fill.charges().commission())
                    .add(fill.charges().fixedFee())
                    .add(fill.charges().halfSpread())
                    .add(fill.charges().impact())
                    .add(fill.charges().stampDuty())
                    .add(fill.weightBefore())
                    .add(fill.weightAfter())
                    .add(fill.because().sentence())
                    .end();
        }
        return table;
    }

    /** {@code ledger.csv}: a row a movement of cash. */
    public static Table ledger(TimeAxis axis, Track track) {
        Table table = new Table(List.of("date", "kind", "asset", "amount"));
        for (LedgerEntry entry : track.ledger()) {
            table.row()
                    .add(axis.date(entry.bar()))
                    .add(entry.kind().word())
                    .add(
                            entry.asset().isPresent()
                                    ? track.assets().get(entry.asset().getAsInt())
                                    : "")
                    .add(entry.amount())
                    .end();
        }
        return table;
    }

    /** {@code yardsticks.csv}: wealth of yardsticks known only after the fact; a row a bar of {@code track}. */
    public static Table afterTheFact(TimeAxis axis, Track track, Map<String, Track> yardsticks) {
        List<String> header = new ArrayList<>(List.of("date"));
        yardsticks.keySet().forEach(name -> header.add("after_the_fact." + name + ".wealth"));
        Table table = new Table(header);
        for (int bar = track.firstBar(); bar <= track.lastBar(); bar++) {
            Table.Row row = table.row().add(axis.date(bar));
            for (Track own : yardsticks.values()) {
                row.add(own.wealth(bar));
            }
            row.end();
        }
        return table;
    }
}
