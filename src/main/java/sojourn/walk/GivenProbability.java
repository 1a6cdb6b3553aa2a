package sojourn.walk;

import java.util.OptionalDouble;
import sojourn.market.Known;

/**
 * A regime's probability that was computed elsewhere, as it counted at the close: that of the row which had become known last.
 * Strategy files do not name it among observations; it stands for a column of {@code given}.
 *
 * @param state the regime's index
 * @param regime the regime's name
 * @param asset whose returns tell the volatility of the regimes
 */
record GivenProbability(int state, String regime, String asset) implements Observation {
    @Override
    public OptionalDouble at(Known known) {
        return known.given(state, known.bar());
    }

    @Override
    public String word() {
        return "given";
    }

    @Override
    public String column() {
        return "given_" + regime;
    }

    @Override
    public boolean aroundZero() {
        return false;
    }

    @Override
    public boolean fromPrices() {
        return false;
    }

    @Override
    public String inWords() {
        return "given probability of " + regime;
    }
}
