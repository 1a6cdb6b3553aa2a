package sojourn.document.shape;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import sojourn.document.Json;
import sojourn.document.ListNode;
import sojourn.document.Node;
import sojourn.document.Problems;
import sojourn.document.Shape;
import sojourn.document.Wording;

/** A list whose items have one shape. */
public record ListShape<T>(Shape<T> item, int atLeast, int atMost) implements Shape<List<T>> {
    @Override
    public Optional<List<T>> read(Node node, Problems problems) {
        if (!(node instanceof ListNode list)) {
            return Wording.mismatch(this, node, problems);
        }
        int size = list.items().size();
        boolean rightSize = size >= atLeast && size <= atMost;
        if (!rightSize) {
            String found = size == 0 ? " is empty" : " has " + count(size);
            problems.add(node, node.name() + found, "give " + expected());
        }
        List<T> values = new ArrayList<>();
        for (Node each : list.items()) {
            item.read(each, problems).ifPresent(values::add);
        }
        return rightSize && values.size() == size ? Optional.of(List.copyOf(values)) : Optional.empty();
    }

    @Override
    public JsonNode resolved(Node node) {
        ArrayNode items = Json.array();
        ((ListNode) node).items().forEach(each -> items.add(item.resolved(each)));
        return items;
    }

    @Override
    public ObjectNode schema() {
        ObjectNode schema = Json.typed("array");
        schema.set("items", item.schema());
        if (atLeast > 0) {
            schema.put("minItems", atLeast);
        }
        if (atMost < Integer.MAX_VALUE) {
            schema.put("maxItems", atMost);
        }
        return schema;
    }

    @Override
    public String expected() {
        return "a list" + size() + ", each " + item.expected();
    }

    private String size() {
        if (atLeast == atMost) {
            return " of " + count(atLeast);
        }
        if (atMost < Integer.MAX_VALUE) {
            return atLeast == 0 ? " of at most " + count(atMost) : " of " + atLeast + " to " + count(atMost);
        }
        return atLeast == 0 ? "" : " of at least " + count(atLeast);
    }

    private static String count(int items) {
        return items + (items == 1 ? " item" : " items");
    }

    @Override
    public boolean mayBe(Node node) {
        return node instanceof ListNode;
    }

    @Override
    public String hint(Node node) {
        return !mayBe(node) && item.mayBe(node) ? "put it in [ ], even if it is the only one: " : "";
    }
}
