package sojourn.trade;

import java.util.Arrays;
import java.util.Optional;
import java.util.OptionalDouble;
import sojourn.market.Known;

/**
 * What the legs of an order cost at the conditions known before the bar of its fill. Leg i of value a costs
 * max(minimum, commission × a) + fixed + halfSpread_i × a + duty × a (if it buys) + impact_i × a^1.5, and may not be worth more
 * than most_i. Each is convex in the value traded.
 */
final class Tariff {
    private final Costs costs;
    private final boolean onlyProportional;
    private final double[] rates;
    private final double[] halfSpread;
    private final double[] impact;
    private final double[] most;

    /** By asset: half-spread as a fraction, impact factor in money^-0.5, and the most that may be traded. Not modified. */
    Tariff(Costs costs, double[] halfSpread, double[] impact, double[] most) {
        this.costs = costs;
        this.onlyProportional = costs.onlyProportional()
                && Arrays.stream(impact).allMatch(factor -> factor == 0)
                && Arrays.stream(most).allMatch(Double::isInfinite);
        this.halfSpread = halfSpread.clone();
        this.impact = impact.clone();
        this.most = most.clone();
        this.rates = new double[halfSpread.length];
        Arrays.setAll(rates, i -> costs.commissionRate() + halfSpread[i]);
    }

    /** For assets whose conditions are not known yet; see {@link #observe}. */
    static Tariff of(Costs costs, int assets) {
        double[] spreads = new double[assets];
        Arrays.fill(spreads, costs.halfSpreadRate());
        return new Tariff(costs, spreads, new double[assets], unlimited(assets));
    }

    /** Rates alone, one an asset, fractions of the traded value. Not modified. */
    static Tariff ofRates(double... rates) {
        return new Tariff(Costs.none(), rates, new double[rates.length], unlimited(rates.length));
    }

    private static double[] unlimited(int assets) {
        double[] most = new double[assets];
        Arrays.fill(most, Double.POSITIVE_INFINITY);
        return most;
    }

    /** Takes over what is known of one asset; tells what is missing, if anything is. */
    Optional<Hindrance.Kind> observe(Known known, int asset) {
        if (costs.spreadOfVolatility().isPresent()) {
            SpreadOfVolatility spread = costs.spreadOfVolatility().get();
            OptionalDouble volatility = Trailing.volatility(known, asset, spread.bars());
            if (volatility.isEmpty()) {
                return Optional.of(Hindrance.Kind.NO_VOLATILITY);
            }
            halfSpread[asset] = costs.halfSpreadRate() + spread.share() * volatility.getAsDouble();
        }
        return costs.impact().flatMap(size -> observe(size, known, asset));
    }

    private Optional<Hindrance.Kind> observe(Impact size, Known known, int asset) {
        OptionalDouble volatility = Trailing.volatility(known, asset, size.volatilityBars());
        if (volatility.isEmpty()) {
            return Optional.of(Hindrance.Kind.NO_VOLATILITY);
        }
        OptionalDouble traded = Trailing.tradedValue(known, asset, size.volumeBars());
        if (traded.isEmpty()) {
            return Optional.of(Hindrance.Kind.NO_VOLUME);
        }
        impact[asset] = Impact.factor(size.coefficient(), volatility.getAsDouble(), traded.getAsDouble());
        size.participationPercent().ifPresent(percent -> most[asset] = percent / 100 * traded.getAsDouble());
        return Optional.empty();
    }

    int assets() {
        return rates.length;
    }

    /** Whether each leg costs its {@link #rate} and nothing else, whatever its size. */
    boolean onlyProportional() {
        return onlyProportional;
    }

    /** Commission and half-spread as a fraction of the traded value. */
    double rate(int asset) {
        return rates[asset];
    }

    /** What a trade, bought if positive, costs in all. It counts as a leg even at a value of 0. */
    double cost(int asset, double trade) {
        double value = Math.abs(trade);
        return Math.max(costs.minimumFee(), costs.commissionRate() * value)
                + costs.fixedFee()
                + halfSpread[asset] * value
                + costs.stampDutyRate() * Math.max(0, trade)
                + impact[asset] * value * Math.sqrt(value);
    }

    /** The same, item by item. */
    Charges charges(int asset, double trade) {
        double value = Math.abs(trade);
        return new Charges(
                Math.max(costs.minimumFee(), costs.commissionRate() * value),
                costs.fixedFee(),
                halfSpread[asset] * value,
                costs.stampDutyRate() * Math.max(0, trade),
                impact[asset] * value * Math.sqrt(value));
    }

    /** The part of a trade that may happen on one bar. */
    double within(int asset, double trade) {
        return Math.max(-most[asset], Math.min(most[asset], trade));
    }
}
