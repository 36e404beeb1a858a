package emberline.read;

import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * Columns of a list that look like misspelt known ones. A column that is not known is carried along
 * and not used, so that a parallax in {@code paralax_mas} would be lost without a word.
 */
public final class ColumnSpelling {

    /** Shorter parts of a name are symbols, such as the band in {@code z_mag}, not words. */
    private static final int SHORTEST_WORD = 3;

    private ColumnSpelling() {}

    /**
     * What to ask the observer about the columns of a list.
     *
     * @param columns names of its columns
     * @return a sentence for each column that may be misspelt
     */
    public static List<String> doubts(List<String> columns) {
        List<String> doubts = new ArrayList<>();
        List<String> known = CandidateListReader.knownColumns();
        List<String> unused = known.stream().filter(name -> !columns.contains(name)).toList();
        for (String column : columns) {
            if (!known.contains(column)) {
                meant(column, unused)
                        .ifPresent(
                                name ->
                                        doubts.add(
                                                "column '"
                                                        + column
                                                        + "' is not used, only carried along; did"
                                                        + " you mean "
                                                        + name
                                                        + "?"));
            }
        }
        return doubts;
    }

    /** The known column that a name was most likely meant to be. */
    static Optional<String> meant(String column, Collection<String> known) {
        String lower = column.trim().toLowerCase(Locale.ROOT).replace(' ', '_').replace('-', '_');
        if (known.contains(lower)) {
            return Optional.of(lower);
        }
        Optional<String> withoutUnit =
                known.stream().filter(name -> name.startsWith(lower + "_")).findFirst();
        if (withoutUnit.isPresent() && !lower.isEmpty()) {
            return withoutUnit;
        }
        return NearestWord.to(lower, known).filter(name -> differsInAWord(lower, name));
    }

    /** Whether a difference lies in words, not in a symbol such as that of a band. */
    private static boolean differsInAWord(String one, String two) {
        String[] parts = one.split("_", -1);
        String[] others = two.split("_", -1);
        if (parts.length != others.length) {
            return true;
        }
        for (int k = 0; k < parts.length; k++) {
            boolean symbol = Math.min(parts[k].length(), others[k].length()) < SHORTEST_WORD;
            if (symbol && !parts[k].equals(others[k])) {
                return false;
            }
        }
        return true;
    }
}
