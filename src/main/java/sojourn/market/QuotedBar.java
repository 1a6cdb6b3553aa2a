package sojourn.market;

import java.util.Optional;
import java.util.OptionalDouble;
import sojourn.market.PriceTable.Bars;
import sojourn.market.PriceTable.Column;

/**
 * One bar of an asset as its file quotes it, for showing and keeping: dividends and splits stand beside the prices and are not put
 * back into them.
 *
 * @param open empty where the file has none, as are high, low and volume
 * @param dividend money a unit held at the close before is paid, after the split; empty where the file has no such column
 * @param split units that one unit held at the close before becomes; empty where the file has no such column
 */
public record QuotedBar(
        double close,
        OptionalDouble open,
        OptionalDouble high,
        OptionalDouble low,
        OptionalDouble volume,
        OptionalDouble dividend,
        OptionalDouble split) {
    /** Bar {@code bar} of the asset of that index. */
    public static QuotedBar of(PriceTable table, int asset, int bar) {
        Bars quoted = table.quoted(asset);
        return new QuotedBar(
                quoted.close().at(bar),
                cell(quoted.open(), bar),
                cell(quoted.high(), bar),
                cell(quoted.low(), bar),
                cell(quoted.volume(), bar),
                cell(quoted.dividend(), bar),
                cell(quoted.split(), bar));
    }

    private static OptionalDouble cell(Optional<Column> column, int bar) {
        return column.map(values -> values.at(bar))
                .filter(value -> !value.isNaN())
                .map(OptionalDouble::of)
                .orElseGet(OptionalDouble::empty);
    }

    /**
     * What a holder earned from the close before to this one: split × (close + dividend) / close before − 1, simple.
     *
     * @param closeBefore as quoted
     */
    public double simpleReturn(double closeBefore) {
        return split.orElse(1) * (close + dividend.orElse(0)) / closeBefore - 1;
    }
}
