package sojourn.document;

import java.util.List;

/**
 * A list.
 *
 * @param place where it begins
 * @param items in the order written
 */
public record ListNode(Place place, List<Node> items) implements Node {
    /** Copies the items. */
    public ListNode {
        items = List.copyOf(items);
    }
}
