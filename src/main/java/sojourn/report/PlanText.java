package sojourn.report;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import sojourn.archive.Caution;
import sojourn.compare.Prepared;
import sojourn.document.Problem;
import sojourn.market.Calendar;
import sojourn.market.CashSource;
import sojourn.market.Finding;
import sojourn.market.InputFile;
import sojourn.market.Known;
import sojourn.market.PriceTable;
import sojourn.measure.Yardstick;
import sojourn.strategy.Strategy;
import sojourn.walk.FitPlan;

/** What would be run, in plain English, with everything odd about the files and everything that is left out. */
public final class PlanText {
    private static final int INDENT = 13;

    private final StringBuilder text = new StringBuilder();

    private PlanText() {}

    /** The caution, then the plan of each strategy. */
    public static String of(List<Prepared> prepared) {
        PlanText plan = new PlanText();
        plan.text.append(Lines.wrapped(Caution.TEXT, 0));
        for (Prepared one : prepared) {
            plan.text.append('\n');
            if (one instanceof Prepared.Ready ready) {
                plan.ready(ready);
            } else if (one instanceof Prepared.Unreadable unreadable) {
                plan.unreadable(unreadable);
            }
        }
        return plan.text.toString();
    }

    private void unreadable(Prepared.Unreadable one) {
        title(one.file().strategy().name(), one.file().shownName());
        for (Problem problem : one.problems()) {
            line("Fault", problem.toString());
        }
    }

    private void ready(Prepared.Ready ready) {
        Strategy strategy = ready.file().strategy();
        PriceTable table = ready.market().table();
        title(strategy.name(), ready.file().shownName());
        line(
                "Why",
                strategy.hypothesis()
                        .map(String::strip)
                        .orElse("no hypothesis is written down; write one before you look"));
        for (InputFile file : ready.market().files()) {
            line(file.role(), file.file() + ", " + file.rows() + " rows, " + file.first() + " to " + file.last());
        }
        line("Cash", cash(strategy.cash()));
        Known last = table.knownAt(table.size() - 1);
        line(
                "Bars",
                table.size() + days(strategy.calendar()) + table.barLength().word() + " bars of "
                        + Stream.concat(table.assets().stream(), table.levels().stream())
                                .collect(Collectors.joining(", "))
                        + ", " + last.date(0) + " to " + last.date() + "; "
                        + (int) table.barLength().periodsPerYear() + " count as a year");
        line("Watches", GaugeText.watches(strategy.regimes()));
        strategy.regimes()
                .fixed()
                .ifPresent(fixed -> line("Declared", GaugeText.declared(strategy.regimes(), fixed, table)));
        FitPlan plan = FitPlan.of(table, strategy.regimes(), strategy.refit());
        line("Fits", GaugeText.fits(strategy.refit(), strategy.regimes(), plan));
        line("Rule", RuleText.of(strategy.rule()));
        line("Trades", TradeText.of(strategy, plan));
        line("Judged", judged(strategy));
        line("Left out", TradeText.leftOut(strategy));
        List<String> findings = findings(ready);
        for (String finding : findings) {
            line("Finding", finding);
        }
        if (plan.fitDates().isEmpty()) {
            line("Fault", "no fit will ever be due, so the strategy cannot run; see Fits above");
        } else if (findings.isEmpty()) {
            line("Findings", "none");
        }
    }

    /** What is odd about the files, then what is odd about the settings. */
    static List<String> findings(Prepared.Ready ready) {
        List<String> found = new ArrayList<>();
        for (Finding finding : ready.market().findings()) {
            found.add(finding.toString());
        }
        ready.file().strategy().neverHolds().ifPresent(found::add);
        ready.file().strategy().paysForEveryDrift().ifPresent(found::add);
        found.addAll(GaugeText.findings(ready.file().strategy().regimes()));
        return found;
    }

    private static String cash(CashSource cash) {
        if (cash instanceof CashSource.Constant constant) {
            return constant.percentPerYear() == 0
                    ? "earns nothing; ratios are taken over zero"
                    : "earns " + constant.percentPerYear() + " % a year, simple, "
                            + constant.dayCount().word();
        }
        return "earns the last rate dated at or before the close before, for the calendar days between two bars";
    }

    private static String days(Calendar calendar) {
        return calendar.days() == Calendar.Days.UNION ? " joined " : " common ";
    }

    private static String judged(Strategy strategy) {
        return "against "
                + strategy.judge().against().stream().map(Yardstick::word).collect(Collectors.joining(", "))
                + "; doing nothing is " + RuleText.weights(strategy.judge().buyAndHold()) + "; ranked by "
                + strategy.judge().rankBy().key().replace('_', ' ');
    }

    private void title(String name, String file) {
        text.append(name).append("  [").append(file).append("]\n");
    }

    private void line(String label, String content) {
        String head = String.format(Locale.ROOT, "  %-" + (INDENT - 3) + "s ", label);
        text.append(Lines.after(head, content, INDENT));
    }
}
