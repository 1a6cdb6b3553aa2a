package sojourn.document;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** The known word that a misspelt one was probably meant to be. */
public final class Nearest {
    private static final int LONGEST = 100;
    private static final int SHORTEST_PART = 3;

    private Nearest() {}

    /**
     * The known word at the least edit distance (insertion, deletion, substitution, swap of neighbours; capitals do not
     * count), the first of equals, if one is within 2 edits or a third of the word's length; otherwise the only known word
     * that has it as a part between hyphens: {@code commission} for {@code commission-bps}. Empty if there is neither.
     */
    public static Optional<String> to(String word, Iterable<String> known) {
        if (word.length() > LONGEST) {
            return Optional.empty();
        }
        Optional<String> spelt = byDistance(word, known);
        return spelt.isPresent() ? spelt : whole(word, known);
    }

    /** "did you mean 'calm'? " or nothing. */
    public static String hint(String word, Iterable<String> known) {
        return to(word, known).map(near -> "did you mean '" + near + "'? ").orElse("");
    }

    private static Optional<String> whole(String part, Iterable<String> known) {
        if (part.length() < SHORTEST_PART) {
            return Optional.empty();
        }
        String sought = "-" + part.toLowerCase(Locale.ROOT).replace('_', '-') + "-";
        List<String> having = new ArrayList<>();
        for (String candidate : known) {
            if (("-" + candidate.toLowerCase(Locale.ROOT) + "-").contains(sought)) {
                having.add(candidate);
            }
        }
        return having.size() == 1 ? Optional.of(having.get(0)) : Optional.empty();
    }

    private static Optional<String> byDistance(String word, Iterable<String> known) {
        Optional<String> nearest = Optional.empty();
        int least = Integer.MAX_VALUE;
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
