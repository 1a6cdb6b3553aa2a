package sojourn.world;

import java.time.LocalDate;
import java.time.temporal.ChronoUnit;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import sojourn.numeric.RandomStream;

/**
 * Invents the market of a stated world. Every purpose (stays, tails, each asset's shocks and days, bills) has a random
 * stream of its own, read bar by bar: the same world gives the same bits on every machine, a longer world begins with the
 * shorter one, and changing how one asset trades leaves the others alone.
 */
public final class Inventor {
    private static final double DAYS_PER_COUPON_YEAR = 365;
    private static final double FIRST_TOTAL_RETURN = 100;

    private Inventor() {}

    /**
     * The truth, the prices and the rates of {@code world}.
     *
     * @throws IllegalArgumentException if its parts do not fit together, which {@link World#SHAPE} would have refused
     */
    public static InventedMarket invent(World world) {
        world.fault().ifPresent(refusal -> {
            throw new IllegalArgumentException(refusal.what() + "; " + refusal.remedy());
        });
        WorldTruth truth = TruePath.draw(world);
        LogReturns returns = LogReturns.draw(world, truth);
        List<InventedPrices> prices = new ArrayList<>();
        List<String> names = world.assetNames();
        for (int asset = 0; asset < names.size(); asset++) {
            prices.add(prices(world, truth, returns, asset));
        }
        return new InventedMarket(world, truth, prices, BillPath.draw(world));
    }

    private static InventedPrices prices(World world, WorldTruth truth, LogReturns returns, int asset) {
        String name = world.assetNames().get(asset);
        Listing listing = world.listing(name);
        double ordinary = world.state(world.stateNames().get(0)).move(name).volatilityPerBar(world.barsPerYear());
        Optional<DayTrading> days = listing.trading()
                .map(trading -> new DayTrading(trading, ordinary, RandomStream.of(world.seed(), "world-days", name)));
        double log = StrictMath.log(listing.firstPrice());
        List<Quote> quotes = new ArrayList<>();
        for (int bar = 0; bar < truth.size(); bar++) {
            double last = log;
            double move = returns.at(bar, asset);
            double volatility = returns.volatility(bar, asset);
            Optional<Candle> candle = days.map(day -> day.next(last, move, volatility, listing.decimals()));
            log = last + move;
            LocalDate date = truth.date(bar);
            if (!listing.closed().include(date)) {
                double close = Decimals.price(StrictMath.exp(log), listing.decimals());
                quotes.add(new Quote(date, close, candle, OptionalDouble.empty()));
            }
        }
        return new InventedPrices(name, listing, withTotalReturn(listing, quotes));
    }

    /**
     * Adds the total return T of published closes C: T = 100 on the first day, then T' = T (C' + C c d / 365) / C, where c is
     * the coupon and d the calendar days since the last quote. T is carried unrounded.
     */
    private static List<Quote> withTotalReturn(Listing listing, List<Quote> quotes) {
        if (listing.couponPercentPerYear().isEmpty() || quotes.isEmpty()) {
            return quotes;
        }
        double coupon = listing.couponPercentPerYear().getAsDouble() / 100;
        List<Quote> extended = new ArrayList<>();
        Quote last = quotes.get(0);
        double total = FIRST_TOTAL_RETURN;
        for (Quote quote : quotes) {
            long days = ChronoUnit.DAYS.between(last.date(), quote.date());
            total *= quote.close() / last.close() + coupon * days / DAYS_PER_COUPON_YEAR;
            double published = Decimals.price(total, Decimals.OF_TOTAL_RETURNS);
            extended.add(new Quote(quote.date(), quote.close(), quote.candle(), OptionalDouble.of(published)));
            last = quote;
        }
        return extended;
    }
}
