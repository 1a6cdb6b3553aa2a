package sojourn.latest;

import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.core.StreamReadFeature;
import com.fasterxml.jackson.databind.DeserializationFeature;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.fasterxml.jackson.databind.json.JsonMapper;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import sojourn.archive.Digest;
import sojourn.archive.SealShelf.Stored;
import sojourn.document.JsonText;

/**
 * The seals of one strategy in the order of sealing. Each carries a hash of itself, names the one before it by file and hash, and
 * holds of the rows only what the one before does not.
 */
final class SealChain {
    static final String HASH = "sha256";
    static final String PREVIOUS = "previous";
    static final String ROWS = "rows";

    private final List<Link> links = new ArrayList<>();

    /** A key that stands twice is refused, for a reader may show one value while another is hashed. */
    private static final ObjectMapper STRICT = JsonMapper.builder()
            .enable(StreamReadFeature.STRICT_DUPLICATE_DETECTION)
            .enable(DeserializationFeature.FAIL_ON_TRAILING_TOKENS)
            .build();

    /**
     * A seal as it was read.
     *
     * @param tree empty if it cannot be read
     * @param fault why it cannot, empty if it can
     */
    private record Link(String name, Optional<ObjectNode> tree, String fault) {}

    private SealChain() {}

    static SealChain of(List<Stored> stored) {
        SealChain chain = new SealChain();
        stored.forEach(one -> chain.links.add(link(one)));
        return chain;
    }

    private static Link link(Stored stored) {
        try {
            JsonNode tree = STRICT.readTree(stored.text());
            return tree instanceof ObjectNode object && tree.has(HASH)
                    ? new Link(stored.name(), Optional.of(object), "")
                    : new Link(stored.name(), Optional.empty(), "it has no key '" + HASH + "'");
        } catch (JsonProcessingException e) {
            String where =
                    e.getLocation() == null ? "" : "line " + e.getLocation().getLineNr() + ": ";
            return new Link(stored.name(), Optional.empty(), where + e.getOriginalMessage());
        }
    }

    /** Why a seal cannot be read; empty if it can. */
    String unreadable(int place) {
        return links.get(place).fault();
    }

    /** The seal after {@code place}, if that one names it by the hash it has; empty if there is none or it names another. */
    Optional<String> vouching(int place) {
        int next = place + 1;
        boolean vouches = next < size()
                && seal(next)
                        .map(one -> fitting(one) && link(next, one).isEmpty())
                        .orElse(false);
        return vouches ? Optional.of(name(next)) : Optional.empty();
    }

    private static boolean fitting(ObjectNode seal) {
        return hash(seal).equals(seal.path(HASH).asText());
    }

    int size() {
        return links.size();
    }

    /** The place of a seal by its file's name; -1 if it is none of these. */
    int place(String name) {
        return links.stream().map(Link::name).toList().indexOf(name);
    }

    String name(int place) {
        return links.get(place).name();
    }

    /** A seal; empty if its file holds none. */
    Optional<ObjectNode> seal(int place) {
        return links.get(place).tree();
    }

    /** The hash that a seal must carry: SHA-256 of all of it but the hash, on one line, keys in their order. */
    static String hash(ObjectNode seal) {
        ObjectNode rest = seal.deepCopy();
        rest.remove(HASH);
        return Digest.of(JsonText.bytes(rest));
    }

    /** What is wrong with any of the seals, the oldest first. */
    List<String> faults() {
        return faults(size() - 1);
    }

    /** What is wrong with the seals up to {@code place}, the oldest first. */
    List<String> faults(int place) {
        List<String> faults = new ArrayList<>();
        for (int i = 0; i <= place; i++) {
            Optional<ObjectNode> seal = seal(i);
            if (seal.isEmpty()) {
                faults.add(name(i) + " cannot be read as a seal (" + unreadable(i) + ")");
                continue;
            }
            if (!fitting(seal.get())) {
                faults.add(name(i) + " is not what was sealed: its hash does not fit its content");
            }
            faults.addAll(link(i, seal.get()));
        }
        return faults;
    }

    private List<String> link(int place, ObjectNode seal) {
        JsonNode previous = seal.path(PREVIOUS);
        if (previous.isNull() || previous.isMissingNode()) {
            return place == 0
                    ? List.of()
                    : List.of(name(place) + " names no seal before it, and there is " + name(place - 1));
        }
        String named = previous.path("file").asText();
        int before = place(named);
        if (before < 0 || before != place - 1) {
            return List.of(name(place) + " names " + named + " as the seal before it, "
                    + (before < 0 ? "which is gone" : "and another stands between them"));
        }
        boolean fits = seal(before)
                .map(one -> one.path(HASH).asText().equals(previous.path(HASH).asText()))
                .orElse(false);
        return fits ? List.of() : List.of(name(place) + " names " + named + " with another hash than it has now");
    }

    /** The rows that a seal stands on, put together from all seals up to it; empty if one of them is missing or was changed. */
    Optional<SealedRows> rows(int place) {
        if (!faults(place).isEmpty()) {
            return Optional.empty();
        }
        SealedRows rows = SealedRows.none();
        for (int i = 0; i <= place; i++) {
            rows = added(rows, seal(i).orElseThrow().path(ROWS));
        }
        return Optional.of(rows);
    }

    /** What {@code now} has and {@code before} has not, and what it no longer has. */
    static ObjectNode difference(SealedRows before, SealedRows now) {
        boolean same = before.columns().equals(now.columns());
        ObjectNode node = JsonNodeFactory.instance.objectNode();
        now.columns().forEach(node.putArray("columns")::add);
        node.put("count", now.byDate().size());
        node.put(HASH, now.sha256());
        ObjectNode set = node.putObject("new_or_changed");
        now.byDate().forEach((date, cells) -> {
            if (!same || !cells.equals(before.byDate().get(date))) {
                set.put(date, cells);
            }
        });
        before.byDate().keySet().stream()
                .filter(date -> !now.byDate().containsKey(date))
                .forEach(node.putArray("gone")::add);
        return node;
    }

    private static SealedRows added(SealedRows before, JsonNode difference) {
        List<String> columns = new ArrayList<>();
        difference.path("columns").forEach(one -> columns.add(one.asText()));
        Map<String, String> byDate = new TreeMap<>(before.byDate());
        difference.path("gone").forEach(date -> byDate.remove(date.asText()));
        difference
                .path("new_or_changed")
                .properties()
                .forEach(one -> byDate.put(one.getKey(), one.getValue().asText()));
        return new SealedRows(columns, new LinkedHashMap<>(byDate));
    }
}
