package sojourn.regime;

import java.util.ArrayList;
import java.util.List;
import java.util.function.Supplier;

/** Expectation steps from the fastest to the one that reaches farthest: each does what the ones before it gave up. */
final class InTurn implements Expectation {
    private final List<Supplier<Expectation>> kinds;
    private final List<Expectation> made = new ArrayList<>();

    /** Each is made when it is first needed. */
    InTurn(List<Supplier<Expectation>> kinds) {
        this.kinds = List.copyOf(kinds);
    }

    @Override
    public boolean fill(Parameters parameters, ExpectedSums sums) {
        for (int i = 0; i < kinds.size(); i++) {
            if (i == made.size()) {
                made.add(kinds.get(i).get());
            }
            if (made.get(i).fill(parameters, sums)) {
                return true;
            }
        }
        return false;
    }
}
