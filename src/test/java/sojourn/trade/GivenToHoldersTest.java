package sojourn.trade;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.Map;
import org.junit.jupiter.api.Test;
import sojourn.GivenPrices;
import sojourn.GivenProbabilities;
import sojourn.allocate.Policy;
import sojourn.allocate.Weights;
import sojourn.market.Known;
import sojourn.market.PriceTable;

/** Dividends and splits of prices that are not adjusted for them. */
class GivenToHoldersTest {
    private static final int BARS = 60;
    private static final double CAPITAL = 1_000_000;
    private static final double ROUNDING = 1e-10;

    /** Closes as quoted when the true closes were these and units multiplied on the way. */
    private static double[] quoted(double[] adjusted, double[] ratios) {
        double[] quoted = new double[adjusted.length];
        double units = 1;
        for (int bar = 0; bar < quoted.length; bar++) {
            units *= ratios[bar];
            quoted[bar] = adjusted[bar] / units;
        }
        return quoted;
    }

    private static double[] splits() {
        double[] ratios = new double[BARS];
        Arrays.fill(ratios, 1);
        ratios[10] = 2;
        ratios[25] = 0.2;
        ratios[40] = 1.5;
        return ratios;
    }

    private static double[] walk(long seed) {
        GivenPrices random = GivenPrices.random(seed, BARS, 1);
        double[] closes = new double[BARS];
        Arrays.setAll(closes, bar -> random.close(0, bar));
        return closes;
    }

    @Test
    void unadjustedPricesWithSplitsComeToTheSameAsAdjustedOnes() {
        double[] adjusted = walk(1);
        GivenPrices plain = GivenPrices.closes(adjusted);
        GivenPrices unadjusted = GivenPrices.closes(quoted(adjusted, splits()))
                .giving(new double[][] {new double[BARS]}, new double[][] {splits()});
        for (SizeAt size : SizeAt.values()) {
            for (int delay : new int[] {0, 4}) {
                Policy policy = Policies.random(9, BARS, 1, 1);
                Terms terms = new Terms(
                        new NextClose(delay), new Costs(5, 5).withFinancing(1, 1), CAPITAL, size, Lots.FRACTIONS);
                double[] one = run(plain, policy, terms).wealth(2, BARS - 1);
                double[] other = run(unadjusted, policy, terms).wealth(2, BARS - 1);
                for (int bar = 0; bar < one.length; bar++) {
                    assertThat(other[bar] / one[bar] - 1)
                            .as("%s, delay %d, bar %d", size, delay, bar + 2)
                            .isCloseTo(0, within(ROUNDING));
                }
            }
        }
    }

    @Test
    void dividendsReinvestedComeToTheTotalReturnSeries() {
        double[] closes = walk(2);
        double[] money = new double[BARS];
        double[] total = closes.clone();
        for (int bar = 1; bar < BARS; bar++) {
            money[bar] = bar % 7 == 0 ? 0.8 : 0;
            total[bar] = total[bar - 1] * (closes[bar] + money[bar]) / closes[bar - 1];
        }
        double[] none = new double[BARS];
        Arrays.fill(none, 1);
        GivenPrices paying = GivenPrices.closes(closes).giving(new double[][] {money}, new double[][] {none});
        Terms free = new Terms(new NextClose(0), Costs.none(), CAPITAL);
        Track held = run(paying, Policies.always(1), free);
        for (int bar = 1; bar < BARS; bar++) {
            assertThat(held.wealth(bar) / CAPITAL).as("bar %d", bar).isCloseTo(total[bar] / total[1], within(ROUNDING));
        }
        assertThat(held.dividend(7)).isCloseTo(held.units(6, 0) * 0.8, within(1e-9));
    }

    /** What is observed is what a holder earned; the bar before a split or an ex-date knows nothing of it. */
    @Test
    void observedReturnsHoldTheSplitAndDividendOfTheirBarAlone() {
        double[] closes = walk(3);
        double[] money = new double[BARS];
        money[20] = 2;
        money[25] = 1;
        PriceTable table = GivenPrices.closes(closes)
                .withRandomVolumes(3, 1_000)
                .giving(new double[][] {money}, new double[][] {splits()})
                .table();
        Known all = table.knownAt(BARS - 1);
        for (int bar = 1; bar < BARS; bar++) {
            double earned = splits()[bar] * (closes[bar] + money[bar]) / closes[bar - 1];
            assertThat(all.close(0, bar) / all.close(0, bar - 1)).isCloseTo(earned, within(1e-12));
            assertThat(all.close(0, bar) * all.volume(0, bar).orElseThrow())
                    .as("money that changed hands")
                    .isCloseTo(closes[bar] * volume(closes, bar), within(1e-6));
        }
    }

    private static double volume(double[] closes, int bar) {
        return GivenPrices.closes(closes)
                .withRandomVolumes(3, 1_000)
                .table()
                .knownAt(bar)
                .volume(0, bar)
                .orElseThrow();
    }

    @Test
    void shortsPayDividends() {
        double[] money = {0, 0, 3, 0};
        double[] none = {1, 1, 1, 1};
        GivenPrices prices = GivenPrices.flat(4, 1).giving(new double[][] {money}, new double[][] {none});
        Track track =
                run(prices, Policies.at(Map.of(0, Weights.of(-0.5))), new Terms(new NextClose(0), Costs.none(), 1_000));
        assertThat(track.dividend(2)).isEqualTo(-15);
        assertThat(track.wealth(2)).isEqualTo(985);
    }

    @Test
    void whoBuysOnTheExDateGetsNoDividend() {
        double[] money = {0, 3, 0};
        double[] none = {1, 1, 1};
        GivenPrices prices = GivenPrices.flat(3, 1).giving(new double[][] {money}, new double[][] {none});
        Track track =
                run(prices, Policies.at(Map.of(0, Weights.of(1))), new Terms(new NextOpen(0), Costs.none(), 1_000));
        assertThat(track.fills()).extracting(Fill::filledOn).containsExactly(1);
        assertThat(track.wealth(2)).isEqualTo(1_000);
    }

    private static Track run(GivenPrices prices, Policy policy, Terms terms) {
        return Simulation.run(prices.table(), GivenProbabilities.stormy(new double[prices.size()]), policy, terms, 0)
                .orElseThrow();
    }
}
