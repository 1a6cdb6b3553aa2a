package sojourn.document;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** The same tree hung elsewhere: what lies inside keeps its lines and columns and gets new paths. */
final class Relocation {
    private Relocation() {}

    /**
     * How large a tree is.
     *
     * @param nodes keys and values in it
     * @param depth maps and lists within each other; 0 for a single value
     */
    record Extent(int nodes, int depth) {}

    static Extent extent(Node node) {
        int nodes = 1;
        int depth = 0;
        for (Node child : children(node)) {
            Extent inner = extent(child);
            nodes += inner.nodes();
            depth = Math.max(depth, inner.depth());
        }
        if (node instanceof MapNode map) {
            nodes += map.entries().size();
        }
        return new Extent(nodes, node instanceof MapNode || node instanceof ListNode ? depth + 1 : 0);
    }

    /** The tree with its root at {@code place}. */
    static Node moved(Node node, Place place) {
        if (node instanceof MapNode map) {
            Map<String, MapNode.Entry> entries = new LinkedHashMap<>();
            map.entries().forEach((key, entry) -> {
                Place old = entry.value().place();
                entries.put(
                        key,
                        new MapNode.Entry(
                                place.ofKey(
                                        key,
                                        entry.keyPlace().line(),
                                        entry.keyPlace().column()),
                                moved(entry.value(), place.ofKey(key, old.line(), old.column()))));
            });
            return new MapNode(place, entries);
        }
        if (node instanceof ListNode list) {
            List<Node> items = new ArrayList<>();
            for (Node item : list.items()) {
                items.add(moved(item, place.ofItem(items.size(), item.line(), item.column())));
            }
            return new ListNode(place, items);
        }
        return node instanceof ScalarNode scalar
                ? new ScalarNode(place, scalar.kind(), scalar.text())
                : new BrokenNode(place);
    }

    private static List<Node> children(Node node) {
        if (node instanceof MapNode map) {
            return map.entries().values().stream().map(MapNode.Entry::value).toList();
        }
        return node instanceof ListNode list ? list.items() : List.of();
    }
}
