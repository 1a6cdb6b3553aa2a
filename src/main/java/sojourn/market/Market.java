package sojourn.market;

import java.util.ArrayList;
import java.util.List;

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
        if (series.isEmpty()) {
            throw new IllegalArgumentException("a market needs at least one series");
        }
        CommonBars common = CommonBars.of(series, calendar);
        List<Finding> findings = new ArrayList<>();
        for (PriceSeries one : series) {
            findings.addAll(SeriesFindings.of(one, calendar));
        }
        findings.addAll(common.findings());
        PriceTable table = PriceTable.of(
                common.axis(), series.stream().map(PriceSeries::asset).toList(), common.bars(), cash.on(common.axis()));
        return new Market(table, findings, List.of());
    }
}
