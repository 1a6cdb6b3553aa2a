package sojourn.evidence;

import sojourn.inference.DieboldMariano;
import sojourn.inference.GiacominiWhite;
import sojourn.inference.TestResult;

/**
 * Two forecasters on the same bars. Differences are such that above 0 the first is ahead.
 *
 * @param first one
 * @param second the other
 * @param plain Diebold and Mariano's test for one bar ahead, differences taken as uncorrelated
 * @param robust the same with a variance that allows for serial correlation: the one to read
 * @param conditional Giacomini and White's test
 * @param ground what the tests stand on
 */
public record Duel(
        String first,
        String second,
        DieboldMariano plain,
        DieboldMariano robust,
        TestResult conditional,
        Ground ground) {
    /** {@code ahead}: how much the first is ahead on each of {@code bars}. Neither is modified. */
    static Duel of(String first, String second, double[] ahead, int[] bars, Ground ground) {
        return new Duel(
                first,
                second,
                DieboldMariano.of(ahead, 1),
                DieboldMariano.robust(ahead, 1),
                GiacominiWhite.of(ahead, bars),
                ground);
    }
}
