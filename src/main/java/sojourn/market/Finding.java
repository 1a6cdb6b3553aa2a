package sojourn.market;

/**
 * Something about the input that is worth a look but can be worked with.
 *
 * @param file the file, as the strategy file names it; empty if it belongs to none
 * @param line 1-based; 0 if it belongs to the file as a whole
 * @param what what was found, with its count and its dates
 * @param suggestion what to look at or to do
 */
public record Finding(String file, int line, String what, String suggestion) {
    /** {@code file.csv:12: what was found; what to do}. */
    @Override
    public String toString() {
        String place = line == 0 ? file : file + ":" + line;
        return (place.isEmpty() ? "" : place + ": ") + what + "; " + suggestion;
    }
}
