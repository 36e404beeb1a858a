package emberline.prepare;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.prepare.Quality.Grade;
import emberline.spectrum.Finding;
import emberline.spectrum.ResolvingPower;
import emberline.spectrum.ResolvingPower.Basis;
import emberline.spectrum.Spectrum;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class QualityTest {

    /** A flat spectrum of one pixel a resolution element at most, so that signals are as given. */
    private static PreparedSpectrum flat(
            double low, double high, double signal, NoiseModel noise, Finding... findings) {
        int size = 400;
        double[] wavelengths = new double[size];
        Arrays.setAll(wavelengths, i -> low + (high - low) * i / (size - 1));
        double[] flux = new double[size];
        Arrays.fill(flux, signal);
        double[] sigma = new double[size];
        Arrays.fill(sigma, 1);
        return new PreparedSpectrum(
                Spectrum.of(wavelengths, flux, sigma),
                new ResolvingPower(100_000, Basis.GIVEN),
                noise,
                List.of(findings));
    }

    private static Quality of(double low, double high, double signal) {
        return Quality.of(flat(low, high, signal, NoiseModel.INDEPENDENT));
    }

    @ParameterizedTest
    @CsvSource({
        "1.0, 2.5, 31, GOOD",
        "1.0, 2.5, 29, USABLE",
        "1.1, 1.4, 31, USABLE",
        "1.0, 2.5, 10.5, USABLE",
        "1.0, 2.5, 9.5, POOR",
        "1.0, 2.5, 3.1, POOR",
        "1.0, 2.5, 2.9, UNUSABLE",
        "1.0, 2.5, -5, UNUSABLE",
        "1.2, 1.26, 50, POOR",
        "1.2, 1.26, 1, UNUSABLE",
        "3.0, 4.0, 50, POOR",
        "3.0, 4.0, 1, UNUSABLE",
    })
    void gradesGoByCoveredBandsAndSignal(double low, double high, double signal, Grade grade) {
        Quality quality = of(low, high, signal);
        assertEquals(grade, quality.grade(), quality.reason());
        assertTrue(quality.reason().startsWith("signal-to-noise "), quality.reason());
    }

    @Test
    void withoutKnownNoiseASpectrumIsUnusable() {
        Quality quality = of(1.0, 2.5, Double.NaN);
        assertEquals(Grade.UNUSABLE, quality.grade());
        assertEquals("no pixels with a known noise", quality.reason());
    }

    @Test
    void estimatedOrScaledNoiseIsNeverGood() {
        Quality estimated = Quality.of(flat(1, 2.5, 99, new NoiseModel(true, 1, 0, 0)));
        assertEquals(Grade.USABLE, estimated.grade());
        assertTrue(estimated.reason().contains("the noise is estimated"), estimated.reason());
        Quality scaled = Quality.of(flat(1, 2.5, 99, new NoiseModel(false, 4, 0, 0)));
        assertEquals(Grade.USABLE, scaled.grade());
        assertTrue(scaled.reason().contains("scaled"), scaled.reason());
    }

    @Test
    void otherWarningsAreNamedApartFromTheNoise() {
        Quality warned =
                Quality.of(
                        flat(
                                1,
                                2.5,
                                99,
                                NoiseModel.INDEPENDENT,
                                Finding.caution("medium-assumed", "vacuum is assumed"),
                                Finding.warning("flux-scale", "the flux jumps")));
        assertEquals(Grade.USABLE, warned.grade());
        assertTrue(warned.reason().contains("a warning (flux-scale)"), warned.reason());
        assertTrue(!warned.reason().contains("noise is"), warned.reason());
    }

    @Test
    void cautionsDoNotCostTheGrade() {
        Finding caution = Finding.caution("medium-assumed", "vacuum is assumed");
        assertEquals(
                Grade.GOOD, Quality.of(flat(1, 2.5, 99, NoiseModel.INDEPENDENT, caution)).grade());
    }
}
