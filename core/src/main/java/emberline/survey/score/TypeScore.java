package emberline.survey.score;

import emberline.place.TypeEstimate;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/**
 * How well the types of some objects are recovered.
 *
 * @param label which objects
 * @param objects how many of them have a known type
 * @param typed how many of these were given a type
 * @param figures the figures of those that were; empty where none was
 */
public record TypeScore(String label, int objects, int typed, Optional<Figures> figures) {

    /** Scale of the median absolute deviation to sigma of a normal distribution. */
    private static final double MAD_TO_SIGMA = 1.4826;

    /**
     * Figures of found minus known types.
     *
     * @param bias mean difference (subclass)
     * @param rms root of the mean squared difference (subclass)
     * @param medianAbsolute median of the absolute difference (subclass)
     * @param robustScatter 1.4826 times the median absolute deviation from the median (subclass)
     * @param medianSigma median of the stated one-sigma errors (subclass)
     * @param inside68 share of known types inside the stated 68% interval, ends included, 0 to 1
     * @param inside95 the same for the 95% interval
     */
    public record Figures(
            double bias,
            double rms,
            double medianAbsolute,
            double robustScatter,
            double medianSigma,
            double inside68,
            double inside95) {}

    /**
     * The score of some objects.
     *
     * @param label which objects
     * @param objects the objects; those that {@link ScoredObject#countsForTypes do not count} are
     *     passed over
     * @return their score
     */
    public static TypeScore of(String label, List<ScoredObject> objects) {
        List<ScoredObject> known = objects.stream().filter(ScoredObject::countsForTypes).toList();
        List<ScoredObject> typed =
                known.stream().filter(o -> o.found().type().isPresent()).toList();
        return new TypeScore(
                label,
                known.size(),
                typed.size(),
                typed.isEmpty() ? Optional.empty() : Optional.of(figures(typed)));
    }

    private static Figures figures(List<ScoredObject> typed) {
        double[] off = typed.stream().mapToDouble(o -> o.difference().orElseThrow()).toArray();
        double middle = median(off);
        return new Figures(
                Arrays.stream(off).average().orElseThrow(),
                Math.sqrt(Arrays.stream(off).map(x -> x * x).average().orElseThrow()),
                median(Arrays.stream(off).map(Math::abs).toArray()),
                MAD_TO_SIGMA * median(Arrays.stream(off).map(x -> Math.abs(x - middle)).toArray()),
                median(
                        typed.stream()
                                .mapToDouble(o -> o.found().type().orElseThrow().sigmaSubclass())
                                .toArray()),
                share(typed, TypeScore::isInside68),
                share(typed, TypeScore::isInside95));
    }

    private interface Inside {
        boolean test(TypeEstimate found, double known);
    }

    private static boolean isInside68(TypeEstimate found, double known) {
        return found.lo68() <= known && known <= found.hi68();
    }

    private static boolean isInside95(TypeEstimate found, double known) {
        return found.lo95() <= known && known <= found.hi95();
    }

    private static double share(List<ScoredObject> typed, Inside inside) {
        long count =
                typed.stream()
                        .filter(
                                o ->
                                        inside.test(
                                                o.found().type().orElseThrow(),
                                                o.known().typeNumber().orElseThrow()))
                        .count();
        return (double) count / typed.size();
    }

    /** The median; the mean of the two middle values of an even number. */
    static double median(double[] values) {
        double[] sorted = values.clone();
        Arrays.sort(sorted);
        int middle = sorted.length / 2;
        return sorted.length % 2 == 1 ? sorted[middle] : (sorted[middle - 1] + sorted[middle]) / 2;
    }
}
