package emberline.place.photometric;

import static org.junit.jupiter.api.Assertions.assertEquals;

import emberline.place.photometric.ColourCurve.Point;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Smooth curves through points whose curve is known. */
class ColourCurveTest {

    private static Point point(double type, double median, double objects) {
        return new Point(type, median, 0.1, objects);
    }

    /** A local line through points of a line is that line, whatever their weights. */
    @ParameterizedTest
    @ValueSource(doubles = {6, 7.3, 11, 12.8, 14})
    void aLineThroughPointsOfALineIsTheLine(double type) {
        List<Point> points =
                List.of(point(6, 0.8, 3), point(9, 1.4, 50), point(11, 1.8, 7), point(14, 2.4, 20));
        assertEquals(0.8 + 0.2 * (type - 6), ColourCurve.line(points, type, 1.5), 1e-12);
    }

    @Test
    void outsideTheTypesACurveStaysAsAtItsEnd() {
        List<Point> points = List.of(point(6, 0.8, 3), point(9, 1.4, 50), point(11, 1.8, 7));
        assertEquals(0.8, ColourCurve.line(points, 2, 1.5), 1e-12);
        assertEquals(1.8, ColourCurve.line(points, 30, 1.5), 1e-12);
        assertEquals(ColourCurve.mean(points, 6, 1.5), ColourCurve.mean(points, -5, 1.5), 1e-12);
        assertEquals(ColourCurve.mean(points, 11, 1.5), ColourCurve.mean(points, 12, 1.5), 1e-12);
    }

    @Test
    void onePointIsItsOwnCurve() {
        assertEquals(0.7, ColourCurve.line(List.of(point(8, 0.7, 5)), 8, 2), 1e-12);
        assertEquals(0.7, ColourCurve.mean(List.of(point(8, 0.7, 5)), 20, 2), 1e-12);
    }

    /**
     * Two points as far from the type count by their objects; ten are assumed where none are given.
     */
    @Test
    void aMeanIsWeightedByObjects() {
        List<Point> given = List.of(point(8, 1, 10), point(12, 2, 30));
        assertEquals(1.75, ColourCurve.mean(given, 10, 1.5), 1e-12);
        List<Point> notGiven = List.of(point(8, 1, Double.NaN), point(12, 2, 30));
        assertEquals(1.75, ColourCurve.mean(notGiven, 10, 1.5), 1e-12);
    }

    /** A point one width away counts exp(-1/2) of one that is there. */
    @Test
    void aMeanIsWeightedByDistance() {
        List<Point> points = List.of(point(8, 1, 10), point(10, 2, 10));
        double far = Math.exp(-0.5);
        assertEquals((1 + 2 * far) / (1 + far), ColourCurve.mean(points, 8, 2), 1e-12);
        assertEquals((far + 2) / (1 + far), ColourCurve.mean(points, 10, 2), 1e-12);
    }

    /** The error of a median of n is sqrt(pi / 2 / n) of the scatter. */
    @Test
    void theScatterHoldsTheErrorOfTheMedian() {
        List<Point> one = List.of(point(8, 1, 25));
        double expected = 0.1 * Math.sqrt(1 + Math.PI / 2 / 25);
        assertEquals(expected, ColourCurve.scatter(one, 8, 1.5, 0.02, 0), 1e-12);
        List<Point> assumed = List.of(new Point(8, 1, Double.NaN, 25));
        assertEquals(0.7 * expected, ColourCurve.scatter(assumed, 8, 1.5, 0.02, 0), 1e-12);
        assertEquals(2 * expected, ColourCurve.scatter(one, 8, 1.5, 0.2, 0), 1e-12);
    }

    @Test
    void theScatterGrowsOutsideTheTypes() {
        List<Point> points = List.of(point(8, 1, 1e9), point(10, 1, 1e9));
        double outside = ColourCurve.scatter(points, 13, 1.5, 0.02, 0.1);
        assertEquals(Math.sqrt(0.1 * 0.1 + 0.3 * 0.3), outside, 1e-6);
        assertEquals(
                Math.sqrt(0.1 * 0.1 + 0.2 * 0.2),
                ColourCurve.scatter(points, 6, 1.5, 0.02, 0.1),
                1e-6);
    }

    /** Variances are averaged, by the same weights as medians. */
    @Test
    void scattersAreAveragedByWeight() {
        List<Point> points = List.of(new Point(8, 1, 0.1, 1e9), new Point(12, 1, 0.3, 3e9));
        double variance = (0.01 + 3 * 0.09) / 4;
        assertEquals(Math.sqrt(variance), ColourCurve.scatter(points, 10, 1.5, 0.02, 0), 1e-6);
    }

    @Test
    void aShiftedPointKeepsAllElse() {
        assertEquals(new Point(8, 0.75, 0.1, 5), point(8, 1, 5).less(0.25));
    }
}
