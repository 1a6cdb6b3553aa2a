package sojourn.document;

/**
 * Where a piece of a document stands, and what messages call it.
 *
 * @param file the file, as the user named it
 * @param line 1-based
 * @param column 1-based
 * @param path JSON pointer from the root: "" for the root, "/prices/stocks/csv" for a value
 * @param name what messages call it: "'csv'", "item 2 of 'states'"
 */
public record Place(String file, int line, int column, String path, String name) {
    static Place root(String file) {
        return new Place(file, 1, 1, "", "the file");
    }

    /** The place of the value of {@code key} in a map that stands here, if it is written at the given line and column. */
    Place ofKey(String key, int atLine, int atColumn) {
        String step = key.replace("~", "~0").replace("/", "~1");
        return new Place(file, atLine, atColumn, path + "/" + step, "'" + Wording.shortened(key) + "'");
    }

    /** The place of an item of a list that stands here; {@code index} counts from 0. */
    Place ofItem(int index, int atLine, int atColumn) {
        return new Place(file, atLine, atColumn, path + "/" + index, "item " + (index + 1) + " of " + name);
    }

    /** The same piece written elsewhere. */
    Place at(int otherLine, int otherColumn) {
        return new Place(file, otherLine, otherColumn, path, name);
    }
}
