package sojourn.latest;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import sojourn.archive.Caution;
import sojourn.archive.ProgramVersion;
import sojourn.archive.ResultFolder;
import sojourn.archive.SealShelf;
import sojourn.document.InputException;
import sojourn.document.JsonText;
import sojourn.document.Problem;

/** Puts decisions under seal: a dated record with a hash of itself, chained to the seal before it. */
public final class Seal {
    static final String CONTENT = "content";

    private Seal() {}

    /**
     * Seals what {@code latest} says. If the last seal of the shelf holds just that, it is left alone.
     *
     * @param sealedAt when, in words; part of what is sealed
     */
    public static ResultFolder.Published put(SealShelf shelf, Latest latest, String sealedAt) {
        SealChain chain = SealChain.of(shelf.all());
        int last = chain.size() - 1;
        List<String> faults = chain.faults();
        if (!faults.isEmpty()) {
            throw new InputException(new Problem(
                    shelf.path(chain.name(last)).toString(),
                    0,
                    0,
                    "the chain of seals is broken, so nothing is added to it: " + String.join("; ", faults),
                    "put back what was changed or removed, or begin a new chain with another --results"));
        }
        SealedRows before = last < 0 ? SealedRows.none() : chain.rows(last).orElseThrow();
        SealedRows now = rows(latest);
        ObjectNode content = SealContent.of(latest);
        if (last >= 0 && same(chain, last, content) && before.equals(now)) {
            return new ResultFolder.Published(shelf.path(chain.name(last)), ResultFolder.Arrival.STOOD_ALREADY);
        }
        ObjectNode seal = JsonNodeFactory.instance.objectNode();
        seal.put("caution", Caution.TEXT);
        seal.put("number", last + 2);
        seal.put("sealed_at", sealedAt);
        seal.put("version", ProgramVersion.current());
        seal.set(SealChain.PREVIOUS, previous(chain, last));
        seal.set(CONTENT, content);
        seal.set(SealChain.ROWS, SealChain.difference(before, now));
        seal.put(SealChain.HASH, SealChain.hash(seal));
        String name = String.format(
                Locale.ROOT, "%05d-%s.json", last + 2, latest.standing().asOf());
        return new ResultFolder.Published(
                shelf.put(new SealShelf.Stored(name, JsonText.indented(seal))), ResultFolder.Arrival.WRITTEN);
    }

    /** Compared as they are written, for a number read back is of another type than the one that was put in. */
    private static boolean same(SealChain chain, int last, ObjectNode content) {
        JsonNode sealed = chain.seal(last).orElseThrow().path(CONTENT);
        return JsonText.compact(sealed).equals(JsonText.compact(content));
    }

    private static JsonNode previous(SealChain chain, int last) {
        if (last < 0) {
            return JsonNodeFactory.instance.nullNode();
        }
        ObjectNode node = JsonNodeFactory.instance.objectNode();
        node.put("file", chain.name(last));
        return node.put(
                SealChain.HASH,
                chain.seal(last).orElseThrow().path(SealChain.HASH).asText());
    }

    static SealedRows rows(Latest latest) {
        Optional<List<String>> given =
                latest.standing().strategy().regimes().given().map(one -> one.states());
        return SealedRows.of(latest.standing().table(), given.orElse(List.of()));
    }
}
