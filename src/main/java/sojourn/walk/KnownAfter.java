package sojourn.walk;

import java.util.List;
import java.util.OptionalDouble;
import sojourn.market.Known;
import sojourn.numeric.Check;

/**
 * An observation that becomes known some bars late: a close sees the number of so many bars before, computed from nothing dated
 * later. For series that are published after their date (rates, spreads) or close after the market that is traded. None on the
 * first bars. An asset of which every observation is late is late itself: see {@link ObservationLog}.
 *
 * @param observation the number, had it been known at once
 * @param bars at least 1
 */
public record KnownAfter(Observation observation, int bars) implements Observation {
    /** Refuses fewer than 1 bar. */
    public KnownAfter {
        Check.within(bars, 1, Integer.MAX_VALUE, "bars");
    }

    @Override
    public OptionalDouble at(Known known) {
        int then = known.bar() - bars;
        return then < 1 ? OptionalDouble.empty() : observation.at(known.at(then));
    }

    @Override
    public String asset() {
        return observation.asset();
    }

    @Override
    public String word() {
        return observation.word();
    }

    @Override
    public String column() {
        return observation.column() + "_known_after_" + bars;
    }

    @Override
    public List<BarColumn> reads() {
        return observation.reads();
    }

    @Override
    public boolean aroundZero() {
        return observation.aroundZero();
    }

    @Override
    public boolean fromPrices() {
        return observation.fromPrices();
    }

    @Override
    public boolean takesReturns() {
        return observation.takesReturns();
    }

    @Override
    public int barsLate() {
        return bars + observation.barsLate();
    }

    @Override
    public String inWords() {
        return observation.inWords() + ", known " + bars + (bars == 1 ? " bar" : " bars") + " late";
    }
}
