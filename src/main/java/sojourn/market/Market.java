package sojourn.market;

import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import java.util.SortedMap;
import java.util.TreeMap;

/**
 * What the market did, and what there is to say about the files that told it.
 *
 * @param table prices and cash returns on the common calendar
 * @param findings what is worth a look but can be worked with
 * @param files the files that were read; none for prices that come from elsewhere
 */
public record Market(PriceTable table, List<Finding> findings, List<InputFile> files) {
    /** Copies the lists. */
    public Market {
        findings = List.copyOf(findings);
        files = List.copyOf(files);
    }

    /**
     * Puts series, all of which define the common bars, on one calendar: pure, so that invented or altered prices go the same
     * way as files. Refuses, by an {@link sojourn.document.InputException}, series with fewer than two bars in common and
     * rates that leave a bar without one.
     */
    public static Market of(List<PriceSeries> series, Calendar calendar, CashRates cash) {
        return of(series, Set.of(), calendar, cash);
    }

    /** The same where the series named in {@code levels} are no assets: they define common bars like the others. */
    static Market of(List<PriceSeries> series, Set<String> levels, Calendar calendar, CashRates cash) {
        if (series.stream().allMatch(one -> levels.contains(one.asset()))) {
            throw new IllegalArgumentException("a market needs at least one series");
        }
        CommonBars common = CommonBars.of(series, calendar);
        List<Finding> findings = new ArrayList<>();
        for (PriceSeries one : series) {
            findings.addAll(
                    levels.contains(one.asset())
                            ? SeriesFindings.ofLevels(one, calendar)
                            : SeriesFindings.of(one, calendar));
        }
        findings.addAll(common.findings());
        List<String> assets = new ArrayList<>();
        List<PriceTable.Bars> bars = new ArrayList<>();
        SortedMap<String, PriceTable.Column> others = new TreeMap<>();
        for (int i = 0; i < series.size(); i++) {
            String name = series.get(i).asset();
            if (levels.contains(name)) {
                others.put(name, common.bars().get(i).close());
            } else {
                assets.add(name);
                bars.add(common.bars().get(i));
            }
        }
        PriceTable table = PriceTable.of(common.axis(), assets, bars, cash.on(common.axis()))
                .withLevels(others)
                .withCarried(common.carried());
        return new Market(table, findings, List.of());
    }
}
