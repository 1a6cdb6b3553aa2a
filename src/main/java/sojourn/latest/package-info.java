/**
 * What would it do now? A strategy with its market goes in; what it decided at one close comes out: regime, forecast, target and
 * orders, the returns of the next bar that would change its mind, a seal of it all, and the account of one bar that can be redone on
 * paper. It decides nothing itself: it asks the simulation that comparisons run. Start with {@link sojourn.latest.Latest}, {@link
 * sojourn.latest.Trace} and {@link sojourn.latest.Seal}.
 */
@NullMarked
package sojourn.latest;

import org.jspecify.annotations.NullMarked;
