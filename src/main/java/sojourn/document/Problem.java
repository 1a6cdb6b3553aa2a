package sojourn.document;

/**
 * One fault in the user's input.
 *
 * @param file the file or option it stands in, as the user named it
 * @param line 1-based; 0 if the fault belongs to the file as a whole
 * @param column 1-based; 0 if unknown
 * @param what what is wrong, with the value that was found
 * @param remedy what to do about it
 */
public record Problem(String file, int line, int column, String what, String remedy) {
    /** {@code file.yaml:12:7: what is wrong; what to do}. */
    @Override
    public String toString() {
        String place = line == 0 ? file : column == 0 ? file + ":" + line : file + ":" + line + ":" + column;
        return place + ": " + what + "; " + remedy;
    }
}
