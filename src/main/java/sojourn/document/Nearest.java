package sojourn.document;

import java.util.Locale;
import java.util.Optional;

/** The known word that a misspelt one was probably meant to be. */
public final class Nearest {
    private static final int LONGEST = 100;

    private Nearest() {}

    /**
     * The known word at the least edit distance (insertion, deletion, substitution, swap of neighbours; capitals do not
     * count), the first of equals; empty if none is within 2 edits or a third of the word's length.
     */
    public static Optional<String> to(String word, Iterable<String> known) {
        Optional<String> nearest = Optional.empty();
        int least = Integer.MAX_VALUE;
        if (word.length() > LONGEST) {
            return nearest;
        }
        for (String candidate : known) {
            int distance = distance(word.toLowerCase(Locale.ROOT), candidate.toLowerCase(Locale.ROOT));
            int allowed = Math.max(2, word.length() / 3);
            boolean sharesSomething = distance < Math.min(word.length(), candidate.length());
            if (distance < least && distance <= allowed && sharesSomething) {
                nearest = Optional.of(candidate);
                least = distance;
            }
        }
        return nearest;
    }

    /** Optimal string alignment distance. */
    private static int distance(String a, String b) {
        int[] beforeLast = new int[b.length() + 1];
        int[] last = new int[b.length() + 1];
        for (int j = 0; j <= b.length(); j++) {
            last[j] = j;
        }
        for (int i = 1; i <= a.length(); i++) {
            int[] row = new int[b.length() + 1];
            row[0] = i;
            for (int j = 1; j <= b.length(); j++) {
                int substituted = last[j - 1] + (a.charAt(i - 1) == b.charAt(j - 1) ? 0 : 1);
                row[j] = Math.min(substituted, 1 + Math.min(last[j], row[j - 1]));
                boolean swapped =
                        i > 1 && j > 1 && a.charAt(i - 1) == b.charAt(j - 2) && a.charAt(i - 2) == b.charAt(j - 1);
                if (swapped) {
                    row[j] = Math.min(row[j], beforeLast[j - 2] + 1);
                }
            }
            beforeLast = last;
            last = row;
        }
        return last[b.length()];
    }
}
