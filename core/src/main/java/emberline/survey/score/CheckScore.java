package emberline.survey.score;

import emberline.place.GravityClass;
import emberline.survey.Status;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.stream.Stream;
import org.apache.commons.math3.distribution.NormalDistribution;

/**
 * The score of the product on a list of known objects.
 *
 * @param objects every object of the list in its order
 * @param types scores of the types: all dwarfs, those of M4 and later, and of these the ones whose
 *     label is good or fair
 * @param divisions scores of the types by one property at a time
 * @param coverage how often the known type lies inside an interval of a nominal share
 * @param gravity gravity classes of dwarfs from M6 to L7, known against found
 * @param kind late dwarfs against other objects
 * @param metallicity metallicity classes, known against found
 * @param outliers objects that are off by more than two subclasses or three sigma, the farthest
 *     first
 */
public record CheckScore(
        List<ScoredObject> objects,
        List<TypeScore> types,
        List<Division> divisions,
        List<CoveragePoint> coverage,
        Confusion gravity,
        KindScore kind,
        Confusion metallicity,
        List<ScoredObject> outliers) {

    private static final double OFF_SUBCLASS = 2;
    private static final double OFF_SIGMA = 3;
    private static final double FIRST_WITH_GRAVITY = 6;
    private static final double LAST_WITH_GRAVITY = 17;
    private static final List<String> GOOD_OR_FAIR = List.of("A", "B");

    /** Copies the lists. */
    public CheckScore {
        objects = List.copyOf(objects);
        types = List.copyOf(types);
        divisions = List.copyOf(divisions);
        coverage = List.copyOf(coverage);
        outliers = List.copyOf(outliers);
    }

    /**
     * How often the known type lies inside an interval.
     *
     * @param nominal share that the interval claims, 0 to 1
     * @param actual share of objects whose known type is inside
     */
    public record CoveragePoint(double nominal, double actual) {}

    /**
     * Scores a list.
     *
     * @param objects its objects in their order
     * @return the score
     */
    public static CheckScore of(List<ScoredObject> objects) {
        List<ScoredObject> late = objects.stream().filter(o -> o.known().isLateDwarf()).toList();
        List<ScoredObject> good =
                late.stream().filter(o -> GOOD_OR_FAIR.contains(o.tier())).toList();
        List<TypeScore> types = new ArrayList<>();
        types.add(TypeScore.of("all dwarfs", objects));
        types.add(TypeScore.of("M4 and later", late));
        if (!good.isEmpty()) {
            types.add(TypeScore.of("M4 and later, tiers A and B", good));
        }
        return new CheckScore(
                objects,
                types,
                Division.all(objects),
                coverage(objects),
                gravity(objects),
                KindScore.of(objects),
                metallicity(objects),
                outliers(objects));
    }

    /**
     * Objects of the list that failed.
     *
     * @return their number
     */
    public long failed() {
        return objects.stream().filter(o -> o.status() == Status.FAILED).count();
    }

    /**
     * The dwarfs of known type that were given one.
     *
     * @return objects in the order of the list
     */
    public List<ScoredObject> typedDwarfs() {
        return typed(objects).toList();
    }

    private static Stream<ScoredObject> typed(List<ScoredObject> objects) {
        return objects.stream()
                .filter(ScoredObject::countsForTypes)
                .filter(o -> o.difference().isPresent());
    }

    /** With normal errors of the stated sigma, as far as intervals other than 68 and 95% go. */
    private static List<CoveragePoint> coverage(List<ScoredObject> objects) {
        double[] pulls =
                typed(objects).mapToDouble(o -> Math.abs(o.pull().orElseThrow())).toArray();
        if (pulls.length == 0) {
            return List.of();
        }
        NormalDistribution normal = new NormalDistribution(null, 0, 1);
        List<CoveragePoint> points = new ArrayList<>();
        for (int percent = 2; percent < 100; percent += 2) {
            double reach = normal.inverseCumulativeProbability(0.5 + percent / 200.0);
            double inside = Arrays.stream(pulls).filter(pull -> pull <= reach).count();
            points.add(new CoveragePoint(percent / 100.0, inside / pulls.length));
        }
        return points;
    }

    private static Confusion gravity(List<ScoredObject> objects) {
        List<String> classes =
                Arrays.stream(GravityClass.values()).map(GravityClass::label).toList();
        List<ScoredObject> inRange =
                objects.stream()
                        .filter(ScoredObject::countsForTypes)
                        .filter(o -> o.known().typeNumber().getAsDouble() >= FIRST_WITH_GRAVITY)
                        .filter(o -> o.known().typeNumber().getAsDouble() <= LAST_WITH_GRAVITY)
                        .toList();
        return Confusion.of(
                inRange,
                classes,
                classes,
                o -> o.known().gravity().isBlank() ? "not stated" : o.known().gravity(),
                o -> o.found().gravity().map(GravityClass::label).orElse(""));
    }

    private static Confusion metallicity(List<ScoredObject> objects) {
        List<String> classes = List.of("d", "sd", "esd", "usd");
        return Confusion.of(
                objects.stream().filter(o -> o.known().metallicity().isPresent()).toList(),
                classes,
                classes,
                o -> o.known().metallicity().orElseThrow().prefix(),
                o -> o.found().metallicity().map(name -> name.prefix()).orElse(""));
    }

    private static List<ScoredObject> outliers(List<ScoredObject> objects) {
        return typed(objects)
                .filter(
                        o ->
                                Math.abs(o.difference().orElseThrow()) > OFF_SUBCLASS
                                        || Math.abs(o.pull().orElseThrow()) > OFF_SIGMA)
                .sorted(
                        Comparator.comparingDouble(
                                        (ScoredObject o) -> -Math.abs(o.difference().orElseThrow()))
                                .thenComparing(ScoredObject::name))
                .toList();
    }
}
