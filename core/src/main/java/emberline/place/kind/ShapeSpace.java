package emberline.place.kind;

import emberline.measure.Measurements;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * The broad features by which kinds are told apart, as coordinates in which the reference objects
 * and any measured object have a place.
 *
 * <p>A coordinate is {@code asinh((x - m) / (3 s))}: {@code x} the feature, {@code m} its median
 * over the reference objects, {@code s} its scatter between like objects. Near the median it is a
 * difference in units of three scatters; far from it, where late T dwarfs lie hundreds of scatters
 * away, it grows as a logarithm, so that they do not press everything else into one point.
 */
public final class ShapeSpace {

    private static final double SCATTERS = 3;

    private final KindFeatures features;
    private final KinTable kin;
    private final int[] columns;
    private final double[] medians;

    private ShapeSpace(KindModel model) {
        this.features = model.features();
        this.kin = model.kin();
        this.columns = kin.columns();
        this.medians = Arrays.stream(columns).mapToDouble(this::median).toArray();
    }

    /**
     * A reference object.
     *
     * @param object name of its spectrum
     * @param typeNumber its published type (M0 = 0, L0 = 10, T0 = 20, Y0 = 30); empty where it has
     *     none on this scale
     * @param gravity its published gravity class; may be blank
     * @param kind what it is
     * @param source the data set that it comes from
     * @param shape its coordinates
     */
    public record Reference(
            String object,
            OptionalDouble typeNumber,
            String gravity,
            ObjectKind kind,
            String source,
            ShapeVector shape) {}

    /**
     * The space of the product's own reference objects.
     *
     * @return the space; empty where the model of kinds is missing
     */
    public static Optional<ShapeSpace> standard() {
        return KindModel.standard().map(ShapeSpace::new);
    }

    /**
     * The number of coordinates.
     *
     * @return a positive number
     */
    public int size() {
        return columns.length;
    }

    /**
     * The reference objects.
     *
     * @return all of them, in the order of the model
     */
    public List<Reference> references() {
        return kin.rows().stream()
                .map(
                        row ->
                                new Reference(
                                        row.object(),
                                        row.typeNumber(),
                                        row.gravity(),
                                        row.kind(),
                                        row.source(),
                                        shape(row.vector())))
                .toList();
    }

    /**
     * The coordinates of a measured object.
     *
     * @param measurements its features
     * @return coordinates; those of features that were not measured are missing
     */
    public ShapeVector of(Measurements measurements) {
        return shape(features.of(measurements));
    }

    private ShapeVector shape(FeatureVector vector) {
        double[] values = new double[columns.length];
        double[] sigmas = new double[columns.length];
        for (int k = 0; k < columns.length; k++) {
            double unit = SCATTERS * kin.scatter()[columns[k]];
            double t = (vector.values()[columns[k]] - medians[k]) / unit;
            double root = Math.sqrt(1 + t * t);
            values[k] = Math.signum(t) * Math.log(Math.abs(t) + root);
            sigmas[k] = vector.sigmas()[columns[k]] / unit / root;
        }
        return new ShapeVector(values, sigmas);
    }

    private double median(int column) {
        double[] sorted =
                kin.rows().stream()
                        .mapToDouble(row -> row.vector().values()[column])
                        .filter(value -> !Double.isNaN(value))
                        .sorted()
                        .toArray();
        return sorted.length == 0 ? 0 : sorted[sorted.length / 2];
    }
}
