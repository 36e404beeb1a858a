package emberline.survey.score;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.function.Function;

/**
 * How often objects of each known class were given each class.
 *
 * @param rows for each known class the number of objects by the class that was found; the columns
 *     are those of {@code found}
 * @param found the classes that can be found, in the order of the columns
 */
public record Confusion(Map<String, List<Integer>> rows, List<String> found) {

    /** The column of objects of which the class was not judged. */
    public static final String NOT_JUDGED = "not judged";

    /** Copies the collections. */
    public Confusion {
        Map<String, List<Integer>> copy = new LinkedHashMap<>();
        rows.forEach((known, counts) -> copy.put(known, List.copyOf(counts)));
        rows = java.util.Collections.unmodifiableMap(copy);
        found = List.copyOf(found);
    }

    /**
     * Counts objects.
     *
     * @param objects the objects
     * @param knownOrder known classes that go first, in this order
     * @param foundOrder classes to be found that go first
     * @param known the known class of an object
     * @param called the class that was found; blank where it was not judged
     */
    static Confusion of(
            List<ScoredObject> objects,
            List<String> knownOrder,
            List<String> foundOrder,
            Function<ScoredObject, String> known,
            Function<ScoredObject, String> called) {
        List<String> columns = new ArrayList<>(foundOrder);
        objects.stream()
                .map(called)
                .filter(word -> !word.isBlank() && !foundOrder.contains(word))
                .distinct()
                .sorted()
                .forEach(columns::add);
        columns.add(NOT_JUDGED);
        List<String> classes = new ArrayList<>(knownOrder);
        objects.stream()
                .map(known)
                .filter(word -> !knownOrder.contains(word))
                .distinct()
                .sorted()
                .forEach(classes::add);
        Map<String, List<Integer>> rows = new LinkedHashMap<>();
        for (String one : classes) {
            int[] counts = new int[columns.size()];
            objects.stream()
                    .filter(o -> known.apply(o).equals(one))
                    .map(called)
                    .forEach(word -> counts[columns.indexOf(word.isBlank() ? NOT_JUDGED : word)]++);
            List<Integer> row = java.util.Arrays.stream(counts).boxed().toList();
            if (row.stream().anyMatch(count -> count > 0)) {
                rows.put(one, row);
            }
        }
        return new Confusion(rows, columns);
    }

    /**
     * The number of objects of a known class that were given a class.
     *
     * @param known a known class
     * @param called a class that can be found
     * @return their number; 0 for a class that does not occur
     */
    public int count(String known, String called) {
        int column = found.indexOf(called);
        return column < 0 || !rows.containsKey(known) ? 0 : rows.get(known).get(column);
    }

    /**
     * The number of objects of a known class that were judged.
     *
     * @param known a known class
     * @return their number
     */
    public int judged(String known) {
        return rows.containsKey(known)
                ? rows.get(known).stream().mapToInt(Integer::intValue).sum()
                        - count(known, NOT_JUDGED)
                : 0;
    }
}
