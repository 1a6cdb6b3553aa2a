package sojourn.world;

import java.util.Optional;
import java.util.OptionalDouble;
import sojourn.document.Field;
import sojourn.document.Refusal;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.numeric.Check;

/**
 * An asset of the exchange, as it is quoted; how it moves is said by each {@link HiddenState}.
 *
 * @param firstPrice the close on the eve of the first day
 * @param decimals decimals of the quotes, 0 to 6
 * @param closed days on which only this asset does not trade; its price moves on unseen
 * @param trading open, high, low and volume, if it trades through the day
 * @param couponPercentPerYear what the asset pays its holder, percent of the last close a year, accruing by calendar day
 *     (actual/365) and put back into the asset at every close; then a total return is quoted too
 */
public record Listing(
        double firstPrice,
        int decimals,
        Holidays closed,
        Optional<Trading> trading,
        OptionalDouble couponPercentPerYear) {
    private static final int MOST_DECIMALS = 6;
    private static final double LARGEST_COUPON = 50;

    /** Names of assets and states. */
    static final Shape<String> NAME =
            Shapes.textLike("[a-z][a-z0-9_]*", "a name of lower-case letters, digits and underscores");

    private static final Field<Double> FIRST_PRICE = Field.required(
            "first-price", Shapes.number().atLeast(0.01).atMost(1e9), "the close on the eve of the first day");
    private static final Field<Integer> DECIMALS = Field.defaulted(
            "decimals", Shapes.integer().atLeast(0).atMost(MOST_DECIMALS), "2", "decimals of the quotes");
    private static final Field<Optional<Holidays>> CLOSED =
            Field.maybe("closed", Holidays.SHAPE, "days of the year on which only this asset does not trade, as mm-dd");
    private static final Field<Optional<Trading>> TRADING = Field.maybe(
            "trading", Trading.SHAPE, "trading through the day: gives open, high, low and volume beside the close");
    private static final Field<Optional<Double>> COUPON = Field.maybe(
            "coupon-percent-per-year",
            Shapes.number().atLeast(0).atMost(LARGEST_COUPON),
            "coupon, percent of the last close a year: gives a total return beside the close");

    /** Reads {@code {first-price: 100, decimals: 3, coupon-percent-per-year: 3}}. */
    public static final Shape<Listing> SHAPE = Shapes.object(
                    "asset",
                    f -> new Listing(
                            f.get(FIRST_PRICE),
                            f.get(DECIMALS),
                            f.get(CLOSED).orElse(Holidays.none()),
                            f.get(TRADING),
                            f.get(COUPON).stream()
                                    .mapToDouble(Double::doubleValue)
                                    .findFirst()),
                    FIRST_PRICE,
                    DECIMALS,
                    CLOSED,
                    TRADING,
                    COUPON)
            .refuse(Listing::fault);

    /** Checks the bounds. */
    public Listing {
        Check.within(firstPrice, 0.01, 1e9, "firstPrice");
        Check.within(decimals, 0, MOST_DECIMALS, "decimals");
        couponPercentPerYear.ifPresent(coupon -> Check.within(coupon, 0, LARGEST_COUPON, "couponPercentPerYear"));
    }

    /** Refuses opens without coupon beside a close with it: a reader who mixed them up would find returns that nobody had. */
    Optional<Refusal> fault() {
        return trading.isPresent() && couponPercentPerYear.isPresent()
                ? Optional.of(new Refusal(
                        "coupon-percent-per-year",
                        "an asset with a coupon also has 'trading', whose open, high and low would know no coupon",
                        "leave out one of the two"))
                : Optional.empty();
    }
}
