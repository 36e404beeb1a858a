package emberline.prepare;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.prepare.BandSignal.Range;
import emberline.spectrum.Spectrum;
import java.util.Arrays;
import org.junit.jupiter.api.Test;

class BandSignalTest {

    @Test
    void theMedianOfFluxOverSigmaIsGiven() {
        BandSignal best = BandSignal.best(flat(1.0, 2.5, 300, 20, 0.5)).orElseThrow();
        assertEquals(Range.J, best.range());
        assertEquals(40, best.medianSignalToNoise(), 1e-12);
        assertEquals(1, best.coverage(), 0.05);
    }

    @Test
    void theBandThatIsCoveredBestLeads() {
        BandSignal best = BandSignal.best(flat(1.25, 1.9, 300, 3, 1)).orElseThrow();
        assertEquals(Range.H, best.range());
    }

    @Test
    void outsideAllBandsTheWholeSpectrumCounts() {
        BandSignal best = BandSignal.best(flat(3.0, 4.0, 50, 3, 1)).orElseThrow();
        assertEquals(Range.WHOLE, best.range());
    }

    @Test
    void withoutNoiseThereIsNoSignalToNoise() {
        assertTrue(BandSignal.best(flat(1.0, 2.5, 300, 20, 0)).isEmpty());
        assertTrue(BandSignal.best(flat(1.0, 2.5, 300, Double.NaN, 1)).isEmpty());
    }

    /** Where the sky was taken away twice, the flux is negative; a signal is not. */
    @Test
    void aSignalIsNeverNegative() {
        Spectrum negative = flat(1.0, 2.5, 300, -20, 0.5);
        assertEquals(5, BandSignal.of(negative).size()); // Y, J, H, K and the whole
        BandSignal.of(negative)
                .forEach(
                        signal -> assertEquals(0, signal.medianSignalToNoise(), signal.toString()));
    }

    private static Spectrum flat(double low, double high, int pixels, double flux, double sigma) {
        double[] wavelengths = new double[pixels];
        for (int i = 0; i < pixels; i++) {
            wavelengths[i] = low + (high - low) * i / (pixels - 1);
        }
        double[] fluxes = new double[pixels];
        double[] sigmas = new double[pixels];
        Arrays.fill(fluxes, flux);
        Arrays.fill(sigmas, sigma);
        return Spectrum.of(wavelengths, fluxes, sigmas);
    }
}
