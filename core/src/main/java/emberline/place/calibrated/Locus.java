package emberline.place.calibrated;

/**
 * How one feature runs along the sequence of types: its mean at field gravity, the shift of the
 * mean at very low gravity, and the scatter of single objects about it, at the knots from M0 to Y1
 * in steps of half a subclass.
 */
final class Locus {

    private final String feature;
    private final double[] field;
    private final double[] lowGravityShift;
    private final double[] scatter;

    /**
     * A locus.
     *
     * @param feature id of the feature
     * @param field mean at field gravity, one value a knot, in the unit of the feature
     * @param lowGravityShift what very low gravity adds to it; intermediate gravity adds half
     * @param scatter one-sigma scatter of objects, positive, without noise and label errors, with
     *     the uncertainty of the mean
     */
    Locus(String feature, double[] field, double[] lowGravityShift, double[] scatter) {
        if (field.length != TypeKnots.COUNT
                || lowGravityShift.length != TypeKnots.COUNT
                || scatter.length != TypeKnots.COUNT) {
            throw new IllegalArgumentException(
                    "locus of " + feature + ": expected " + TypeKnots.COUNT + " knots");
        }
        this.feature = feature;
        this.field = field.clone();
        this.lowGravityShift = lowGravityShift.clone();
        this.scatter = scatter.clone();
    }

    /**
     * The feature.
     *
     * @return feature id
     */
    String feature() {
        return feature;
    }

    /**
     * The mean at a knot.
     *
     * @param knot index of the knot
     * @param lowGravity 0 field, 0.5 intermediate, 1 very low
     * @return expected value of the feature
     */
    double mean(int knot, double lowGravity) {
        return field[knot] + lowGravity * lowGravityShift[knot];
    }

    /**
     * What very low gravity adds to the mean at a knot.
     *
     * @param knot index of the knot
     * @return expected difference to field gravity
     */
    double shift(int knot) {
        return lowGravityShift[knot];
    }

    /**
     * How steep the mean runs with type at a type.
     *
     * @param typeNumber type number (M0 = 0)
     * @return change of the expected value a subclass, over the subclass around that type
     */
    double slope(double typeNumber) {
        return TypeKnots.slope(field, typeNumber);
    }

    /**
     * What very low gravity adds to the mean at a type.
     *
     * @param typeNumber type number (M0 = 0)
     * @return expected difference to field gravity
     */
    double shift(double typeNumber) {
        return TypeKnots.read(lowGravityShift, typeNumber);
    }

    /**
     * The mean at a type.
     *
     * @param typeNumber type number (M0 = 0)
     * @param lowGravity 0 field, 0.5 intermediate, 1 very low
     * @return expected value of the feature
     */
    double mean(double typeNumber, double lowGravity) {
        return TypeKnots.read(field, typeNumber)
                + lowGravity * TypeKnots.read(lowGravityShift, typeNumber);
    }

    /**
     * The scatter at a knot.
     *
     * @param knot index of the knot
     * @return one-sigma scatter of objects about the mean
     */
    double scatter(int knot) {
        return scatter[knot];
    }

    /**
     * The scatter at a type.
     *
     * @param typeNumber type number (M0 = 0)
     * @return one-sigma scatter of objects about the mean
     */
    double scatter(double typeNumber) {
        return TypeKnots.read(scatter, typeNumber);
    }
}
