package emberline.spectrum;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import org.junit.jupiter.api.Test;

class SpectrumTest {

    private static Spectrum on(double... wavelengths) {
        double[] ones = new double[wavelengths.length];
        Arrays.fill(ones, 1);
        return Spectrum.of(wavelengths, ones, ones);
    }

    @Test
    void pixelsMeetAtTheMidpoints() {
        Spectrum spectrum = on(1.0, 1.1, 1.2, 1.3, 1.4, 1.5, 1.6);
        for (int i = 0; i < spectrum.size() - 1; i++) {
            assertEquals(spectrum.highEdgeMicron(i), spectrum.lowEdgeMicron(i + 1), 1e-12);
        }
        assertEquals(0.95, spectrum.lowEdgeMicron(0), 1e-12);
        assertEquals(1.65, spectrum.highEdgeMicron(6), 1e-12);
    }

    /** A pixel reaches 0.75 of the local spacing at most, so a gap of 0.7 stays one of 0.55. */
    @Test
    void aGapStaysAGap() {
        Spectrum spectrum = on(1.0, 1.1, 1.2, 1.3, 2.0, 2.1, 2.2, 2.3);
        assertEquals(1.375, spectrum.highEdgeMicron(3), 1e-12);
        assertEquals(1.925, spectrum.lowEdgeMicron(4), 1e-12);
    }

    @Test
    void alternatingSpacingHasNoHoles() {
        Spectrum spectrum = on(1.0, 1.02, 1.1, 1.12, 1.2, 1.22, 1.3, 1.32);
        for (int i = 0; i < spectrum.size() - 1; i++) {
            assertEquals(spectrum.highEdgeMicron(i), spectrum.lowEdgeMicron(i + 1), 1e-12);
        }
    }

    @Test
    void badPixelsAreKnown() {
        Spectrum spectrum =
                Spectrum.of(
                        new double[] {1, 2, 3, 4},
                        new double[] {1, Double.NaN, 1, 1},
                        new double[] {0.1, 0.1, Double.NaN, -1});
        assertTrue(spectrum.isGood(0));
        for (int pixel = 1; pixel < 4; pixel++) {
            assertFalse(spectrum.isGood(pixel), "pixel " + pixel);
        }
    }

    @Test
    void arraysAreCopiedInAndOut() {
        double[] wavelengths = {1, 2, 3};
        Spectrum spectrum = Spectrum.of(wavelengths, wavelengths, wavelengths);
        wavelengths[1] = 7;
        spectrum.fluxes()[0] = 9;
        assertEquals(2, spectrum.wavelengthMicron(1));
        assertEquals(1, spectrum.flux(0));
        assertEquals(on(1, 2, 3).wavelengthMicron(2), spectrum.wavelengthMicron(2));
    }

    @Test
    void badGridsAreRefused() {
        assertThrows(IllegalArgumentException.class, () -> on(1.0));
        assertThrows(IllegalArgumentException.class, () -> on(1.0, 1.0));
        assertThrows(IllegalArgumentException.class, () -> on(1.0, Double.NaN));
        assertThrows(IllegalArgumentException.class, () -> on(0, 1));
        assertThrows(IllegalArgumentException.class, () -> on(1, 2).withFluxScaledBy(Double.NaN));
    }
}
