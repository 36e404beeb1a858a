package emberline.survey.map;

import emberline.measure.Measurements;
import emberline.place.kind.ShapeSpace;
import emberline.place.kind.ShapeSpace.Reference;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * The axes of the survey map: the principal axes of the reference objects of the product, the same
 * in every survey, so that an object has its place on its own and maps of two surveys can be laid
 * on each other.
 */
public final class SurveyAxes {

    /** Number of axes that are kept; the map shows the first, the neighbours rest on all. */
    public static final int COUNT = 6;

    private final ShapeSpace space;
    private final PrincipalAxes axes;
    private final List<Placed> references;

    private SurveyAxes(ShapeSpace space) {
        this.space = space;
        List<Reference> all = space.references();
        this.axes = PrincipalAxes.of(all.stream().map(Reference::shape).toList(), COUNT);
        List<Placed> placed = new ArrayList<>();
        for (Reference reference : all) {
            axes.scores(reference.shape())
                    .ifPresent(scores -> placed.add(new Placed(reference, scores)));
        }
        this.references = List.copyOf(placed);
    }

    /** A reference object with its place. */
    public static final class Placed {

        private final Reference reference;
        private final double[] scores;

        private Placed(Reference reference, double[] scores) {
            this.reference = reference;
            this.scores = scores;
        }

        /**
         * The reference object.
         *
         * @return what is known of it
         */
        public Reference reference() {
            return reference;
        }

        /**
         * Its place.
         *
         * @return one score an axis
         */
        public double[] scores() {
            return scores.clone();
        }
    }

    private static final class Holder {
        static final Optional<SurveyAxes> STANDARD = ShapeSpace.standard().map(SurveyAxes::new);
    }

    /**
     * The axes of the product; found at the first call.
     *
     * @return the axes; empty where the model of kinds is missing
     */
    public static Optional<SurveyAxes> standard() {
        return Holder.STANDARD;
    }

    /**
     * The reference objects that have a place.
     *
     * @return in the order of the model
     */
    public List<Placed> references() {
        return references;
    }

    /**
     * The share of the variance of the reference objects along an axis.
     *
     * @param axis index from 0
     * @return 0 to 1
     */
    public double share(int axis) {
        return axes.share(axis);
    }

    /**
     * The place of an object.
     *
     * @param measurements its features
     * @return one score an axis; empty where too little was measured
     */
    public Optional<double[]> scores(Measurements measurements) {
        return axes.scores(space.of(measurements));
    }
}
