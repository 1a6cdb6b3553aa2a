package sojourn.world;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.time.temporal.ChronoUnit;
import java.util.List;
import org.junit.jupiter.api.Test;

class BillPathTest {
    private static final double SIGMAS = 4;

    /** Half a unit of the last decimal published. */
    private static final double HALF_UNIT = 0.005 + 1e-12;

    @Test
    void withoutShocksHalfOfTheDistanceIsLostInAHalfLife() {
        List<BillRate> rates = draw(new Bills(1, 8, 2, 3, 0, 0), 12);
        BillRate afterOne = rates.get((int) Math.round(3 * 365.25));
        BillRate afterTwo = rates.get((int) Math.round(6 * 365.25));
        assertThat(rates.get(0).percentPerYear()).isEqualTo(8);
        assertThat(afterOne.percentPerYear()).isCloseTo(5, within(HALF_UNIT));
        assertThat(afterTwo.percentPerYear()).isCloseTo(3.5, within(HALF_UNIT));
    }

    @Test
    void shocksHaveTheStatedSizeAndNoMemory() {
        List<BillRate> rates = draw(new Bills(7, 20, 20, 5, 0.8, -5), 100);
        double step = 7 / 365.25;
        int n = rates.size() - 1;
        double squares = 0;
        double products = 0;
        double last = 0;
        for (int i = 0; i < n; i++) {
            // Within a week the pull is about 4 percent of a shock: 0.2 percent of its variance.
            double shock = rates.get(i + 1).percentPerYear() - rates.get(i).percentPerYear();
            squares += shock * shock;
            products += shock * last;
            last = shock;
        }
        assertThat(rates)
                .allSatisfy(rate -> assertThat(rate.percentPerYear()).isGreaterThan(-5)); // the floor never meddles
        double expected = 0.8 * 0.8 * step;
        assertThat(squares / n).isCloseTo(expected, within(SIGMAS * expected * Math.sqrt(2.0 / n)));
        assertThat(products / squares).isCloseTo(0, within(SIGMAS / Math.sqrt(n)));
    }

    @Test
    void theFloorHoldsWhatIsPublishedButNotThePathBeneath() {
        List<BillRate> floored = draw(new Bills(7, 1, 0, 2, 1, 0.25), 40);
        List<BillRate> free = draw(new Bills(7, 1, 0, 2, 1, -5), 40);
        assertThat(floored).anySatisfy(rate -> assertThat(rate.percentPerYear()).isEqualTo(0.25));
        for (int i = 0; i < free.size(); i++) {
            assertThat(floored.get(i).percentPerYear())
                    .isEqualTo(Math.max(0.25, free.get(i).percentPerYear()));
        }
    }

    @Test
    void ratesComeAtEvenStepsFromTheFirstDayToTheEnd() {
        World world = Worlds.skerry();
        List<BillRate> rates = BillPath.draw(world);
        assertThat(rates.get(0).date()).isEqualTo(world.firstDay());
        for (int i = 1; i < rates.size(); i++) {
            assertThat(ChronoUnit.DAYS.between(
                            rates.get(i - 1).date(), rates.get(i).date()))
                    .isEqualTo(7);
        }
        assertThat(ChronoUnit.DAYS.between(
                        rates.get(rates.size() - 1).date(), world.firstDay().plusYears(24)))
                .isBetween(1L, 7L);
    }

    private static List<BillRate> draw(Bills bills, int years) {
        return BillPath.draw(Worlds.with(Worlds.skerry().withYears(years), bills));
    }
}
