package sojourn.walk;

import java.util.List;
import java.util.Optional;
import sojourn.market.Known;

/** What regime the market was thought to be in, close by close. */
public interface Signal {
    /** The names of the regimes, from lowest to highest volatility. */
    List<String> regimes();

    /** The reading at the close that {@code known} ends with; empty while there is none. */
    Optional<Reading> at(Known known);
}
