package sojourn.latest;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.nio.file.Path;
import java.time.LocalDate;
import java.time.format.DateTimeParseException;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.TreeSet;
import sojourn.archive.SealShelf;
import sojourn.compare.Prepared;
import sojourn.compare.Progress;
import sojourn.compare.Workers;
import sojourn.document.InputException;
import sojourn.document.JsonText;
import sojourn.document.Problem;
import sojourn.market.PriceTable;

/**
 * Whether a seal still holds: its chain is whole, also after it, and the files of now, cut at its date, give the same decision.
 *
 * @param seal name of its file
 * @param asOf the date it was sealed for
 * @param sealedAt when it was sealed
 * @param sha256 the hash it carries, to be held against one that was kept elsewhere
 * @param vouchedBy the seal after it, which names it by this hash; empty if it is the last or that one names another
 * @param chain what is wrong with the seals that stand with it, before it and after it
 * @param rows what has changed in the rows it stands on; empty if the chain is broken, so that they cannot be put together
 * @param differences what the files of now say otherwise
 */
public record SealVerdict(
        String seal,
        String asOf,
        String sealedAt,
        String sha256,
        Optional<String> vouchedBy,
        List<String> chain,
        Optional<List<RowChange>> rows,
        List<Difference> differences) {
    /** Copies the lists. */
    public SealVerdict {
        chain = List.copyOf(chain);
        rows = rows.map(List::copyOf);
        differences = List.copyOf(differences);
    }

    /**
     * A cell of the common bars that is not what it was.
     *
     * @param row the bar, counted from 1
     * @param column empty if the whole row came or went
     * @param before empty if there was none
     * @param now empty if there is none
     */
    public record RowChange(int row, String date, String column, String before, String now) {}

    /**
     * A value that is not what was sealed.
     *
     * @param where JSON pointer from the content of the seal
     * @param sealed as it was, empty if there was none
     * @param now as it is, empty if there is none
     */
    public record Difference(String where, String sealed, String now) {}

    /** Whether all of it holds. */
    public boolean holds() {
        return chain.isEmpty()
                && differences.isEmpty()
                && rows.map(List::isEmpty).orElse(false);
    }

    /** Judges the seal at {@code file} by what {@code ready} was read from now. */
    public static SealVerdict of(Path file, Prepared.Ready ready, Workers workers, Progress progress) {
        SealChain chain = SealChain.of(SealShelf.around(file).all());
        String name =
                Objects.requireNonNull(file.getFileName(), "a file has a name").toString();
        int place = chain.place(name);
        ObjectNode seal = (place < 0 ? Optional.<ObjectNode>empty() : chain.seal(place))
                .orElseThrow(() -> noSeal(file, place < 0 ? "" : chain.unreadable(place)));
        JsonNode content = seal.path(Seal.CONTENT);
        LocalDate asOf = date(file, content.path("as_of").asText());
        PriceTable table = ready.market().table();
        int bars = barsUpTo(table, asOf);
        List<Difference> differences = new ArrayList<>();
        SealedRows now = SealedRows.none();
        if (bars == 0) {
            differences.add(new Difference("/as_of", asOf.toString(), ""));
        } else {
            Latest latest = again(content, file, ready, Latest.standing(ready, bars, workers, progress));
            now = Seal.rows(latest);
            ObjectNode fresh = SealContent.of(latest);
            fresh.remove("inputs"); // files grow; what was read of them up to the date is in the rows
            compare("", without(content, "inputs"), fresh, differences);
        }
        SealedRows rows = now;
        return new SealVerdict(
                name,
                asOf.toString(),
                seal.path("sealed_at").asText(),
                seal.path(SealChain.HASH).asText(),
                chain.vouching(place),
                chain.faults(),
                chain.rows(place).map(then -> changes(then, rows)),
                differences);
    }

    private static JsonNode without(JsonNode content, String key) {
        ObjectNode rest = content.deepCopy();
        rest.remove(key);
        return rest;
    }

    private static Latest again(JsonNode content, Path file, Prepared.Ready ready, Standing standing) {
        JsonNode holdings = content.path("holdings");
        if (holdings.isMissingNode()) {
            return Latest.of(ready, standing);
        }
        Map<String, Double> byName = new LinkedHashMap<>();
        holdings.properties()
                .forEach(one -> byName.put(one.getKey(), one.getValue().doubleValue()));
        return Latest.of(ready, standing, byName, file.toString());
    }

    private static List<RowChange> changes(SealedRows then, SealedRows now) {
        return then.changesTo(now).stream()
                .map(one -> new RowChange(one.row(), one.date(), one.column(), one.before(), one.now()))
                .toList();
    }

    private static int barsUpTo(PriceTable table, LocalDate date) {
        int bars = table.size();
        while (bars > 0 && table.knownAt(bars - 1).date().isAfter(date)) {
            bars--;
        }
        return bars;
    }

    /** Leaf by leaf, in the order of names. */
    private static void compare(String where, JsonNode was, JsonNode now, List<Difference> differences) {
        if (was.isContainerNode() && now.isContainerNode() && was.isArray() == now.isArray()) {
            for (String key : keys(was, now)) {
                compare(where + "/" + key, child(was, key), child(now, key), differences);
            }
        } else if (!text(was).equals(text(now))) {
            differences.add(new Difference(where, text(was), text(now)));
        }
    }

    private static Iterable<String> keys(JsonNode one, JsonNode other) {
        List<String> keys = new ArrayList<>();
        if (one.isArray()) {
            for (int i = 0; i < Math.max(one.size(), other.size()); i++) {
                keys.add(Integer.toString(i));
            }
            return keys;
        }
        one.fieldNames().forEachRemaining(keys::add);
        other.fieldNames().forEachRemaining(keys::add);
        return new TreeSet<>(keys);
    }

    private static JsonNode child(JsonNode node, String key) {
        return node.isArray() ? node.path(Integer.parseInt(key)) : node.path(key);
    }

    private static String text(JsonNode node) {
        return node.isMissingNode() ? "" : node.isTextual() ? node.asText() : JsonText.compact(node);
    }

    private static LocalDate date(Path file, String text) {
        try {
            return LocalDate.parse(text);
        } catch (DateTimeParseException e) {
            throw noSeal(file, "its as_of is no date");
        }
    }

    private static InputException noSeal(Path file, String why) {
        return new InputException(new Problem(
                file.toString(),
                0,
                0,
                "this is no seal" + (why.isEmpty() ? "" : ": " + why),
                "name a .json file that --seal wrote, in the folder it was written to"));
    }
}
