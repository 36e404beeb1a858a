package emberline.place.calibrated;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.place.calibrated.TrainingSet.Point;
import java.util.ArrayList;
import java.util.List;
import java.util.function.DoubleBinaryOperator;
import org.junit.jupiter.api.Test;

/** Loci of values without chance, for which the fit can be told beforehand. */
class LocusFitKnownTest {

    private static List<Point> even(
            DoubleBinaryOperator value, int perSubclass, double noise, double ownScatter) {
        List<Point> points = new ArrayList<>();
        for (int i = 0; i <= 31 * perSubclass; i++) {
            double type = i / (double) perSubclass;
            double lowGravity = i % 2;
            points.add(
                    new Point(
                            type,
                            lowGravity,
                            1,
                            value.applyAsDouble(type, lowGravity),
                            noise,
                            ownScatter));
        }
        return points;
    }

    @Test
    void aStraightLineIsFoundToTheEnds() {
        Locus locus = LocusFit.fit("invented", even((type, g) -> 1 + 0.1 * type, 20, 0, 0));
        for (int k = 0; k < TypeKnots.COUNT; k++) {
            double type = TypeKnots.typeNumber(k);
            assertEquals(1 + 0.1 * type, locus.mean(k, 0), 1e-4, "type " + type);
            assertEquals(0, locus.shift(k), 1e-4, "type " + type);
            assertTrue(locus.scatter(k) >= 1e-4 && locus.scatter(k) < 2e-3, "type " + type);
        }
    }

    /** The shift fades in from M2 to M4 and out from L8 to T0. */
    @Test
    void theShiftOfGravityFadesInAndOut() {
        Locus locus = LocusFit.fit("invented", even((type, g) -> 1 + 0.1 * g, 40, 0, 0));
        double[][] expected = {
            {1.5, 0},
            {2, 0},
            {2.5, 0.25},
            {3, 0.5},
            {4, 1},
            {10, 1},
            {18, 1},
            {18.5, 0.75},
            {19, 0.5},
            {20, 0},
            {20.5, 0}
        };
        for (double[] one : expected) {
            assertEquals(0.1 * one[1], locus.shift(one[0]), 1e-3, "type " + one[0]);
        }
    }

    /**
     * Values that are means of objects which scatter by 0.2: the weights of normal residuals are
     * allowed for by 1.25, and n effective spectra by n / (n - 2), n being 2 sqrt(pi) widths of the
     * kernel. The kernel narrows from 2 at L7 to 1.2 at T1.
     */
    @Test
    void theScatterOfMeansIsTheScatterOfTheLocus() {
        double[][] typesAndWidths = {{12, 2}, {17, 2}, {18, 1.8}, {20, 1.4}, {21, 1.2}, {24, 1.2}};
        for (double[] one : typesAndWidths) {
            double variance = variance(one[1]);
            double ofMean = variance * varianceOfMean(one[1]);
            String where = "type " + one[0];
            assertEquals(Math.sqrt(variance + ofMean), scatter(one[0], 0), 2e-4, where);
            assertEquals(Math.sqrt(variance - 0.01 + ofMean), scatter(one[0], 0.1), 2e-4, where);
            assertEquals(
                    Math.sqrt(0.35 * variance + ofMean),
                    scatter(one[0], 0.5),
                    2e-4,
                    "65% at most, " + where);
        }
    }

    private static double variance(double width) {
        double effective = 2 * Math.sqrt(Math.PI) * width * 20;
        return 0.04 * 1.25 * effective / (effective - 2);
    }

    /**
     * Variance of the fitted mean for values of variance 1 at 20 a subclass: 27 / (32 sqrt(pi)) a
     * spectrum in a width for a normal kernel and a parabola, and 1 / (2 sqrt(pi)) for the gravity
     * shift, half of the spectra being of low gravity.
     */
    private static double varianceOfMean(double width) {
        return (27.0 / 32 + 1.0 / 2) / Math.sqrt(Math.PI) / (width * 20);
    }

    private static double scatter(double type, double noise) {
        return LocusFit.fit("invented", even((t, g) -> 1, 20, noise, 0.2)).scatter(type);
    }

    /** What the error of types makes of a slope, and that of gravity of a shift, is taken off. */
    @Test
    void theScatterIsClearedOfLabels() {
        double variance = variance(2) * (1 + varianceOfMean(2));
        double slope = LocusFit.fit("invented", even((t, g) -> 0.3 * t, 20, 0, 0.2)).scatter(12.0);
        assertEquals(Math.sqrt(variance - Math.pow(0.35 * 0.3, 2)), slope, 4e-4);
        double shift = LocusFit.fit("invented", even((t, g) -> 0.6 * g, 20, 0, 0.2)).scatter(12.0);
        assertEquals(Math.sqrt(variance - Math.pow(0.2 * 0.6, 2)), shift, 2e-3);
    }

    /** Between two crowds the kernel widens until it sees both, and the locus runs straight. */
    @Test
    void whereSpectraAreScarceTheKernelWidens() {
        List<Point> points = new ArrayList<>();
        for (int i = 0; i < 40; i++) {
            points.add(new Point(9, 0, 1, 1, 0, 0));
            points.add(new Point(17, 0, 1, 2, 0, 0));
        }
        Locus locus = LocusFit.fit("invented", points);
        assertEquals(1.5, locus.mean(13.0, 0), 1e-2);
        assertEquals(1, locus.mean(9.0, 0), 1e-2);
        assertEquals(2, locus.mean(17.0, 0), 1e-2);
        for (int k = 0; k < TypeKnots.COUNT; k++) {
            assertTrue(Double.isFinite(locus.mean(k, 1)) && locus.scatter(k) > 0, "knot " + k);
        }
    }

    /** Three quarters of the weight say 1, one quarter says 0: the mean leans to the heavier. */
    @Test
    void pointsCountByTheirWeight() {
        double mean = oneAndNought(0.75);
        assertTrue(mean > 0.75 && mean < 0.95, "and outliers lose weight: " + mean);
        assertEquals(1 - mean, oneAndNought(0.25), 1e-9);
        assertEquals(0.5, oneAndNought(0.5), 1e-9);
    }

    private static double oneAndNought(double weight) {
        List<Point> points = new ArrayList<>();
        for (Point point : even((t, g) -> 1, 20, 0, 0)) {
            points.add(new Point(point.typeNumber(), 0, weight, 1, 0, 0));
            points.add(new Point(point.typeNumber(), 0, 1 - weight, 0, 0, 0));
        }
        return LocusFit.fit("invented", points).mean(12.0, 0);
    }
}
