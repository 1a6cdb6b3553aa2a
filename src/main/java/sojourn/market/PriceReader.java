package sojourn.market;

import java.math.BigDecimal;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import sojourn.document.Problems;

/** The front door for files: reads every price file and the rates, and puts the prices on one calendar. */
public final class PriceReader {
    private final Path folder;
    private final Calendar calendar;
    private final Problems problems = new Problems();
    private final List<Finding> findings = new ArrayList<>();
    private final List<InputFile> files = new ArrayList<>();

    private PriceReader(Path folder, Calendar calendar) {
        this.folder = folder;
        this.calendar = calendar;
    }

    /**
     * Reads a market. Every fault of every file is told at once, in one {@link sojourn.document.InputException}.
     *
     * @param folder where paths start: the folder of the strategy file
     * @param sources the section {@code prices}, in its order
     * @param calendar the section {@code calendar}, or {@link Calendar#DAILY}
     * @param cash the section {@code cash}, or {@link CashSource#NOTHING}
     * @param used names of the assets that are observed, held or compared with: they alone define the common bars and stand in
     *     the table, in the order of {@code sources}; the files of the others are read and checked only
     */
    public static Market read(
            Path folder, Map<String, PriceSource> sources, Calendar calendar, CashSource cash, List<String> used) {
        return read(folder, sources, calendar, cash, used, Set.of(), Optional.empty());
    }

    /**
     * The same with probabilities of regimes that were computed elsewhere, if there are any.
     *
     * @param levels those of {@code used} that are no assets: numbers of any sign, of which only changes are taken
     */
    public static Market read(
            Path folder,
            Map<String, PriceSource> sources,
            Calendar calendar,
            CashSource cash,
            List<String> used,
            Set<String> levels,
            Optional<GivenColumns> given) {
        if (used.isEmpty() || !sources.keySet().containsAll(used)) {
            throw new IllegalArgumentException("used assets " + used + " must be some of " + sources.keySet());
        }
        return new PriceReader(folder, calendar).market(sources, cash, used, levels, given);
    }

    private Market market(
            Map<String, PriceSource> sources,
            CashSource cash,
            List<String> used,
            Set<String> levels,
            Optional<GivenColumns> wanted) {
        Map<String, PriceSeries> series = new LinkedHashMap<>();
        sources.forEach((asset, source) -> {
            SeriesKind kind = levels.contains(asset) ? SeriesKind.LEVELS : SeriesKind.PRICES;
            prices(asset, source, kind).ifPresent(read -> series.put(asset, read));
        });
        Optional<CashRates> rates = rates(cash);
        Optional<GivenRows> given = wanted.flatMap(this::given);
        problems.throwIfAny();
        series.keySet().stream().filter(asset -> !used.contains(asset)).forEach(this::notUsed);
        series.keySet().retainAll(used);
        Market market = Market.of(List.copyOf(series.values()), levels, calendar, rates.orElseThrow());
        findings.addAll(market.findings());
        PriceTable table = market.table();
        given.ifPresent(rows -> findings.addAll(rows.findings(table.axis())));
        return new Market(
                given.map(rows -> table.withGiven(rows.on(table.axis()))).orElse(table), findings, files);
    }

    private Optional<GivenRows> given(GivenColumns wanted) {
        String name = wanted.source().layout().csv();
        Faults faults = new Faults("probabilities that are given");
        Optional<TextFile> text = TextFile.read(folder, name, faults);
        Optional<GivenRows> read = text.flatMap(found -> GivenFile.read(found, wanted, faults));
        faults.addTo(problems);
        read.ifPresent(rows -> files.add(new InputFile(
                GivenColumns.ROLE,
                name,
                text.orElseThrow().sha256(),
                rows.size(),
                rows.first(),
                rows.last(),
                rows.digest())));
        return read;
    }

    private Optional<PriceSeries> prices(String asset, PriceSource source, SeriesKind kind) {
        String name = source.layout().csv();
        Faults faults = new Faults("prices of '" + asset + "'");
        Optional<TextFile> text = TextFile.read(folder, name, faults);
        Optional<PriceSeries> read = text.flatMap(
                found -> PriceFile.read(asset, found, source, kind, calendar.rowLength(), faults, findings));
        faults.addTo(problems);
        read.ifPresent(series -> files.add(new InputFile(
                asset,
                name,
                text.orElseThrow().sha256(),
                series.size(),
                series.first(),
                series.last(),
                series.digest())));
        return read;
    }

    private Optional<CashRates> rates(CashSource cash) {
        if (cash instanceof CashSource.Constant constant) {
            perhapsFraction(constant.percentPerYear());
            return Optional.of(CashRates.constant(constant.percentPerYear(), constant.dayCount()));
        }
        CashSource.Dated dated = (CashSource.Dated) cash;
        String name = dated.layout().csv();
        Faults faults = new Faults("rates of " + AssetName.CASH);
        Optional<TextFile> text = TextFile.read(folder, name, faults);
        Optional<CashFile.Content> read = text.flatMap(found -> CashFile.read(found, dated, faults, findings));
        faults.addTo(problems);
        read.ifPresent(content -> files.add(new InputFile(
                AssetName.CASH,
                name,
                text.orElseThrow().sha256(),
                content.rows(),
                content.first(),
                content.last(),
                content.rates().digest())));
        return read.map(CashFile.Content::rates);
    }

    private void perhapsFraction(double percentPerYear) {
        if (percentPerYear > 0 && percentPerYear < CashFile.PERHAPS_A_FRACTION) {
            BigDecimal percent = BigDecimal.valueOf(percentPerYear);
            String hundredfold = percent.movePointRight(2).stripTrailingZeros().toPlainString();
            findings.add(new Finding(
                    "",
                    0,
                    "cash earns " + percent.stripTrailingZeros().toPlainString() + " % a year",
                    "did you mean " + hundredfold + "? percent-per-year is in percent"));
        }
    }

    private void notUsed(String asset) {
        findings.add(new Finding(
                "",
                0,
                "nothing uses " + asset + ": it is neither observed nor held nor compared with, and stands in no table",
                "remove it from prices, or use it"));
    }
}
