/**
 * What did the market do? The sections {@code prices}, {@code calendar} and {@code cash} of a strategy file and the files they
 * name go in; a {@link sojourn.market.Market} comes out: a {@link sojourn.market.PriceTable} on one calendar with the returns of
 * cash, findings, and the digests of what was read. Only {@code TextFile} touches files; everything after it is pure, and
 * prices from elsewhere enter by {@link sojourn.market.Market#of}. Whoever decides sees the table only through
 * {@link sojourn.market.Known}, which ends at a close; only {@link sojourn.market.FillPrices} shows all of it, and only trading
 * may ask for that. Which assets are used, and what for, is left to the caller. Start with {@link sojourn.market.PriceReader}
 * and {@link sojourn.market.PriceTable}.
 */
@NullMarked
package sojourn.market;

import org.jspecify.annotations.NullMarked;
