package sojourn.trade;

import java.util.ArrayList;
import java.util.List;
import sojourn.market.PriceTable;

/**
 * An order put into units and money as if it filled at the last close there is, by the same account that fills it in a simulation:
 * an estimate, for it will fill later at other prices.
 *
 * @param legs what is bought and sold
 * @param cost of all legs, money
 * @param after what would be held afterwards
 * @param outcome what came of it
 */
public record Basket(List<Fill> legs, double cost, Holdings after, Outcome outcome) {
    /** Whether the order could fill. */
    public enum Outcome {
        /** It can; without a leg if what is held is what is wanted. */
        FILLS,
        /** It can in part on one bar; the rest waits for later ones. */
        FILLS_IN_PART,
        /** It cannot for now, for a leg has no price, or nothing would be left after its costs. */
        DOES_NOT_FILL
    }

    /** Copies the list. */
    public Basket {
        legs = List.copyOf(legs);
    }

    /**
     * {@code order} from {@code holdings}, whose wealth must be above 0, at the last close of {@code table}; costs that depend on past
     * trading take what is known at that close.
     */
    public static Basket of(PriceTable table, Holdings holdings, Order order, Terms terms) {
        int bar = table.size() - 1;
        int assets = table.assets().size();
        Account account = new Account(table.fillPrices(), assets, terms)
                .holding(Quantities.each(assets, holdings.units()::get), holdings.cash());
        Account.Outcome outcome = account.fill(order, bar, new NextClose(0), table.knownAt(bar));
        List<Double> units = new ArrayList<>();
        for (int asset = 0; asset < assets; asset++) {
            units.add(account.units(asset));
        }
        return new Basket(account.fills(), account.cost(), new Holdings(units, account.cash()), told(outcome));
    }

    private static Outcome told(Account.Outcome outcome) {
        return switch (outcome) {
            case FILLED -> Outcome.FILLS;
            case PART -> Outcome.FILLS_IN_PART;
            case BLOCKED, RUIN -> Outcome.DOES_NOT_FILL;
        };
    }
}
