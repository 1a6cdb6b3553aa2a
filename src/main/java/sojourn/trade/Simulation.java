package sojourn.trade;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import sojourn.allocate.Decision;
import sojourn.allocate.Policy;
import sojourn.allocate.Situation;
import sojourn.allocate.Stance;
import sojourn.allocate.Weights;
import sojourn.market.FillPrices;
import sojourn.market.Known;
import sojourn.market.PriceTable;
import sojourn.numeric.Check;
import sojourn.walk.Reading;
import sojourn.walk.Signal;

/**
 * Runs one policy through the prices, one bar after another. On each bar, in this order: interest on the cash of the close before and what
 * else holding brings and costs; fills of orders that are due; the mark at the close; the decision with what is known at that close. Whoever decides is shown the
 * weights at the close as if every pending order had filled, and nothing later.
 */
public final class Simulation {
    private final PriceTable table;
    private final Signal signal;
    private final Policy policy;
    private final Terms terms;
    private final List<String> regimes;
    private final Account account;
    private final boolean distributes;
    private final Deque<Order> pending = new ArrayDeque<>();
    private final List<Order> dropped = new ArrayList<>();
    private final List<Undecided> undecided = new ArrayList<>();
    private Stance stance = Stance.first();
    private Optional<Weights> target = Optional.empty();
    private double wealth;
    private Weights held;
    private OptionalInt ruinedOn = OptionalInt.empty();

    private Simulation(PriceTable table, Signal signal, Policy policy, Terms terms) {
        this.table = table;
        this.signal = signal;
        this.policy = policy;
        this.terms = terms;
        this.regimes = List.copyOf(signal.regimes());
        this.account = new Account(table, terms);
        this.distributes = table.fillPrices().distributes();
        this.held = Weights.none(table.assets().size());
    }

    /**
     * The track from the policy's first decision on; empty if it never decides.
     *
     * @param fromBar the first bar at whose close the policy is asked: the first with a reading for a strategy, the strategy's first
     *     decision for a yardstick that is to start with it
     */
    public static Optional<Track> run(PriceTable table, Signal signal, Policy policy, Terms terms, int fromBar) {
        Check.within(fromBar, 0, table.size() - 1, "fromBar");
        return new Simulation(table, signal, policy, terms).walk(fromBar);
    }

    private Optional<Track> walk(int fromBar) {
        int start = fromBar;
        Optional<Decision> first = Optional.empty();
        while (first.isEmpty() && start < table.size()) {
            Decision decision = ask(start, held);
            if (decision.target().isEmpty()) {
                start++;
            } else {
                first = Optional.of(decision);
            }
        }
        return first.isEmpty() ? Optional.empty() : Optional.of(track(start, first.get()));
    }

    private Track track(int start, Decision first) {
        Track.Rows rows = new Track.Rows(
                table.size() - start, table.assets().size(), account.accruals().any());
        take(start, first);
        fillDue(start);
        mark(start);
        write(rows, 0, first.change());
        for (int bar = start + 1; bar < table.size(); bar++) {
            write(rows, bar - start, ruinedOn.isPresent() ? rest() : step(bar));
        }
        return new Track(
                table.assets(),
                terms.capital(),
                start,
                rows,
                account.fills(),
                account.accruals().entries(),
                account.hindrances(),
                unfilled(),
                ruinedOn.isPresent() ? List.of() : List.copyOf(pending),
                undecided,
                ruinedOn,
                account.writtenOff(),
                stance);
    }

    private Decision.Change step(int bar) {
        account.accrue(bar);
        if (distributes) {
            splitPending(bar);
        }
        fillDue(bar);
        mark(bar);
        if (ruinedOn.isPresent()) {
            return Decision.Change.SAME;
        }
        Order last = pending.peekLast();
        Decision decision = ask(bar, last == null ? held : last.target());
        take(bar, decision);
        if (dueAtOnce(bar)) { // never after an honest fill rule
            fillDue(bar);
            mark(bar);
        }
        return decision.change();
    }

    private Decision.Change rest() {
        account.rest();
        return Decision.Change.SAME;
    }

    private Decision ask(int bar, Weights weights) {
        Known known = table.knownAt(bar);
        Optional<Reading> reading = signal.at(known);
        int ahead = terms.fill().barsToFirstReturn();
        Situation situation = new Situation(known, reading, regimes, weights, ahead);
        Decision decision = policy.at(situation, stance);
        stance = decision.next();
        if (decision.kind() == Decision.Kind.UNDEFINED) {
            undecided.add(new Undecided(bar, decision.because()));
        }
        return decision;
    }

    private void take(int bar, Decision decision) {
        if (decision.target().isPresent()) {
            target = decision.target();
        }
        if (decision.kind() == Decision.Kind.ORDER) {
            Weights ordered = decision.target().orElseThrow();
            Order order = new Order(bar, terms.fill().dueOn(bar), ordered, decision.because());
            pending.add(terms.sizeAt() == SizeAt.DECISION ? order.toHold(sized(bar, ordered)) : order);
        }
    }

    /**
     * The units that target weights come to at the closes of the decision, with wealth less estimated costs, as if pending orders had
     * filled; without the costs where they cannot be estimated.
     */
    private Quantities sized(int bar, Weights ordered) {
        FillPrices prices = table.fillPrices();
        Quantities expected = pending.isEmpty()
                ? account.units()
                : pending.getLast().quantities().orElseThrow();
        double worth = account.wealth(bar);
        double cash = worth;
        for (int i = 0; i < expected.size(); i++) {
            cash -= expected.at(i) * prices.close(i, bar);
        }
        Optional<Basket> basket = Basket.at(table, bar, expected, cash, ordered, terms);
        if (basket.isPresent() && basket.get().hindrances().stream().noneMatch(Hindrance::waits)) {
            basket.get().hindrances().stream()
                    .filter(one -> one.kind() == Hindrance.Kind.LOT)
                    .forEach(account.hindrances()::add);
            return basket.get().wanted();
        }
        double[] lots = terms.lots().of(table.assets());
        return Quantities.each(lots.length, i -> Lots.whole(lots[i], ordered.at(i) * worth / prices.close(i, bar)));
    }

    /** Units that are settled already become those after the bar's splits. */
    private void splitPending(int bar) {
        FillPrices prices = table.fillPrices();
        for (int waiting = pending.size(); waiting > 0; waiting--) {
            Order order = pending.removeFirst();
            pending.add(order.quantities()
                    .map(units -> order.toHold(Quantities.each(units.size(), i -> units.at(i) * prices.split(i, bar))))
                    .orElse(order));
        }
    }

    /** First in, first out; an order still waiting for a price gives way to the next one due. */
    private void fillDue(int bar) {
        while (ruinedOn.isEmpty() && due(bar)) {
            Order order = pending.removeFirst();
            if (due(bar)) {
                dropped.add(order);
                continue;
            }
            Known before = table.knownAt(terms.fill().costsKnownOn(bar));
            Account.Outcome outcome = account.fill(order, bar, terms.fill()::price, before);
            if (outcome == Account.Outcome.RUIN) {
                dropped.add(order);
                ruin(bar);
            } else if (outcome == Account.Outcome.BLOCKED || outcome == Account.Outcome.WORTHLESS) {
                pending.addFirst(order);
                return;
            } else if (outcome == Account.Outcome.PART) {
                pending.addFirst(order.restToHold(account.carried().orElseThrow()));
                return;
            }
        }
    }

    private boolean dueAtOnce(int bar) {
        return !pending.isEmpty()
                && pending.getLast().decidedOn() == bar
                && pending.getLast().dueOn() <= bar;
    }

    private boolean due(int bar) {
        return !pending.isEmpty() && pending.getFirst().dueOn() <= bar;
    }

    private List<Order> unfilled() {
        List<Order> unfilled = new ArrayList<>(dropped);
        unfilled.addAll(pending);
        return unfilled;
    }

    private void mark(int bar) {
        if (ruinedOn.isEmpty()) {
            wealth = account.wealth(bar);
            if (wealth > 0) {
                held = account.weights(bar, wealth);
            } else {
                ruin(bar);
            }
        }
    }

    private void ruin(int bar) {
        account.ruin(bar);
        wealth = 0;
        held = Weights.none(table.assets().size());
        ruinedOn = OptionalInt.of(bar);
    }

    private void write(Track.Rows rows, int row, Decision.Change change) {
        rows.wealth[row] = wealth;
        rows.cash[row] = account.cash();
        rows.interest[row] = account.interest();
        rows.cost[row] = account.cost();
        rows.accrued(row, account.accruals());
        rows.turnover[row] = account.turnover();
        rows.switched[row] = change == Decision.Change.SWITCHED;
        Weights decided = target.orElseThrow();
        int assets = decided.size();
        for (int i = 0; i < assets; i++) {
            rows.units[row * assets + i] = account.units(i);
            rows.weights[row * assets + i] = held.at(i);
            rows.targets[row * assets + i] = decided.at(i);
        }
    }
}
