package sojourn;

import java.util.List;
import java.util.Optional;
import sojourn.market.Known;
import sojourn.numeric.RandomStream;
import sojourn.regime.WindowMoments;
import sojourn.walk.Reading;
import sojourn.walk.Signal;

/** A signal whose probabilities are stated bar by bar; there is no reading before bar {@code from}. */
public final class GivenProbabilities implements Signal {
    private static final double[] SYMMETRIC = {0.9, 0.1, 0.1, 0.9};

    private final List<String> regimes;
    private final double[][] byBar;
    private final double[] transition;
    private final int from;
    private final Optional<WindowMoments> moments;

    private GivenProbabilities(
            List<String> regimes, double[][] byBar, double[] transition, int from, Optional<WindowMoments> moments) {
        this.regimes = regimes;
        this.byBar = byBar;
        this.transition = transition;
        this.from = from;
        this.moments = moments;
    }

    /** Two regimes, calm and stormy, from the probability of stormy. */
    public static GivenProbabilities stormy(double... probabilities) {
        double[][] byBar = new double[probabilities.length][];
        for (int bar = 0; bar < byBar.length; bar++) {
            byBar[bar] = new double[] {1 - probabilities[bar], probabilities[bar]};
        }
        return new GivenProbabilities(List.of("calm", "stormy"), byBar, SYMMETRIC, 0, Optional.empty());
    }

    /** Two regimes whose stormy probability wanders and often stands near 0 or 1. */
    public static GivenProbabilities random(long seed, int bars) {
        RandomStream random = RandomStream.of(seed, "probabilities");
        double[] stormy = new double[bars];
        double logit = 0;
        for (int bar = 0; bar < bars; bar++) {
            logit = 0.9 * logit + 1.5 * random.nextNormal();
            stormy[bar] = 1 / (1 + StrictMath.exp(-logit));
        }
        return stormy(stormy);
    }

    /** Any number of regimes, named r0, r1, …; transitions stay where they are. */
    public static GivenProbabilities of(double[][] byBar) {
        int states = byBar[0].length;
        double[] identity = new double[states * states];
        String[] names = new String[states];
        for (int k = 0; k < states; k++) {
            identity[k * states + k] = 1;
            names[k] = "r" + k;
        }
        return new GivenProbabilities(List.of(names), byBar, identity, 0, Optional.empty());
    }

    /** The same without readings before {@code bar}. */
    public GivenProbabilities startingAt(int bar) {
        return new GivenProbabilities(regimes, byBar, transition, bar, moments);
    }

    /** The same with other transition probabilities, row-major. */
    public GivenProbabilities moving(double... probabilities) {
        return new GivenProbabilities(regimes, byBar, probabilities, from, moments);
    }

    /** The same with regimes that mean something for returns; as given, they mean that nothing moves. */
    public GivenProbabilities meaning(WindowMoments returns) {
        return new GivenProbabilities(regimes, byBar, transition, from, Optional.of(returns));
    }

    @Override
    public List<String> regimes() {
        return regimes;
    }

    @Override
    public Optional<Reading> at(Known known) {
        if (known.bar() < from) {
            return Optional.empty();
        }
        Reading reading = reading(known, known.bar());
        return Optional.of(known.bar() > from ? reading.following(reading(known, known.bar() - 1)) : reading);
    }

    private Reading reading(Known known, int bar) {
        int states = regimes.size();
        int assets = known.assets().size();
        WindowMoments still = WindowMoments.of(
                states, assets, new double[states], new double[states * assets], new double[states * assets * assets]);
        return Reading.of(1, byBar[bar], transition, moments.orElse(still));
    }
}
