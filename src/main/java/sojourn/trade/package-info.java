/**
 * What does it cost? Prices, a policy and terms of trade go in; a {@link sojourn.trade.Track} comes out: wealth, holdings, fills and
 * every movement of cash, bar by bar. One simulation serves strategies and yardsticks alike. Deciding is left to the policy, judging
 * the track to measures. Start with {@link sojourn.trade.Simulation}.
 */
@NullMarked
package sojourn.trade;

import org.jspecify.annotations.NullMarked;
