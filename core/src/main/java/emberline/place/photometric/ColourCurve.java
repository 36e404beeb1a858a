package emberline.place.photometric;

import java.util.List;

/**
 * How one colour of one gravity class runs along the sequence: straight lines fitted to the medians
 * around each type, weighted by the number of objects, so that a median of a few objects does not
 * make a step.
 */
final class ColourCurve {

    /** Objects and scatter (mag) that stand for a template printed without them. */
    private static final double OBJECTS_NOT_GIVEN = 10;

    private static final double SCATTER_NOT_GIVEN = 0.07;

    /** The error of a median in units of that of a mean, for normal deviates. */
    private static final double MEDIAN_ERROR = Math.sqrt(Math.PI / 2);

    private ColourCurve() {}

    /**
     * A median of the table.
     *
     * @param typeNumber type (M0 = 0)
     * @param median colour (mag)
     * @param scatter scatter of objects (mag); NaN where it is not given
     * @param objects their number; NaN where it is not given
     */
    record Point(double typeNumber, double median, double scatter, double objects) {

        double weight() {
            return Double.isNaN(objects) ? OBJECTS_NOT_GIVEN : objects;
        }

        double sigma() {
            return Double.isNaN(scatter) ? SCATTER_NOT_GIVEN : scatter;
        }

        Point less(double shift) {
            return new Point(typeNumber, median - shift, scatter, objects);
        }
    }

    /** The weight of a point seen from a type. */
    private static double weight(Point point, double type, double width) {
        double off = (point.typeNumber - type) / width;
        return point.weight() * Math.exp(-off * off / 2);
    }

    /**
     * The median at a type by a local straight line; beyond the table that at its end.
     *
     * @param points medians in order of type, at least one
     * @param typeNumber the type
     * @param width one sigma of the normal weights (subclass)
     * @return colour (mag)
     */
    static double line(List<Point> points, double typeNumber, double width) {
        double type = inside(points, typeNumber);
        double sum = 0;
        double x = 0;
        double y = 0;
        for (Point point : points) {
            double w = weight(point, type, width);
            sum += w;
            x += w * point.typeNumber;
            y += w * point.median;
        }
        x /= sum;
        y /= sum;
        double xx = 0;
        double xy = 0;
        for (Point point : points) {
            double w = weight(point, type, width);
            xx += w * (point.typeNumber - x) * (point.typeNumber - x);
            xy += w * (point.typeNumber - x) * (point.median - y);
        }
        return xx > 1e-9 * sum ? y + xy / xx * (type - x) : y;
    }

    /**
     * The median at a type by a local mean, for what hardly changes.
     *
     * @param points medians in order of type, at least one
     * @param typeNumber the type
     * @param width one sigma of the normal weights (subclass)
     * @return colour (mag)
     */
    static double mean(List<Point> points, double typeNumber, double width) {
        double type = inside(points, typeNumber);
        double sum = 0;
        double y = 0;
        for (Point point : points) {
            double w = weight(point, type, width);
            sum += w;
            y += w * point.median;
        }
        return y / sum;
    }

    /**
     * The scatter of objects about the curve, with the error of the median itself.
     *
     * @param points medians in order of type, at least one
     * @param typeNumber the type
     * @param width one sigma of the normal weights (subclass)
     * @param floor least scatter (mag)
     * @param beyond what each subclass beyond the table adds in quadrature (mag)
     * @return one sigma (mag)
     */
    static double scatter(
            List<Point> points, double typeNumber, double width, double floor, double beyond) {
        double type = inside(points, typeNumber);
        double sum = 0;
        double variance = 0;
        for (Point point : points) {
            double w = weight(point, type, width);
            sum += w;
            variance += w * point.sigma() * point.sigma();
        }
        variance = Math.max(variance / sum, floor * floor);
        double ofMedian = MEDIAN_ERROR * MEDIAN_ERROR * variance / sum;
        double outside = beyond * (typeNumber - type);
        return Math.sqrt(variance + ofMedian + outside * outside);
    }

    private static double inside(List<Point> points, double typeNumber) {
        double first = points.get(0).typeNumber;
        double last = points.get(points.size() - 1).typeNumber;
        return Math.max(first, Math.min(last, typeNumber));
    }
}
