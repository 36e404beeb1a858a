package emberline.prepare;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class PixelScatterTest {

    private static double[] noise(int size, double sigma, long seed) {
        Random random = new Random(seed);
        double[] flux = new double[size];
        for (int i = 0; i < size; i++) {
            flux[i] = 10 + Math.sin(i / 80.0) + sigma * random.nextGaussian();
        }
        return flux;
    }

    private static double[] filled(int size, double value) {
        double[] values = new double[size];
        Arrays.fill(values, value);
        return values;
    }

    @Test
    void theLocalNoiseIsFound() {
        double[] sigma = PixelScatter.sigma(noise(4000, 0.3, 1));
        double mean = Arrays.stream(sigma).average().orElseThrow();
        // 51 differences a window scatter by some 20%; the mean of 80 windows by some 3%
        assertEquals(0.3, mean, 0.03);
        assertTrue(Arrays.stream(sigma).allMatch(s -> s > 0.149 * 0.9 && s < 0.6));
    }

    @Test
    void aConstantStretchGetsHalfTheNoiseOfTheWhole() {
        double[] flux = noise(1000, 0.3, 2);
        Arrays.fill(flux, 400, 600, 10);
        double[] sigma = PixelScatter.sigma(flux);
        // the constant fifth lowers the median of the sizes: by a quarter
        assertEquals(0.15 * 0.75, sigma[500], 0.02);
    }

    @Test
    void aConstantSpectrumHasNoKnownNoise() {
        assertTrue(Arrays.stream(PixelScatter.sigma(filled(800, 3))).allMatch(Double::isNaN));
        assertTrue(Arrays.stream(PixelScatter.sigma(new double[] {1, 2})).allMatch(Double::isNaN));
    }

    /** The one calibration serves short and long spectra. */
    @ParameterizedTest
    @ValueSource(ints = {300, 1000, 5000})
    void pureNoiseHasAQuietScatterOfOne(int size) {
        double sum = 0;
        for (long seed = 0; seed < 40; seed++) {
            sum += PixelScatter.quietInUnitsOf(noise(size, 0.3, seed), filled(size, 0.3));
        }
        // one estimate scatters by 14% at 300 pixels, the mean of 40 by 2%; the calibration by 3%
        assertEquals(1, sum / 40, 0.08);
    }

    /** Lines of 2.5 pixels across most of a spectrum move the median scatter, not the quiet one. */
    @Test
    void linesAreNotTakenForNoise() {
        int size = 3000;
        double[] flux = noise(size, 0.01, 3);
        Random random = new Random(4);
        for (int line = 0; line < 900; line++) {
            double centre = 600 + random.nextDouble() * (size - 600);
            for (int i = 600; i < size; i++) {
                double x = (i - centre) / 1.06;
                flux[i] -= 0.5 * Math.exp(-0.5 * x * x);
            }
        }
        assertTrue(PixelScatter.inUnitsOf(flux, filled(size, 0.01)) > 3);
        // a fifth is free of lines: the middle of its windows, 1.47 of the tenth part of pure noise
        assertEquals(1.47, PixelScatter.quietInUnitsOf(flux, filled(size, 0.01)), 0.3);
    }

    @Test
    void fewPixelsSayNothing() {
        assertTrue(Double.isNaN(PixelScatter.quietInUnitsOf(noise(40, 1, 1), filled(40, 1))));
        assertTrue(Double.isNaN(PixelScatter.inUnitsOf(noise(8, 1, 1), filled(8, 1))));
    }
}
