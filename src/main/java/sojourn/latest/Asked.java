package sojourn.latest;

import sojourn.allocate.Decision;
import sojourn.allocate.Situation;
import sojourn.allocate.Stance;

/**
 * What a policy was asked at one close, and what it answered.
 *
 * @param situation all that it saw
 * @param stance as it was before
 * @param decision the answer, with the stance after it
 */
public record Asked(Situation situation, Stance stance, Decision decision) {}
