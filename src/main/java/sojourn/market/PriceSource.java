package sojourn.market;

import java.util.Map;
import java.util.Optional;
import sojourn.document.Field;
import sojourn.document.Shape;
import sojourn.document.Shapes;

/**
 * One entry of the section {@code prices}: the file and the columns that hold an asset's prices. A column that is not stated
 * is used if the file has one of its default name ({@code open}, {@code high}, {@code low}, {@code volume}).
 *
 * @param layout where the file lies and how it is written
 * @param close name of the column of closes
 * @param open name of the column of opens, if stated
 * @param high name of the column of highs, if stated
 * @param low name of the column of lows, if stated
 * @param volume name of the column of volumes, if stated
 * @param dividend name of the column of dividends of unadjusted prices, if there is one
 * @param split name of the column of splits of unadjusted prices, if there is one
 */
public record PriceSource(
        CsvLayout layout,
        String close,
        Optional<String> open,
        Optional<String> high,
        Optional<String> low,
        Optional<String> volume,
        Optional<String> dividend,
        Optional<String> split) {
    private static final String CLOSE_COLUMN = "close";

    private static final Field<String> CSV =
            Field.required("csv", Shapes.text(), "path of the price file, from the folder of the strategy file");
    private static final Field<String> CLOSE =
            Field.defaulted("close", Shapes.text(), CLOSE_COLUMN, "name of the column of closes");
    private static final Field<Optional<String>> OPEN = column("open", "opens");
    private static final Field<Optional<String>> HIGH = column("high", "highs");
    private static final Field<Optional<String>> LOW = column("low", "lows");
    private static final Field<Optional<String>> VOLUME = column("volume", "volumes");
    private static final Field<Optional<String>> DIVIDEND = Field.maybe(
            "dividend",
            Shapes.text(),
            "name of the column of dividends, money a unit on the ex-date, of prices that are not adjusted for them; read only if"
                    + " named");
    private static final Field<Optional<String>> SPLIT = Field.maybe(
            "split",
            Shapes.text(),
            "name of the column of splits, new units for one old unit on the ex-date, of prices that are not adjusted for them; read"
                    + " only if named");

    /** One asset's entry. */
    public static final Shape<PriceSource> SHAPE = Shapes.object(
            "price file",
            f -> new PriceSource(
                    CsvLayout.from(f.get(CSV), f),
                    f.get(CLOSE),
                    f.get(OPEN),
                    f.get(HIGH),
                    f.get(LOW),
                    f.get(VOLUME),
                    f.get(DIVIDEND),
                    f.get(SPLIT)),
            CSV,
            CsvLayout.DATE,
            CLOSE,
            OPEN,
            HIGH,
            LOW,
            VOLUME,
            DIVIDEND,
            SPLIT,
            CsvLayout.DATE_FORMAT,
            CsvLayout.SEPARATOR);

    /** The section {@code prices}: assets by name, in the order written. */
    public static final Shape<Map<String, PriceSource>> SECTION = Shapes.named(AssetName.SHAPE, SHAPE);

    private static Field<Optional<String>> column(String key, String what) {
        return Field.maybe(
                key, Shapes.text(), "name of the column of " + what + "; if not given, " + key + " if the file has it");
    }

    /** Columns of prices that need no dividends and splits beside them. */
    public PriceSource(
            CsvLayout layout,
            String close,
            Optional<String> open,
            Optional<String> high,
            Optional<String> low,
            Optional<String> volume) {
        this(layout, close, open, high, low, volume, Optional.empty(), Optional.empty());
    }

    /** Whether closes are said to be in a column of another name while opens are taken from wherever they usually stand. */
    public boolean onlyCloseNamed() {
        return !close.equals(CLOSE_COLUMN) && open.isEmpty();
    }

    /** Default columns of the file at {@code csv}. */
    public static PriceSource of(String csv) {
        return new PriceSource(
                CsvLayout.of(csv),
                CLOSE_COLUMN,
                Optional.empty(),
                Optional.empty(),
                Optional.empty(),
                Optional.empty());
    }

    /** The same columns of another file. */
    public PriceSource withCsv(String csv) {
        CsvLayout other = new CsvLayout(csv, layout.date(), layout.dateFormat(), layout.separator());
        return new PriceSource(other, close, open, high, low, volume, dividend, split);
    }

    /** The same file with its closes in another column. */
    public PriceSource withClose(String column) {
        return new PriceSource(layout, column, open, high, low, volume, dividend, split);
    }
}
