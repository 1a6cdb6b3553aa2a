package sojourn.evidence;

import java.util.Arrays;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import sojourn.inference.JarqueBera;
import sojourn.inference.KolmogorovSmirnov;
import sojourn.inference.LjungBox;
import sojourn.inference.TestResult;
import sojourn.numeric.NormalQuantile;
import sojourn.walk.Reading;

/**
 * How each observation lay in the distribution that was forecast for it the close before: u_t = sum_k p_{t|t-1}(k) F_k(x_t), z_t the
 * normal quantile of u_t, u kept within [1e-15, 1 - 1e-15]. If the forecasts were right, u is uniform, z standard normal, and neither has a
 * memory. Of several observations, the first. Out of sample: parameters and probabilities are those of the close before. Zucchini and MacDonald (2009), Hidden Markov Models for
 * Time Series, section 6.2; Rosenblatt (1952), Annals of Mathematical Statistics 23, 470-472. The tests' p-values are approximate, for the parameters were estimated.
 */
public final class PseudoResiduals {
    /** Lags of Ljung and Box's test: about a month of days. Common practice, no source. */
    public static final int LAGS = 20;

    private static final double LEAST = 1e-15;

    private final PerBar uniform;
    private final PerBar normal;
    private final int clipped;

    private PseudoResiduals(PerBar uniform, int clipped) {
        this.uniform = uniform;
        this.clipped = clipped;
        this.normal = PerBar.of(uniform.bars(), bar -> {
            OptionalDouble u = uniform.at(bar);
            return u.isPresent() ? OptionalDouble.of(NormalQuantile.of(u.getAsDouble())) : OptionalDouble.empty();
        });
    }

    /** Of all bars that were forecast; nothing for a gauge that forecasts no distribution of its observation. */
    static Answer<PseudoResiduals> of(WalkedRegimes subject) {
        Forecaster forecaster = new Forecaster(subject);
        int[] clipped = new int[1];
        PerBar uniform = PerBar.of(subject.table().size(), bar -> {
            OptionalDouble u = forecaster.below(bar);
            if (u.isEmpty()) {
                return u;
            }
            double kept = Math.min(1 - LEAST, Math.max(LEAST, u.getAsDouble()));
            clipped[0] += kept == u.getAsDouble() ? 0 : 1;
            return OptionalDouble.of(kept);
        });
        return forecaster.able()
                ? Answer.of(new PseudoResiduals(uniform, clipped[0]))
                : Answer.none("this gauge forecasts no distribution of what it observes");
    }

    /** u. */
    public PerBar uniform() {
        return uniform;
    }

    /** z. */
    public PerBar normal() {
        return normal;
    }

    /** How many u were brought within the bounds. */
    public int clipped() {
        return clipped;
    }

    /** How many there are. */
    public int count() {
        return uniform.present().length;
    }

    /** Whether z is normal. */
    public TestResult jarqueBera() {
        return JarqueBera.of(normal.at(normal.present()));
    }

    /** Whether z has no memory. */
    public TestResult ljungBox() {
        return LjungBox.of(normal.at(normal.present()), LAGS);
    }

    /** Whether the size of z has no memory: volatility that the model did not see coming. */
    public TestResult ljungBoxOfSquares() {
        double[] squares = normal.at(normal.present());
        for (int t = 0; t < squares.length; t++) {
            squares[t] *= squares[t];
        }
        return LjungBox.of(squares, LAGS);
    }

    /** Whether u is uniform. */
    public TestResult kolmogorovSmirnov() {
        return KolmogorovSmirnov.uniform(uniform.at(uniform.present()));
    }

    /** Once in how many bars something lies so far out on either side, if the forecasts are right: 1 / (2 min(u, 1 - u)). */
    public OptionalDouble onceIn(int bar) {
        OptionalDouble u = uniform.at(bar);
        return u.isPresent()
                ? OptionalDouble.of(0.5 / Math.min(u.getAsDouble(), 1 - u.getAsDouble()))
                : OptionalDouble.empty();
    }

    /** The bars that lay furthest out, the furthest first, then the earlier. */
    public List<Integer> surprising() {
        return Arrays.stream(uniform.present())
                .boxed()
                .sorted(Comparator.comparingDouble((Integer bar) -> -onceIn(bar).orElse(0))
                        .thenComparingInt(bar -> bar))
                .toList();
    }

    /** The distribution forecast at each close for the next bar. */
    private static final class Forecaster {
        private final WalkedRegimes subject;
        private final Map<Integer, Stretch> stretches = new HashMap<>();
        private final Map<Integer, DistributionFunction> byFit = new HashMap<>();

        Forecaster(WalkedRegimes subject) {
            this.subject = subject;
            for (Stretch stretch : subject.stretches()) {
                stretches.put(stretch.record().number(), stretch);
                stretch.record()
                        .fit()
                        .model()
                        .map(model -> DistributionFunction.of(model.emission()))
                        .ifPresent(function -> byFit.put(stretch.record().number(), function));
            }
        }

        boolean able() {
            return !byFit.isEmpty();
        }

        OptionalDouble below(int bar) {
            if (bar == 0 || !subject.known(bar - 1) || !subject.observed().has(bar)) {
                return OptionalDouble.empty();
            }
            Reading before = subject.timeline().reading(bar - 1).orElseThrow();
            Optional<DistributionFunction> function = Optional.ofNullable(byFit.get(before.fit()));
            if (function.isEmpty()) {
                return OptionalDouble.empty();
            }
            double x = subject.observed().at(bar).orElseThrow();
            double[] predicted = before.predicted(1);
            List<OptionalInt> states = CommonBars.required(stretches, before.fit())
                    .states(subject.timeline().regimes());
            double sum = 0;
            for (int k = 0; k < predicted.length; k++) {
                sum += states.get(k).isPresent()
                        ? predicted[k] * function.get().below(states.get(k).getAsInt(), x)
                        : 0;
            }
            return OptionalDouble.of(sum);
        }
    }
}
