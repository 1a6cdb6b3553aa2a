package sojourn.document;

/** A located piece of a document. */
public interface Node {
    /** The file, as the user named it. */
    String file();

    /** 1-based. */
    int line();

    /** 1-based. */
    int column();

    /** JSON pointer from the root: "" for the root, "/prices/stocks/csv" for a value. */
    String path();
}
