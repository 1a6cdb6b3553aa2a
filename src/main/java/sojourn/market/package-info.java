/**
 * What did the market do? Price files go in; a {@link sojourn.market.PriceTable} on one calendar, cash returns and findings
 * come out. Whoever decides sees the table only through {@link sojourn.market.Known}, which ends at a close; only
 * {@link sojourn.market.FillPrices} shows all of it, and only trading may ask for that. Start with
 * {@link sojourn.market.PriceTable}.
 */
@NullMarked
package sojourn.market;

import org.jspecify.annotations.NullMarked;
