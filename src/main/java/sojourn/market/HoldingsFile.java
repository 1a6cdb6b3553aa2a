package sojourn.market;

import java.nio.file.Path;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import sojourn.document.InputException;
import sojourn.document.Nearest;
import sojourn.document.Problem;
import sojourn.document.Problems;
import sojourn.document.Quoted;
import sojourn.market.CsvTable.Row;

/** Reads what somebody holds from a table with the columns {@code asset} and {@code units}; the row {@code cash} is money. */
public final class HoldingsFile {
    private final Faults faults;
    private final List<String> assets;
    private final int asset;
    private final int units;
    private final Map<String, Double> read = new LinkedHashMap<>();

    private HoldingsFile(CsvTable table, List<String> assets, Faults faults) {
        this.faults = faults;
        this.assets = assets;
        CsvColumns named = new CsvColumns(table, faults);
        this.asset = named.required("asset", "asset", "asset");
        this.units = named.required("units", "units", "units");
    }

    /**
     * Units by asset, and cash; what has no row is 0. Every fault of the file is told at once.
     *
     * @param file the file as the user named it
     * @param assets the names there may be besides cash
     */
    public static Map<String, Double> read(Path file, List<String> assets) {
        Faults faults = new Faults("holdings");
        Optional<TextFile> text = TextFile.readFromHere(file, faults);
        if (text.isPresent() && text.get().text().isBlank()) {
            faults.add(new Problem(
                    file.toString(),
                    0,
                    0,
                    "the file is empty",
                    "give a header line 'asset,units' and a row for each asset that is held, and for cash"));
            text = Optional.empty();
        }
        Optional<CsvTable> table =
                text.flatMap(found -> CsvTable.of(found.file(), found.text(), Optional.empty(), faults));
        Map<String, Double> holdings = new LinkedHashMap<>();
        table.ifPresent(found -> {
            HoldingsFile one = new HoldingsFile(found, assets, faults);
            if (faults.none()) {
                found.forEachRow(faults, one::take);
            }
            holdings.putAll(one.read);
        });
        Problems problems = new Problems();
        faults.addTo(problems);
        if (!problems.isEmpty()) {
            throw new InputException(problems.list());
        }
        return Collections.unmodifiableMap(holdings);
    }

    private static String remedy(String text) {
        return Decimal.meant(text) == Decimal.Meant.UNKNOWN
                ? "write a number such as 12.5, or 0 where nothing is held"
                : Decimal.remedy(text);
    }

    private void take(Row row) {
        String name = row.cell(asset);
        String text = row.cell(units);
        OptionalDouble number = Decimal.parse(text);
        if (!name.equals(AssetName.CASH) && !assets.contains(name)) {
            faults.add(row.problem(
                    asset,
                    "the strategy uses no asset called " + Quoted.of(name),
                    Nearest.hint(name, assets) + "name one of " + String.join(", ", assets)
                            + ", or cash; hold what is not" + " part of the strategy elsewhere"));
        } else if (read.containsKey(name)) {
            faults.add(row.problem(asset, Quoted.of(name) + " stands twice", "keep one row for each asset"));
        } else if (number.isEmpty() || Double.isInfinite(number.getAsDouble())) {
            faults.add(row.problem(units, "units '" + text + "' is not a number", remedy(text)));
        } else {
            read.put(name, number.getAsDouble());
        }
    }
}
