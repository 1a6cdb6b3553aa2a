package sojourn.trade;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import sojourn.GivenPrices;
import sojourn.GivenProbabilities;
import sojourn.allocate.Weights;

class BasketTest {
    private static final Costs COSTS =
            new Costs(5, 5).withFees(2, 1).withStampDuty(20).withImpact(new Impact(1, 5, 5, Optional.empty()));

    /** An order that fills on a bar whose prices are those of its decision is the basket itself. */
    @Test
    void aBasketIsWhatTheSimulationWouldTradeIfPricesStoodStill() {
        GivenPrices prices = GivenPrices.random(4, 30, 2).withRandomVolumes(4, 1e6);
        double[][] still = new double[2][];
        double[][] volumes = new double[2][];
        for (int asset = 0; asset < 2; asset++) {
            still[asset] = new double[30];
            volumes[asset] = new double[30];
            for (int bar = 0; bar < 30; bar++) {
                still[asset][bar] = prices.close(asset, Math.min(bar, 20));
                volumes[asset][bar] = 1e5;
            }
        }
        GivenPrices flat = GivenPrices.closes(still).withVolumes(volumes);
        Terms terms = new Terms(new NextClose(0), COSTS, 1e6, SizeAt.FILL, new Lots(10, Map.of()));
        Track track = Simulation.run(
                        flat.table(),
                        GivenProbabilities.stormy(new double[30]),
                        Policies.at(Map.of(10, Weights.of(0.5, 0.2), 20, Weights.of(0.1, 0.7))),
                        terms,
                        0)
                .orElseThrow();
        Quantities held = Quantities.of(track.units(20, 0), track.units(20, 1));
        Basket basket = Basket.at(flat.table(), 20, held, track.cash(20), Weights.of(0.1, 0.7), terms)
                .orElseThrow();
        assertThat(basket.legs()).hasSize(2);
        for (int leg = 0; leg < 2; leg++) {
            Fill filled = track.fills().get(2 + leg);
            assertThat(basket.legs().get(leg).units()).isEqualTo(filled.units());
            assertThat(basket.legs().get(leg).charges()).isEqualTo(filled.charges());
        }
        assertThat(basket.cash()).isCloseTo(track.cash(21), within(1e-9));
        assertThat(basket.cost()).isCloseTo(track.cost(21), within(1e-9));
        assertThat(basket.wanted()).isEqualTo(Quantities.of(track.units(21, 0), track.units(21, 1)));
    }

    @Test
    void whatIsInTheWayIsSaidAndRuinIsEmpty() {
        GivenPrices prices = GivenPrices.flat(8, 1).withVolumes(new double[8]);
        Terms terms = new Terms(new NextClose(0), COSTS, 1_000);
        Basket blocked = Basket.at(prices.table(), 7, Quantities.of(0), 1_000, Weights.of(1), terms)
                .orElseThrow();
        assertThat(blocked.legs()).isEmpty();
        assertThat(blocked.hindrances()).extracting(Hindrance::kind).containsExactly(Hindrance.Kind.NO_VOLUME);
        Terms dear = new Terms(new NextClose(0), Costs.none().withFees(0, 2_000), 1_000);
        assertThat(Basket.at(prices.table(), 7, Quantities.of(0), 1_000, Weights.of(1), dear))
                .isEmpty();
    }
}
