package sojourn.document;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Steps through a tree. */
final class Tree {
    private Tree() {}

    /** The value of a key, or the item of a list at an index from 0. */
    static Optional<Node> child(Node node, String step) {
        if (node instanceof MapNode map) {
            return map.get(step);
        }
        if (node instanceof ListNode list && step.matches("0|[1-9][0-9]{0,8}")) {
            int index = Integer.parseInt(step);
            return index < list.items().size() ? Optional.of(list.items().get(index)) : Optional.empty();
        }
        return Optional.empty();
    }

    /** The tree with {@code value} at the end of {@code steps}; empty if they lead nowhere. */
    static Optional<Node> with(Node tree, List<String> steps, Node value) {
        if (steps.isEmpty()) {
            return Optional.of(Relocation.moved(value, tree.place().at(value.line(), value.column())));
        }
        String step = steps.get(0);
        List<String> rest = steps.subList(1, steps.size());
        if (tree instanceof MapNode map) {
            Place place = map.place().ofKey(step, value.line(), value.column());
            Node old = map.get(step).orElse(new MapNode(place, Map.of()));
            return with(old, rest, value).map(changed -> {
                Map<String, MapNode.Entry> entries = new LinkedHashMap<>(map.entries());
                entries.put(step, new MapNode.Entry(map.keyPlace(step).orElse(place), changed));
                return new MapNode(map.place(), entries);
            });
        }
        if (tree instanceof ListNode list) {
            return child(list, step).flatMap(old -> with(old, rest, value)).map(changed -> {
                List<Node> items = new ArrayList<>(list.items());
                items.set(Integer.parseInt(step), changed);
                return new ListNode(list.place(), items);
            });
        }
        return Optional.empty();
    }
}
