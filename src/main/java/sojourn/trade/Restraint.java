package sojourn.trade;

import java.util.Arrays;
import sojourn.allocate.Weights;

/**
 * Holds back what one part of an order adds to positions, so that an order that takes several bars keeps on each of them to what it was
 * decided for. With V wealth after the part's costs, no position grows beyond its target weight times V; all together they do not
 * grow beyond the target's gross weight times V, or what they were if that is more; and cash does not fall below that of the target
 * or 0, or what it was if that is less. What reduces positions is never held back. The first is met leg by leg, the others by one
 * share of all that grows: linear in it, or less where a position changes sides. Holding back only lowers costs, so V may be taken
 * before. Ours.
 */
final class Restraint {
    private static final double ROUNDING = 1e-12;

    private final Tariff tariff;
    private final double[] lots;
    private final boolean[] reached;
    private boolean shared;

    /** Of lots by asset, 0 for any fraction. Not modified. */
    Restraint(Tariff tariff, double[] lots) {
        this.tariff = tariff;
        this.lots = lots;
        this.reached = new boolean[lots.length];
    }

    /** Nothing is held back. */
    void none() {
        Arrays.fill(reached, false);
        shared = false;
    }

    /**
     * Holds back.
     *
     * @param before wealth
     * @param cash before
     * @param value held, one an asset. Not modified.
     * @param price one an asset. Not modified.
     * @param bought units of this part, negative if sold. Modified.
     */
    void hold(double before, double cash, double[] value, double[] price, Weights target, double[] bought) {
        none();
        double after = before - costs(price, bought);
        for (int i = 0; i < bought.length; i++) {
            double most = Math.abs(target.at(i)) * after;
            double end = value[i] + bought[i] * price[i];
            if (grows(value[i], end) && Math.abs(end) > most * (1 + ROUNDING)) {
                double rest = Math.signum(end) * most - value[i];
                bought[i] = rest * bought[i] > 0 ? Lots.whole(lots[i], rest / price[i]) : 0;
                reached[i] = true;
            }
        }
        share(after, cash, value, price, target, bought);
    }

    private void share(double after, double cash, double[] value, double[] price, Weights target, double[] bought) {
        double gross = 0;
        double fixed = 0;
        double growth = 0;
        double money = cash - costs(price, bought);
        double added = 0;
        for (int i = 0; i < bought.length; i++) {
            double trade = bought[i] * price[i];
            double end = value[i] + trade;
            boolean grows = grows(value[i], end);
            gross += Math.abs(value[i]);
            fixed += Math.abs(grows ? value[i] : end);
            growth += grows ? Math.abs(end) - Math.abs(value[i]) : 0;
            money -= grows ? 0 : trade;
            added += grows ? trade : 0;
        }
        double room = Math.max(target.gross() * after, gross) - fixed;
        double spare = money - Math.min(Math.min(0, target.cash() * after), cash);
        double part = Math.min(within(room, growth), within(spare, added));
        if (part < 1 - ROUNDING) {
            shared = true;
            for (int i = 0; i < bought.length; i++) {
                if (grows(value[i], value[i] + bought[i] * price[i])) {
                    bought[i] = Lots.whole(lots[i], part * bought[i]);
                    reached[i] = false;
                }
            }
        }
    }

    private static double within(double room, double wanted) {
        return wanted > 0 ? Math.max(0, Math.min(1, room / wanted)) : 1;
    }

    private double costs(double[] price, double[] bought) {
        double costs = 0;
        for (int i = 0; i < bought.length; i++) {
            costs += bought[i] == 0 ? 0 : tariff.cost(i, bought[i] * price[i]);
        }
        return costs;
    }

    private static boolean grows(double held, double end) {
        return Math.abs(end) > Math.abs(held);
    }

    /** Whether a position has grown to its target weight. */
    boolean reached(int asset) {
        return reached[asset];
    }

    /** Whether all that grows was held back together. */
    boolean shared() {
        return shared;
    }
}
