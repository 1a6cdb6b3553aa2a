package sojourn.trade;

import sojourn.allocate.Because;

/**
 * A close at which a decision was due and the policy found no weights: nothing was ordered.
 *
 * @param bar the close
 * @param because why there were none
 */
public record Undecided(int bar, Because because) {}
