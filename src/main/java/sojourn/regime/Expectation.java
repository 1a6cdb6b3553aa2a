package sojourn.regime;

import java.util.List;
import java.util.function.Supplier;

/** The expectation step of EM over one window. Has working arrays of its own: one object belongs to one start. */
interface Expectation {
    /**
     * Fills {@code sums} for those parameters, log-likelihood included (of the standardised observations). Returns false, with
     * {@code sums} of no use, when double precision does not reach: then {@link PlainExpectation} does it.
     */
    boolean fill(Parameters parameters, ExpectedSums sums);

    /** The fastest one for that kind of model with normal emissions. */
    static Expectation of(ModelKind kind, int states, Window window) {
        return of(kind, states, window, EmissionFamily.NORMAL);
    }

    /** The fastest one for that kind of model and emissions. */
    static Expectation of(ModelKind kind, int states, Window window, EmissionFamily family) {
        if (family.fatTailed()) {
            return new StudentExpectation(states, window);
        }
        if (kind != ModelKind.HIDDEN_MARKOV) {
            return new IndependentExpectation(states, window);
        }
        Supplier<Expectation> any = () -> new ManyStateExpectation(states, window);
        return switch (states) {
            case 2 ->
                window.size() < TwoStateExpectation.LEAST_ROWS
                        ? any.get()
                        : new InTurn(List.of(() -> new TwoStateExpectation(window), any));
            case 3 -> new InTurn(List.of(() -> new ThreeStateExpectation(window), any));
            case 4 -> new InTurn(List.of(() -> new FourStateExpectation(window), any));
            default -> any.get();
        };
    }
}
