package sojourn.world;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.time.temporal.ChronoUnit;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class InventorTest {
    private static final World SKERRY = Worlds.skerry().withYears(3);

    @Test
    void theSameSeedGivesTheSameBytesAndAnotherSeedOtherOnes() {
        Map<String, String> files = WorldFiles.of(Inventor.invent(SKERRY));
        assertThat(WorldFiles.of(Inventor.invent(SKERRY))).isEqualTo(files);
        Map<String, String> others = WorldFiles.of(Inventor.invent(SKERRY.withSeed(SKERRY.seed() + 1)));
        assertThat(others.keySet()).containsExactlyElementsOf(files.keySet());
        files.forEach((name, text) -> assertThat(others.get(name)).as(name).isNotEqualTo(text));
    }

    @Test
    void aLongerWorldBeginsWithTheShorterOne() {
        Map<String, String> longer = WorldFiles.of(Inventor.invent(SKERRY.withYears(5)));
        WorldFiles.of(Inventor.invent(SKERRY))
                .forEach((name, text) -> assertThat(longer.get(name)).as(name).startsWith(text));
    }

    @Test
    void howOneAssetTradesLeavesEverythingElseAlone() {
        Map<String, Listing> listings = new LinkedHashMap<>(SKERRY.assets());
        listings.put(
                "stocks",
                new Listing(
                        500,
                        3,
                        Holidays.none(),
                        Optional.empty(),
                        SKERRY.listing("bonds").couponPercentPerYear()));
        Map<String, String> before = WorldFiles.of(Inventor.invent(SKERRY));
        Map<String, String> after = WorldFiles.of(Inventor.invent(withAssets(listings)));
        assertThat(after.get("skerry-stocks.csv")).isNotEqualTo(before.get("skerry-stocks.csv"));
        for (String same : List.of("skerry-bonds.csv", "skerry-gold.csv", "skerry-bills.csv", "skerry-truth.csv")) {
            assertThat(after.get(same)).isEqualTo(before.get(same));
        }
    }

    @Test
    void aClosedDayIsMissingFromTheFileAndItsMoveComesWithTheNextQuote() {
        Map<String, Listing> listings = new LinkedHashMap<>(SKERRY.assets());
        Listing gold = SKERRY.listing("gold");
        listings.put(
                "gold",
                new Listing(
                        gold.firstPrice(),
                        gold.decimals(),
                        Holidays.none(),
                        gold.trading(),
                        gold.couponPercentPerYear()));
        List<Quote> open = Inventor.invent(withAssets(listings)).prices().get(2).quotes();
        List<Quote> closed = Inventor.invent(SKERRY).prices().get(2).quotes();
        assertThat(closed.size()).isLessThan(open.size());
        assertThat(closed)
                .containsExactlyElementsOf(open.stream()
                        .filter(quote -> !gold.closed().include(quote.date()))
                        .toList());
    }

    @Test
    void theTotalReturnGrowsByPriceChangeAndCouponOnly() {
        List<Quote> bonds = Inventor.invent(SKERRY).prices().get(1).quotes();
        assertThat(bonds.get(0).totalReturn()).hasValue(100);
        double units = 100 / bonds.get(0).close();
        for (int i = 1; i < bonds.size(); i++) {
            // An investor buys more units at each close with the coupon of 3.4 percent on the last close.
            long days = ChronoUnit.DAYS.between(
                    bonds.get(i - 1).date(), bonds.get(i).date());
            double coupon = units * bonds.get(i - 1).close() * 0.034 * days / 365;
            units += coupon / bonds.get(i).close();
            assertThat(bonds.get(i).totalReturn().orElseThrow())
                    .isCloseTo(units * bonds.get(i).close(), within(0.5e-4 + 1e-9)); // half a unit of the last decimal
        }
    }

    @Test
    void pricesThatWouldFallBelowOneUnitStayThere() {
        Map<String, Listing> listings = new LinkedHashMap<>(SKERRY.assets());
        listings.put(
                "gold",
                new Listing(
                        0.01,
                        2,
                        Holidays.none(),
                        SKERRY.listing("gold").trading(),
                        SKERRY.listing("gold").couponPercentPerYear()));
        assertThat(Inventor.invent(withAssets(listings)).prices().get(2).quotes())
                .allSatisfy(quote -> assertThat(quote.close()).isGreaterThanOrEqualTo(0.01));
    }

    @Test
    void aWorldBuiltByHandWhosePartsDoNotFitIsRefused() {
        Map<String, Listing> listings = new LinkedHashMap<>(SKERRY.assets());
        listings.remove("gold");
        assertThatThrownBy(() -> Inventor.invent(withAssets(listings)))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("but the assets are stocks, bonds");
    }

    private static World withAssets(Map<String, Listing> assets) {
        return new World(
                SKERRY.name(),
                SKERRY.filePrefix(),
                SKERRY.seed(),
                SKERRY.firstDay(),
                SKERRY.years(),
                SKERRY.barsPerYear(),
                SKERRY.holidays(),
                assets,
                SKERRY.bills(),
                SKERRY.startsIn(),
                SKERRY.states());
    }
}
