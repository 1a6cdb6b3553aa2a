package sojourn.latest;

import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.TreeSet;
import java.util.function.Function;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import sojourn.archive.Digest;
import sojourn.market.Known;
import sojourn.market.PriceTable;
import sojourn.market.QuotedBar;
import sojourn.numeric.ShortestDecimal;

/**
 * All that a decision could see of the market, as text: a row a common bar, prices as quoted with dividends and splits beside
 * them, numbers as the shortest decimals that read back to the
 * same double, empty where there is none.
 *
 * @param columns names, the date left out
 * @param byDate the cells of each bar, joined by commas, by its date in ISO form, in order
 */
record SealedRows(List<String> columns, Map<String, String> byDate) {
    SealedRows {
        columns = List.copyOf(columns);
        byDate = Collections.unmodifiableMap(new LinkedHashMap<>(byDate));
    }

    /** No row. */
    static SealedRows none() {
        return new SealedRows(List.of(), Map.of());
    }

    /** A column and how its cell is found. */
    private record Source(String name, Function<Known, OptionalDouble> cell) {
        boolean anywhere(PriceTable table) {
            return IntStream.range(0, table.size())
                    .anyMatch(bar -> cell.apply(table.knownAt(bar)).isPresent());
        }
    }

    /** The bars of a table, columns without any value left out; {@code regimes} are those whose probabilities are given, or none. */
    static SealedRows of(PriceTable table, List<String> regimes) {
        List<Source> sources = sources(table, regimes).stream()
                .filter(one -> one.anywhere(table))
                .toList();
        Map<String, String> byDate = new LinkedHashMap<>();
        for (int bar = 0; bar < table.size(); bar++) {
            Known known = table.knownAt(bar);
            byDate.put(
                    known.date().toString(),
                    sources.stream().map(one -> text(one.cell().apply(known))).collect(Collectors.joining(",")));
        }
        return new SealedRows(sources.stream().map(Source::name).toList(), byDate);
    }

    private static List<Source> sources(PriceTable table, List<String> regimes) {
        List<Source> sources = new ArrayList<>();
        for (int i = 0; i < table.assets().size(); i++) {
            int asset = i;
            String name = table.assets().get(i);
            Function<Known, QuotedBar> bar = known -> QuotedBar.of(table, asset, known.bar());
            sources.add(new Source(
                    name + ".close",
                    known -> own(known, name).isPresent()
                            ? OptionalDouble.of(bar.apply(known).close())
                            : OptionalDouble.empty()));
            sources.add(new Source(name + ".open", bar.andThen(QuotedBar::open)));
            sources.add(new Source(name + ".high", bar.andThen(QuotedBar::high)));
            sources.add(new Source(name + ".low", bar.andThen(QuotedBar::low)));
            sources.add(new Source(name + ".volume", bar.andThen(QuotedBar::volume)));
            sources.add(new Source(name + ".dividend", bar.andThen(QuotedBar::dividend)));
            sources.add(new Source(name + ".split", bar.andThen(QuotedBar::split)));
        }
        for (String level : table.levels()) {
            sources.add(new Source(level + ".close", known -> own(known, level)));
        }
        sources.add(new Source("cash.rate_a_bar", known -> OptionalDouble.of(known.expectedCashReturn())));
        for (int k = 0; k < regimes.size(); k++) {
            int regime = k;
            sources.add(new Source("given." + regimes.get(k), known -> known.given(regime, known.bar())));
        }
        return sources;
    }

    /** Empty where a close is only carried. */
    private static OptionalDouble own(Known known, String series) {
        int bar = known.bar();
        return known.carried(series, bar) ? OptionalDouble.empty() : OptionalDouble.of(known.close(series, bar));
    }

    private static String text(OptionalDouble value) {
        return value.isPresent() ? ShortestDecimal.of(value.getAsDouble()) : "";
    }

    /** SHA-256 over columns and rows. */
    String sha256() {
        Digest digest = Digest.begin();
        columns.forEach(digest::text);
        byDate.forEach((date, cells) -> digest.text(date).text(cells));
        return digest.hex();
    }

    /**
     * A cell that is not what it was.
     *
     * @param row the bar, counted from 1 among those of the longer table
     * @param column empty if the whole row is meant
     * @param before empty if there was none
     * @param now empty if there is none
     */
    record Change(int row, String date, String column, String before, String now) {}

    /** What has changed from these rows to {@code now}, in the order of dates. */
    List<Change> changesTo(SealedRows now) {
        List<Change> changes = new ArrayList<>();
        int row = 0;
        TreeSet<String> dates = new TreeSet<>(byDate.keySet());
        dates.addAll(now.byDate.keySet());
        for (String date : dates) {
            row++;
            Optional<String> old = Optional.ofNullable(byDate.get(date));
            Optional<String> fresh = Optional.ofNullable(now.byDate.get(date));
            if (old.isEmpty() || fresh.isEmpty()) {
                changes.add(new Change(row, date, "", old.orElse(""), fresh.orElse("")));
            } else if (!old.equals(fresh) || !columns.equals(now.columns)) {
                changes.addAll(cellChanges(row, date, old.get(), fresh.get(), now.columns));
            }
        }
        return changes;
    }

    private List<Change> cellChanges(int row, String date, String old, String fresh, List<String> others) {
        String[] before = old.split(",", -1);
        String[] after = fresh.split(",", -1);
        List<Change> changes = new ArrayList<>();
        for (int i = 0; i < before.length; i++) {
            int there = others.indexOf(columns.get(i));
            String value = there < 0 ? "" : after[there];
            if (!before[i].equals(value)) {
                changes.add(new Change(row, date, columns.get(i), before[i], value));
            }
        }
        return changes;
    }
}
