package sojourn.report;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import sojourn.latest.Standing;
import sojourn.latest.Trace;
import sojourn.trade.Charges;
import sojourn.trade.Fill;
import sojourn.trade.LedgerEntry;
import sojourn.trade.Order;
import sojourn.trade.Track;

/** The last part of a traced bar: orders, fills, and every movement of cash, so that the cash after it can be added up. */
final class TraceMoneyText {
    private final StringBuilder text = new StringBuilder("What was ordered, and what came of it?\n");
    private final Trace trace;
    private final Standing standing;
    private final List<String> assets;

    private TraceMoneyText(Trace trace) {
        this.trace = trace;
        this.standing = trace.standing();
        this.assets = standing.table().assets();
    }

    static String of(Trace trace) {
        TraceMoneyText all = new TraceMoneyText(trace);
        all.orders();
        all.standing.track().ifPresent(all::money);
        return all.text.toString();
    }

    private void orders() {
        trace.filledHere().forEach(fill -> line("filled here", told(fill)));
        boolean ordered = standing.pending().stream().anyMatch(order -> order.decidedOn() == standing.bar());
        if (!ordered) {
            line("order", "none decided at this close");
        } else if (trace.filledLater().isEmpty()) {
            line("order", "not filled as far as the files go");
        }
        trace.filledLater().forEach(fill -> line("order", told(fill)));
        standing.pending().stream()
                .filter(order -> order.decidedOn() < standing.bar())
                .forEach(order -> line("still waits", told(order)));
    }

    private String told(Order order) {
        String units = order.quantities()
                .map(all -> ", to hold "
                        + String.join(
                                ", ",
                                IntStream.range(0, assets.size())
                                        .mapToObj(asset -> TraceText.full(all.at(asset)) + " " + assets.get(asset))
                                        .toList()))
                .orElse("");
        boolean carried = order.dueOn() <= standing.bar();
        return "decided on " + date(order.decidedOn()) + ", target " + TraceText.exact(order.target(), assets) + units
                + (carried ? ", was due on " + date(order.dueOn()) + " and goes on" : "");
    }

    private void money(Track track) {
        int bar = standing.bar();
        if (bar > track.firstBar()) {
            line("cash before", TraceText.full(track.cash(bar - 1)) + ", after the bar before");
        }
        for (LedgerEntry one : trace.ledger()) {
            String whose =
                    one.asset().isPresent() ? " of " + assets.get(one.asset().getAsInt()) : "";
            line("cash moved", one.kind().word() + whose + " " + TraceText.full(one.amount()));
        }
        line(
                "money",
                "wealth " + TraceText.full(track.wealth(bar)) + ", cash " + TraceText.full(track.cash(bar))
                        + ", interest of this bar " + TraceText.full(track.interest(bar)) + ", costs of this bar "
                        + TraceText.full(track.cost(bar)));
    }

    private String told(Fill fill) {
        return "decided on " + date(fill.decidedOn()) + ", filled on " + date(fill.filledOn()) + ": "
                + Amounts.units(fill.units()) + " " + assets.get(fill.asset()) + " at " + TraceText.full(fill.price())
                + ", value "
                + TraceText.full(fill.notional()) + ", " + charges(fill.charges()) + ", weight "
                + TraceText.full(fill.weightBefore()) + " to " + TraceText.full(fill.weightAfter());
    }

    /** Commission and half-spread always, the others where there are any. */
    private static String charges(Charges charges) {
        List<String> parts = new ArrayList<>(List.of(
                "commission " + TraceText.full(charges.commission()),
                "half-spread " + TraceText.full(charges.halfSpread())));
        if (charges.fixedFee() > 0) {
            parts.add("fixed fee " + TraceText.full(charges.fixedFee()));
        }
        if (charges.stampDuty() > 0) {
            parts.add("stamp duty " + TraceText.full(charges.stampDuty()));
        }
        if (charges.impact() > 0) {
            parts.add("impact " + TraceText.full(charges.impact()));
        }
        return String.join(", ", parts);
    }

    private String date(int bar) {
        return trace.ready().market().table().knownAt(bar).date().toString();
    }

    private void line(String label, String content) {
        text.append(TraceText.entry(label, content));
    }
}
