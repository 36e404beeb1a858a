package emberline.prepare;

import static org.junit.jupiter.api.Assertions.assertEquals;
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
