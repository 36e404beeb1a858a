package emberline.read;

import java.util.Collection;
import java.util.Locale;
import java.util.Optional;

/**
 * The known word that a misspelt one was most likely meant to be: the one with the fewest letters
 * changed, left out, put in or swapped with their neighbour, without regard to case (optimal string
 * alignment distance, Damerau 1964). More than a third of the letters may not be wrong.
 */
public final class NearestWord {

    private static final int LETTERS_PER_FAULT = 3;

    private NearestWord() {}

    /**
     * Looks for a word.
     *
     * @param written as it was written
     * @param known what could have been meant; of two that are as near the first counts
     * @return the nearest, as known; empty where none is near enough or nothing was written
     */
    public static Optional<String> to(String written, Collection<String> known) {
        String word = written.toLowerCase(Locale.ROOT);
        int fewest = Math.max(1, word.length() / LETTERS_PER_FAULT) + 1;
        Optional<String> nearest = Optional.empty();
        for (String candidate : known) {
            int faults = distance(word, candidate.toLowerCase(Locale.ROOT), fewest);
            if (faults < fewest && faults < word.length()) {
                fewest = faults;
                nearest = Optional.of(candidate);
            }
        }
        return nearest;
    }

    /** The distance, or a number of at least {@code limit} where it is that or more. */
    private static int distance(String one, String two, int limit) {
        if (Math.abs(one.length() - two.length()) >= limit) {
            return limit;
        }
        int[] beforeLast = new int[two.length() + 1];
        int[] last = new int[two.length() + 1];
        for (int j = 0; j < last.length; j++) {
            last[j] = j;
        }
        for (int i = 1; i <= one.length(); i++) {
            int[] row = new int[two.length() + 1];
            row[0] = i;
            for (int j = 1; j <= two.length(); j++) {
                int other = one.charAt(i - 1) == two.charAt(j - 1) ? 0 : 1;
                row[j] = Math.min(last[j - 1] + other, Math.min(last[j] + 1, row[j - 1] + 1));
                boolean swapped =
                        i > 1
                                && j > 1
                                && one.charAt(i - 1) == two.charAt(j - 2)
                                && one.charAt(i - 2) == two.charAt(j - 1);
                if (swapped) {
                    row[j] = Math.min(row[j], beforeLast[j - 2] + 1);
                }
            }
            beforeLast = last;
            last = row;
        }
        return last[two.length()];
    }
}
