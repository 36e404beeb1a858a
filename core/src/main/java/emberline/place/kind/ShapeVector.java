package emberline.place.kind;

/** The coordinates of one object in {@link ShapeSpace}; some may be missing. */
public final class ShapeVector {

    private final double[] values;
    private final double[] sigmas;

    /**
     * Coordinates with their errors.
     *
     * @param values one for each coordinate; NaN where it is missing
     * @param sigmas their one-sigma errors, as many
     * @throws IllegalArgumentException if the lengths differ
     */
    public ShapeVector(double[] values, double[] sigmas) {
        if (values.length != sigmas.length) {
            throw new IllegalArgumentException(
                    values.length + " values with " + sigmas.length + " errors: expected as many");
        }
        this.values = values.clone();
        this.sigmas = sigmas.clone();
    }

    /**
     * The number of coordinates, those that are missing included.
     *
     * @return zero or more
     */
    public int size() {
        return values.length;
    }

    /**
     * Whether a coordinate is there.
     *
     * @param coordinate index from 0
     * @return false where it is missing
     */
    public boolean has(int coordinate) {
        return Double.isFinite(values[coordinate]);
    }

    /**
     * A coordinate.
     *
     * @param coordinate index from 0
     * @return its value; NaN where it is missing
     */
    public double value(int coordinate) {
        return values[coordinate];
    }

    /**
     * The error of a coordinate.
     *
     * @param coordinate index from 0
     * @return one sigma, zero or more; 0 where none is known
     */
    public double sigma(int coordinate) {
        double sigma = sigmas[coordinate];
        return Double.isFinite(sigma) ? sigma : 0;
    }

    /**
     * How many coordinates are there.
     *
     * @return zero or more
     */
    public int present() {
        int count = 0;
        for (int k = 0; k < values.length; k++) {
            count += has(k) ? 1 : 0;
        }
        return count;
    }
}
