/**
 * What to hold? A {@link sojourn.allocate.Situation} (what was known at a close, the reading of the regimes, the weights held)
 * and a {@link sojourn.allocate.Stance} (what the rule remembers) go in; a {@link sojourn.allocate.Decision} comes out: target
 * weights or none, the next stance, and the reason in words. Rules are pure and read from the strategy file by their own shapes;
 * filling orders and paying for them is left to trading. Start with {@link sojourn.allocate.RulePolicy}.
 */
@NullMarked
package sojourn.allocate;

import org.jspecify.annotations.NullMarked;
