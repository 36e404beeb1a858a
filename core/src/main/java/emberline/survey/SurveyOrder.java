package emberline.survey;

import java.util.Comparator;
import java.util.List;
import java.util.OptionalDouble;
import java.util.stream.IntStream;

/** The order in which the objects of a survey should be looked at. */
public final class SurveyOrder {

    private SurveyOrder() {}

    /**
     * Ranks by score, the greatest first. Objects of equal score keep the order of the list;
     * objects without a score come last, in the order of the list.
     *
     * @param scores one score an object in the order of the list; empty where it could not be
     *     judged
     * @return the rank of each object in the order of the list, from 1 without gaps
     */
    public static int[] ranks(List<OptionalDouble> scores) {
        int[] order =
                IntStream.range(0, scores.size())
                        .boxed()
                        .sorted(
                                Comparator.comparingDouble(
                                        i -> -scores.get(i).orElse(Double.NEGATIVE_INFINITY)))
                        .mapToInt(Integer::intValue)
                        .toArray();
        int[] ranks = new int[order.length];
        for (int place = 0; place < order.length; place++) {
            ranks[order[place]] = place + 1;
        }
        return ranks;
    }
}
