package sojourn.world;

import java.util.Optional;
import sojourn.document.Field;
import sojourn.document.Refusal;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.numeric.Check;
import sojourn.numeric.RandomStream;

/**
 * How many bars a state lasts once entered: the shortest stay plus a negative binomial count. With shape r and mean excess
 * m, P(stay = shortest + k) = Γ(k + r) / (k! Γ(r)) · q^r · (1 - q)^k, where q = r / (r + m). With shortest 1 and r = 1 this
 * is the geometric stay of a Markov chain; with larger r very short and very long stays are rarer than there. Source of the
 * distribution: Johnson, Kemp and Kotz (2005), Univariate Discrete Distributions, chapter 5.
 *
 * @param shortestBars the shortest possible stay, at least 1
 * @param meanBars the mean stay, at least the shortest
 * @param shape r above, above 0
 */
public record Stay(int shortestBars, double meanBars, double shape) {
    private static final double LONGEST_MEAN = 10_000;
    private static final double LARGEST_SHAPE = 50;

    /** Below this, and past the mean, further terms no longer change the sum of probabilities. */
    private static final double NEGLIGIBLE = 1e-20;

    private static final Field<Integer> SHORTEST_BARS = Field.required(
            "shortest-bars", Shapes.integer().atLeast(1).atMost(1000), "the shortest possible stay, in bars");
    private static final Field<Double> MEAN_BARS =
            Field.required("mean-bars", Shapes.number().atLeast(1).atMost(LONGEST_MEAN), "the mean stay, in bars");
    private static final Field<Double> SHAPE_OF_EXCESS = Field.required(
            "negative-binomial-shape",
            Shapes.number().atLeast(0.1).atMost(LARGEST_SHAPE),
            "shape of the bars beyond the shortest: 1 is geometric, larger is more regular");

    /** Reads {@code {shortest-bars: 10, mean-bars: 60, negative-binomial-shape: 2}}. */
    public static final Shape<Stay> SHAPE = Shapes.object(
                    "stay",
                    f -> new Stay(f.get(SHORTEST_BARS), f.get(MEAN_BARS), f.get(SHAPE_OF_EXCESS)),
                    SHORTEST_BARS,
                    MEAN_BARS,
                    SHAPE_OF_EXCESS)
            .refuse(Stay::fault);

    /** Checks each number's own bounds; see {@link #fault} for the two together. */
    public Stay {
        Check.within(shortestBars, 1, 1000, "shortestBars");
        Check.within(meanBars, 1, LONGEST_MEAN, "meanBars");
        Check.within(shape, 0.1, LARGEST_SHAPE, "shape");
    }

    /** The probability of a stay of exactly {@code bars} bars; 0 below the shortest. Cost: linear in {@code bars}. */
    public double probability(int bars) {
        if (bars < shortestBars) {
            return 0;
        }
        double p = StrictMath.pow(success(), shape);
        for (int k = 0; k < bars - shortestBars; k++) {
            p = next(p, k);
        }
        return p;
    }

    /** Draws a stay by the inverse distribution function: one uniform a stay. */
    int draw(RandomStream random) {
        double u = random.nextDouble();
        double p = StrictMath.pow(success(), shape);
        double below = p;
        int k = 0;
        while (u >= below && !(p < NEGLIGIBLE && k > meanBars)) {
            p = next(p, k);
            below += p;
            k++;
        }
        return shortestBars + k;
    }

    /** Refuses a mean that no stay of at least the shortest can have. */
    Optional<Refusal> fault() {
        return meanBars >= shortestBars
                ? Optional.empty()
                : Optional.of(new Refusal(
                        "mean-bars",
                        "a mean stay of " + meanBars + " bars lies below the shortest stay of " + shortestBars,
                        "give a mean at or above shortest-bars"));
    }

    private double success() {
        return shape / (shape + (meanBars - shortestBars));
    }

    private double next(double p, int k) {
        return p * ((k + shape) / (k + 1)) * (1 - success());
    }
}
