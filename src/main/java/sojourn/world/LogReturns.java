package sojourn.world;

import java.util.ArrayList;
import java.util.List;
import sojourn.numeric.RandomStream;

/**
 * The log returns behind the prices. On a bar in state s, with n degrees of freedom, r = m_s + sqrt((n - 2) / W) D_s L_s z,
 * where z are independent standard normals, one an asset, L_s L_s' is the correlation matrix, D_s the standard deviations
 * and W a chi-square of n degrees that all assets share: a multivariate Student-t with exactly the stated means, standard
 * deviations and correlations. Source: Kotz and Nadarajah (2004), Multivariate t Distributions and Their Applications,
 * section 1.1.
 */
final class LogReturns {
    private final int assets;
    private final double[] returns;
    private final double[] volatilities;

    private LogReturns(int assets, double[] returns, double[] volatilities) {
        this.assets = assets;
        this.returns = returns;
        this.volatilities = volatilities;
    }

    /** Draws them for every bar of {@code truth}; each asset has a random stream of its own. */
    static LogReturns draw(World world, WorldTruth truth) {
        List<String> names = world.assetNames();
        List<RandomStream> shocks = new ArrayList<>();
        for (String name : names) {
            shocks.add(RandomStream.of(world.seed(), "world-shocks", name));
        }
        RandomStream tails = RandomStream.of(world.seed(), "world-tails");
        List<Law> laws = new ArrayList<>();
        for (String state : truth.states()) {
            laws.add(Law.of(world, world.state(state)));
        }
        int n = names.size();
        double[] returns = new double[truth.size() * n];
        double[] volatilities = new double[truth.size() * n];
        double[] z = new double[n];
        for (int bar = 0; bar < truth.size(); bar++) {
            Law law = laws.get(truth.stateIndex(bar));
            double wildness = wildness(tails, law.degreesOfFreedom);
            for (int a = 0; a < n; a++) {
                z[a] = shocks.get(a).nextNormal();
                double shock = 0;
                for (int b = 0; b <= a; b++) {
                    shock += law.factor[a * n + b] * z[b];
                }
                volatilities[bar * n + a] = wildness * law.volatility[a];
                returns[bar * n + a] = law.mean[a] + volatilities[bar * n + a] * shock;
            }
        }
        return new LogReturns(n, returns, volatilities);
    }

    /** The log return of an asset over a bar, counted in the order of the world's assets. */
    double at(int bar, int asset) {
        return returns[bar * assets + asset];
    }

    /** The standard deviation that the return was drawn with, once it was settled how wild the bar is. */
    double volatility(int bar, int asset) {
        return volatilities[bar * assets + asset];
    }

    /** sqrt((n - 2) / W), the chi-square W being a sum of n squared normals. */
    private static double wildness(RandomStream random, int degreesOfFreedom) {
        double chiSquare = 0;
        for (int i = 0; i < degreesOfFreedom; i++) {
            double normal = random.nextNormal();
            chiSquare += normal * normal;
        }
        return Math.sqrt((degreesOfFreedom - 2) / chiSquare);
    }

    /** One state's numbers, unpacked once. */
    private static final class Law {
        private final int degreesOfFreedom;
        private final double[] mean;
        private final double[] volatility;
        private final double[] factor;

        private Law(int degreesOfFreedom, double[] mean, double[] volatility, double[] factor) {
            this.degreesOfFreedom = degreesOfFreedom;
            this.mean = mean;
            this.volatility = volatility;
            this.factor = factor;
        }

        private static Law of(World world, HiddenState state) {
            List<String> names = world.assetNames();
            double[] mean = new double[names.size()];
            double[] volatility = new double[names.size()];
            for (int a = 0; a < mean.length; a++) {
                Move move = state.move(names.get(a));
                mean[a] = move.meanPerBar(world.barsPerYear());
                volatility[a] = move.volatilityPerBar(world.barsPerYear());
            }
            return new Law(
                    state.degreesOfFreedom(),
                    mean,
                    volatility,
                    state.correlations().factor(names));
        }
    }
}
