/**
 * Whether to believe it. A strategy and its regimes as they were known go in; what they are, how steady they are through refits, how well they
 * forecast and what they hang on come out as small values, or as the reason why there is none. Only here may hindsight be had, and it is
 * named where it is. Files and wording are left to {@code archive} and {@code report}. Start with {@link sojourn.evidence.RegimeEvidence}.
 */
@NullMarked
package sojourn.evidence;

import org.jspecify.annotations.NullMarked;
