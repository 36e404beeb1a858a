package emberline.place.calibrated;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.place.calibrated.TrainingSet.Point;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** Loci of invented features whose truth is known. */
class LocusFitTest {

    private static final double SLOPE = -0.06;
    private static final double SHIFT = 0.2;

    private static double truth(double type, double lowGravity) {
        return 1.4 + SLOPE * type + SHIFT * lowGravity;
    }

    private static List<Point> points(double scatter, double noise, int outliers) {
        Random random = new Random(11);
        List<Point> points = new ArrayList<>();
        for (int i = 0; i < 800; i++) {
            double type = 31 * random.nextDouble();
            double lowGravity = i % 4 == 0 ? 1 : 0;
            double value =
                    truth(type, lowGravity)
                            + Math.hypot(scatter, noise) * random.nextGaussian()
                            + (i < outliers ? 1.5 : 0);
            points.add(new Point(type, lowGravity, 1, value, noise, 0));
        }
        return points;
    }

    @Test
    void meanAndGravityShiftAreFound() {
        Locus locus = LocusFit.fit("invented", points(0.03, 0, 0));
        for (double type = 5; type <= 17; type += 1) {
            assertEquals(truth(type, 0), locus.mean(type, 0), 0.012, "field " + type);
            assertEquals(truth(type, 1), locus.mean(type, 1), 0.02, "very low " + type);
            assertEquals(truth(type, 0.5), locus.mean(type, 0.5), 0.015, "intermediate " + type);
        }
    }

    @Test
    void scatterIsWhatNoiseLeaves() {
        Locus quiet = LocusFit.fit("invented", points(0.03, 0, 0));
        Locus noisy = LocusFit.fit("invented", points(0.03, 0.03, 0));
        double quietMean = 0;
        double noisyMean = 0;
        for (int k = 10; k < 50; k++) {
            quietMean += quiet.scatter(k) / 40;
            noisyMean += noisy.scatter(k) / 40;
        }
        assertEquals(0.03, quietMean, 0.003);
        assertEquals(0.03, noisyMean, 0.005);
    }

    @Test
    void afewOutliersDoNotDragTheMean() {
        Locus locus = LocusFit.fit("invented", points(0.03, 0, 24)); // 3% off by 50 sigma
        for (double type = 3; type <= 28; type += 1) {
            assertEquals(truth(type, 0), locus.mean(type, 0), 0.03, "type " + type);
        }
    }

    /** No low-gravity T dwarfs are known to the calibration, so gravity does nothing there. */
    @Test
    void gravityIsCalibratedForLateMAndLOnly() {
        Locus locus = LocusFit.fit("invented", points(0.03, 0, 0));
        assertEquals(locus.mean(25.0, 0), locus.mean(25.0, 1), 0);
        assertEquals(locus.mean(1.0, 0), locus.mean(1.0, 1), 0);
        assertTrue(Math.abs(locus.mean(10.0, 0) - locus.mean(10.0, 1)) > 0.1);
    }
}
