package org.wintersill.problem;

import java.util.Collection;
import java.util.Comparator;
import java.util.Locale;
import java.util.Optional;

/** Finds the known name that was probably meant, by edit distance (Levenshtein 1966), for messages. */
public final class NearestName {
    private NearestName() {
    }

    /** The nearest known name if it is near enough to be a slip of the finger: at most a third of its letters differ. */
    public static Optional<String> of(String written, Collection<String> known) {
        String lower = written.toLowerCase(Locale.ROOT);
        return known.stream()
                .min(Comparator.<String>comparingInt(name -> distance(lower, name.toLowerCase(Locale.ROOT)))
                        .thenComparing(Comparator.naturalOrder()))
                .filter(name -> distance(lower, name.toLowerCase(Locale.ROOT)) <= Math.max(2, name.length() / 3));
    }

    /** Number of single-letter insertions, deletions and replacements between two texts. */
    static int distance(String a, String b) {
        int[] previous = new int[b.length() + 1];
        for (int j = 0; j <= b.length(); j++) {
            previous[j] = j;
        }
        for (int i = 1; i <= a.length(); i++) {
            int[] current = new int[b.length() + 1];
            current[0] = i;
            for (int j = 1; j <= b.length(); j++) {
                int replaced = previous[j - 1] + (a.charAt(i - 1) == b.charAt(j - 1) ? 0 : 1);
                current[j] = Math.min(replaced, 1 + Math.min(previous[j], current[j - 1]));
            }
            previous = current;
        }
        return previous[b.length()];
    }
}
