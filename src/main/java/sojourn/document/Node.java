package sojourn.document;

/** A located piece of a document. */
public sealed interface Node permits MapNode, ListNode, ScalarNode, BrokenNode {
    /** Where it stands. */
    Place place();

    /** The file, as the user named it. */
    default String file() {
        return place().file();
    }

    /** 1-based. */
    default int line() {
        return place().line();
    }

    /** 1-based. */
    default int column() {
        return place().column();
    }

    /** JSON pointer from the root: "" for the root, "/prices/stocks/csv" for a value. */
    default String path() {
        return place().path();
    }

    /** What messages call it: "'csv'", "item 2 of 'states'". */
    default String name() {
        return place().name();
    }
}
