package emberline.prepare;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class NoiseCorrelationTest {

    /** Noise smoothed by weights a, 1, a: correlations 2a / (1 + 2a^2) and a^2 / (1 + 2a^2). */
    private static double[] smoothed(double a, int size, long seed) {
        Random random = new Random(seed);
        double[] white = random.doubles(size + 2).map(x -> random.nextGaussian()).toArray();
        double[] flux = new double[size];
        for (int i = 0; i < size; i++) {
            double mixed = a * white[i] + white[i + 1] + a * white[i + 2];
            flux[i] = 20 + Math.sin(i / 60.0) + mixed / Math.sqrt(1 + 2 * a * a);
        }
        return flux;
    }

    private static double[] ones(int size) {
        double[] ones = new double[size];
        Arrays.fill(ones, 1);
        return ones;
    }

    @ParameterizedTest
    @CsvSource({"0.2, 1", "0.3, 2", "0.5, 3", "0.5, 4"})
    void smoothedNoiseIsRecognised(double a, long seed) {
        int size = 6000;
        NoiseCorrelation found = NoiseCorrelation.of(smoothed(a, size, seed), ones(size));
        double norm = 1 + 2 * a * a;
        // sampling errors of a correlation of 6000 pixels through the inversion: about 0.03
        assertEquals(2 * a / norm, found.lag1(), 0.08);
        assertEquals(a * a / norm, found.lag2(), 0.10);
    }

    @Test
    void independentNoiseHasNone() {
        for (long seed = 0; seed < 20; seed++) {
            NoiseCorrelation found = NoiseCorrelation.of(smoothed(0, 2000, seed), ones(2000));
            assertTrue(found.lag1() < 0.12, "seed " + seed + ": " + found);
        }
    }

    /** Any estimate becomes one that noise can have, by a scan of its power in frequency. */
    @Test
    void estimatesAreMovedToPossibleCorrelations() {
        for (int a = 0; a <= 120; a++) {
            for (int b = -50; b <= 120; b++) {
                NoiseCorrelation found = NoiseCorrelation.possible(a / 100.0, b / 100.0);
                assertTrue(leastPower(found.lag1(), found.lag2()) > -1e-9, found.toString());
                assertTrue(found.scatterDeficit() >= 0.9 && found.scatterDeficit() < 2.7);
                assertTrue(found.thirdDeficit() >= 0.9 && found.thirdDeficit() < 3.6);
                assertEquals(
                        false, new NoiseModel(false, 1, found.lag1(), found.lag2()).estimated());
            }
        }
        assertEquals(new NoiseCorrelation(0.4, 0.1), NoiseCorrelation.possible(0.4, 0.1));
        // at the clip: the lower end (1 - sqrt(1 - 2 r1^2)) / 4 of what r1 = 0.7 allows
        assertEquals(0.2146, NoiseCorrelation.possible(0.75, 0).lag2(), 1e-4);
        assertEquals(0.7, NoiseCorrelation.possible(0.75, 0).lag1());
    }

    @Test
    void possibilityIsThatOfNoNegativePower() {
        for (int a = -100; a <= 100; a++) {
            for (int b = -100; b <= 100; b++) {
                double least = leastPower(a / 100.0, b / 100.0);
                if (Math.abs(least) > 1e-4) { // the scan has a step
                    assertEquals(
                            least > 0,
                            NoiseCorrelation.isPossible(a / 100.0, b / 100.0),
                            a + ", " + b);
                }
            }
        }
    }

    private static double leastPower(double lag1, double lag2) {
        double least = Double.POSITIVE_INFINITY;
        for (int k = 0; k <= 1000; k++) {
            double t = Math.PI * k / 1000;
            least = Math.min(least, 1 + 2 * lag1 * Math.cos(t) + 2 * lag2 * Math.cos(2 * t));
        }
        return least;
    }

    @ParameterizedTest
    @CsvSource({"0.75, 0", "0.6, 0", "0, 0.6", "NaN, 0", "0, NaN"})
    void aNoiseModelRefusesImpossibleCorrelations(double lag1, double lag2) {
        String message =
                assertThrows(
                                IllegalArgumentException.class,
                                () -> new NoiseModel(false, 1, lag1, lag2))
                        .getMessage();
        assertTrue(message.contains("lags " + lag1 + " and " + lag2), message);
        assertTrue(message.contains("expected"), message);
    }

    @Test
    void fewPixelsSayNothing() {
        assertEquals(NoiseCorrelation.NONE, NoiseCorrelation.of(smoothed(0.5, 40, 1), ones(40)));
    }

    /** The deficit restores the sigma that second differences underestimate. */
    @Test
    void scatterDeficitRestoresTheSigma() {
        int size = 20_000;
        double[] flux = smoothed(0.5, size, 9);
        double ratio = PixelScatter.inUnitsOf(flux, ones(size));
        NoiseCorrelation found = NoiseCorrelation.of(flux, ones(size));
        assertEquals(1, ratio * found.scatterDeficit(), 0.1);
    }
}
