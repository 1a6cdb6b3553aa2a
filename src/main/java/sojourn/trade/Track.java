package sojourn.trade;

import java.util.Arrays;
import java.util.List;
import java.util.OptionalInt;
import sojourn.allocate.Stance;
import sojourn.numeric.Check;

/**
 * What a policy's money did, bar by bar, from the bar of its first decision (starting capital, no position yet) to the last bar
 * there is. Immutable. Money is in the currency of the prices; weights are shares of wealth; bars are those of the price table.
 */
public final class Track {
    private final List<String> assets;
    private final double capital;
    private final int firstBar;
    private final Rows rows;
    private final List<Fill> fills;
    private final List<LedgerEntry> accruals;
    private final List<Hindrance> hindrances;
    private final List<Order> unfilled;
    private final List<Order> waiting;
    private final List<Undecided> undecided;
    private final OptionalInt ruinedOn;
    private final double writtenOff;
    private final Stance stance;

    Track(
            List<String> assets,
            double capital,
            int firstBar,
            Rows rows,
            List<Fill> fills,
            List<LedgerEntry> accruals,
            List<Hindrance> hindrances,
            List<Order> unfilled,
            List<Order> waiting,
            List<Undecided> undecided,
            OptionalInt ruinedOn,
            double writtenOff,
            Stance stance) {
        this.assets = List.copyOf(assets);
        this.capital = capital;
        this.firstBar = firstBar;
        this.rows = rows;
        this.fills = List.copyOf(fills);
        this.accruals = List.copyOf(accruals);
        this.hindrances = List.copyOf(hindrances);
        this.unfilled = List.copyOf(unfilled);
        this.waiting = List.copyOf(waiting);
        this.undecided = List.copyOf(undecided);
        this.ruinedOn = ruinedOn;
        this.writtenOff = writtenOff;
        this.stance = stance;
    }

    /** Names of the assets. */
    public List<String> assets() {
        return assets;
    }

    /** Wealth to begin with. */
    public double capital() {
        return capital;
    }

    /** The bar of the first decision. */
    public int firstBar() {
        return firstBar;
    }

    /** The last bar. */
    public int lastBar() {
        return firstBar + rows.size() - 1;
    }

    /** Number of bars. */
    public int size() {
        return rows.size();
    }

    /** Wealth at the close. */
    public double wealth(int bar) {
        return rows.wealth[row(bar)];
    }

    /** Wealth at the closes from {@code fromBar} to {@code toBar}, both included; a copy. */
    public double[] wealth(int fromBar, int toBar) {
        return Arrays.copyOfRange(rows.wealth, row(fromBar), row(toBar) + 1);
    }

    /** Wealth at this close by wealth at the one before, less 1; 0 once wealth is gone. Undefined on the first bar: refused. */
    public double simpleReturn(int bar) {
        double before = wealth(bar - 1);
        return before > 0 ? wealth(bar) / before - 1 : 0;
    }

    /** {@link #simpleReturn} on the bars from {@code fromBar} to {@code toBar}, both included. */
    public double[] simpleReturns(int fromBar, int toBar) {
        Check.within(fromBar, firstBar + 1, lastBar(), "fromBar");
        Check.within(toBar, fromBar, lastBar(), "toBar");
        double[] returns = new double[toBar - fromBar + 1];
        for (int i = 0; i < returns.length; i++) {
            returns[i] = simpleReturn(fromBar + i);
        }
        return returns;
    }

    /** Cash after this bar's fills; negative if borrowed. */
    public double cash(int bar) {
        return rows.cash[row(bar)];
    }

    /** Cash after this bar's fills, at the close, as a share of wealth; 0 once wealth is gone. */
    public double cashWeight(int bar) {
        int row = row(bar);
        return rows.wealth[row] > 0 ? rows.cash[row] / rows.wealth[row] : 0;
    }

    /** Units held after this bar's fills; negative if short. */
    public double units(int bar, int asset) {
        return rows.units[cell(bar, asset)];
    }

    /** Weight held after this bar's fills, at the close. */
    public double weight(int bar, int asset) {
        return rows.weights[cell(bar, asset)];
    }

    /** The sum of the weights of all assets at the close. */
    public double netWeight(int bar) {
        double net = 0;
        for (int asset = 0; asset < assets.size(); asset++) {
            net += weight(bar, asset);
        }
        return net;
    }

    /** Target decided at this close, or carried from the last decision before it. */
    public double target(int bar, int asset) {
        return rows.targets[cell(bar, asset)];
    }

    /** Interest of this bar at the cash rate, on the cash of the close before; money, negative if paid. */
    public double interest(int bar) {
        return rows.interest[row(bar)];
    }

    /** What negative cash paid this bar above the cash rate, money, at least 0. */
    public double marginInterest(int bar) {
        return rows.at(rows.margin, row(bar));
    }

    /** What was paid this bar for what was held short at the close before, money, at least 0. */
    public double borrowFee(int bar) {
        return rows.at(rows.borrowFee, row(bar));
    }

    /** Dividends of this bar on what was held at the close before, money; negative if paid by shorts. */
    public double dividend(int bar) {
        return rows.at(rows.dividend, row(bar));
    }

    /** All charges of this bar's fills, money, at least 0. */
    public double cost(int bar) {
        return rows.cost[row(bar)];
    }

    /** One-way turnover of this bar: sum of |traded value| / 2 / wealth before trading. */
    public double turnover(int bar) {
        return rows.turnover[row(bar)];
    }

    /** Whether the decision at this close changed the rule's state. */
    public boolean switched(int bar) {
        return rows.switched[row(bar)];
    }

    /** Every leg filled, in order. */
    public List<Fill> fills() {
        return fills;
    }

    /** The bar of the first fill. */
    public OptionalInt firstFill() {
        return fills.isEmpty()
                ? OptionalInt.empty()
                : OptionalInt.of(fills.get(0).filledOn());
    }

    /** Every movement of cash, in order; made when asked for. */
    public List<LedgerEntry> ledger() {
        return Ledger.of(this, accruals, writtenOff);
    }

    /** What kept orders from filling as decided, bar by bar, in order. */
    public List<Hindrance> hindrances() {
        return hindrances;
    }

    /** Orders that were never filled, or not in full: due after the last bar, waiting for a price, replaced while waiting, or overtaken by ruin. */
    public List<Order> unfilled() {
        return unfilled;
    }

    /** Orders that still wait after the last bar, the oldest first: some of the unfilled ones, none after ruin. */
    public List<Order> waiting() {
        return waiting;
    }

    /** Closes at which a decision was due and there were no weights, also before the first decision; in order. */
    public List<Undecided> undecided() {
        return undecided;
    }

    /**
     * The bar at whose close wealth was gone. Positions are closed at that close without cost or turnover; from there on nothing is
     * held, decided or earned.
     */
    public OptionalInt ruinedOn() {
        return ruinedOn;
    }

    /** What the policy remembers after the last close. */
    public Stance stance() {
        return stance;
    }

    private int row(int bar) {
        return Check.within(bar, firstBar, lastBar(), "bar") - firstBar;
    }

    private int cell(int bar, int asset) {
        return row(bar) * assets.size() + Check.within(asset, 0, assets.size() - 1, "asset");
    }

    /** The columns: one value a bar, or one a bar and asset, row-major. Filled by the simulation, then left alone. */
    static final class Rows {
        final double[] wealth;
        final double[] cash;
        final double[] interest;
        final double[] cost;
        final double[] turnover;
        final boolean[] switched;
        final double[] units;
        final double[] weights;
        final double[] targets;
        final double[] margin;
        final double[] borrowFee;
        final double[] dividend;

        /** What holding brings and costs besides interest has columns only if there can be any. */
        Rows(int bars, int assets, boolean accruing) {
            this.wealth = new double[bars];
            this.cash = new double[bars];
            this.interest = new double[bars];
            this.cost = new double[bars];
            this.turnover = new double[bars];
            this.switched = new boolean[bars];
            this.units = new double[bars * assets];
            this.weights = new double[bars * assets];
            this.targets = new double[bars * assets];
            this.margin = new double[accruing ? bars : 0];
            this.borrowFee = new double[accruing ? bars : 0];
            this.dividend = new double[accruing ? bars : 0];
        }

        void accrued(int row, Accruals accruals) {
            if (margin.length > 0) {
                margin[row] = accruals.margin();
                borrowFee[row] = accruals.borrowFee();
                dividend[row] = accruals.dividend();
            }
        }

        double at(double[] column, int row) {
            return column.length == 0 ? 0 : column[row];
        }

        int size() {
            return wealth.length;
        }
    }
}
