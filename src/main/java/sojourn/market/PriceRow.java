package sojourn.market;

import java.time.LocalDate;

/**
 * One row of a price file; NaN where the file has no such column or no value in it. The close is always there.
 *
 * @param dividend 0 where there is none
 * @param split 1 where there is none
 */
record PriceRow(
        LocalDate date,
        int line,
        double close,
        double open,
        double high,
        double low,
        double volume,
        double dividend,
        double split) {}
