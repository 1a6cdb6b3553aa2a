package sojourn.document;

import java.util.Locale;
import java.util.regex.Pattern;

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
    /** Characters that would act on a terminal instead of showing: controls, line ends, changes of the writing direction. */
    private static final Pattern ACTING =
            Pattern.compile("[\\x{0}-\\x{1f}\\x{7f}-\\x{9f}\\x{2028}-\\x{202e}\\x{2066}-\\x{2069}]");

    /** Writes characters that would not show as their code, {@code \u001B}, so that a message stays one line of text. */
    public Problem {
        what = shown(what);
        remedy = shown(remedy);
    }

    private static String shown(String text) {
        return ACTING.matcher(text)
                .replaceAll(found -> String.format(
                        Locale.ROOT, "\\\\u%04X", (int) found.group().charAt(0)));
    }

    /** {@code file.yaml:12:7: what is wrong; what to do}. */
    @Override
    public String toString() {
        String place = line == 0 ? file : column == 0 ? file + ":" + line : file + ":" + line + ":" + column;
        return place + ": " + what + "; " + remedy;
    }
}
