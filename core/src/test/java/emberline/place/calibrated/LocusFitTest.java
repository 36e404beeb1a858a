package emberline.place.calibrated;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.place.calibrated.TrainingSet.Point;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

/**
 * Loci of invented features whose truth is known, from objects whose published types and gravities
 * are off as far as the fit takes them to be.
 */
class LocusFitTest {

    private static final double SLOPE = -0.06;
    private static final double SHIFT = 0.08;

    private static double truth(double type, double lowGravity) {
        return 1.4 + SLOPE * type + SHIFT * lowGravity;
    }

    private static List<Point> points(double scatter, double noise, int outliers) {
        Random random = new Random(11);
        List<Point> points = new ArrayList<>();
        for (int i = 0; i < 800; i++) {
            double type = 31 * random.nextDouble();
            double lowGravity = i % 4 == 0 ? 1 : 0;
            double trueType = type + TrainingSet.TYPE_NOISE_SUBCLASS * random.nextGaussian();
            double trueGravity = lowGravity + TrainingSet.GRAVITY_NOISE * random.nextGaussian();
            double value =
                    truth(trueType, trueGravity)
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
        for (int k = 8; k < 36; k++) {
            quietMean += quiet.scatter(k) / 28;
            noisyMean += noisy.scatter(k) / 28;
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
        assertTrue(Math.abs(locus.mean(10.0, 0) - locus.mean(10.0, 1)) > 0.05);
    }

    /**
     * Beyond the last spectra the locus is carried on, and off by more than objects scatter. The
     * scatter says so: of the objects that were not learned from as many stand within one sigma as
     * between the spectra (without the uncertainty of the mean it would be one in four).
     */
    @Test
    void beyondTheSpectraTheScatterGrowsByWhatTheMeanMayBeOff() {
        int trials = 200;
        double[] types = {19, 26, 27, 28, 29};
        int[] within = new int[types.length];
        double[] scatter = new double[types.length];
        for (int trial = 0; trial < trials; trial++) {
            Random random = new Random(trial);
            List<Point> points = new ArrayList<>();
            for (int i = 0; i < 150; i++) {
                double at = 12 + 13 * random.nextDouble();
                points.add(new Point(at, 0, 1, 30 + random.nextGaussian(), 0, 0));
            }
            Locus locus = LocusFit.fit("invented", points);
            for (int i = 0; i < types.length; i++) {
                double value = 30 + random.nextGaussian();
                double sigma = locus.scatter(types[i]);
                within[i] += Math.abs(value - locus.mean(types[i], 0)) < sigma ? 1 : 0;
                scatter[i] += sigma / trials;
            }
        }
        for (int i = 0; i < types.length; i++) {
            String where = "type " + types[i] + ", mean scatter " + scatter[i];
            assertEquals(0.62, within[i] / (double) trials, 0.1, where);
            assertTrue(types[i] < 25 ? scatter[i] < 1.1 : scatter[i] > 1.2, where);
        }
    }

    /** A locus that bends is not flattened, as a mean over the kernel would flatten it. */
    @Test
    void aBendIsFollowed() {
        Random random = new Random(5);
        List<Point> points = new ArrayList<>();
        for (int i = 0; i < 800; i++) {
            double type = 31 * random.nextDouble();
            points.add(new Point(type, 0, 1, bent(type) + 0.02 * random.nextGaussian(), 0.0, 0));
        }
        Locus locus = LocusFit.fit("invented", points);
        for (double type = 3; type <= 16; type += 0.5) {
            assertEquals(bent(type), locus.mean(type, 0), 0.012, "type " + type);
        }
    }

    private static double bent(double type) {
        return 0.01 * (type - 8) * (type - 8);
    }
}
