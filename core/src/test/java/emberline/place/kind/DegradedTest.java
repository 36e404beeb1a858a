package emberline.place.kind;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotNull;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.prepare.ExtinctionLaw;
import emberline.prepare.NoiseModel;
import emberline.prepare.PreparedSpectrum;
import emberline.spectrum.Finding;
import emberline.spectrum.Spectrum;
import java.util.Arrays;
import org.apache.commons.math3.stat.descriptive.DescriptiveStatistics;
import org.apache.commons.rng.simple.RandomSource;
import org.junit.jupiter.api.Test;

/** What is done to a spectrum of known shape. */
class DegradedTest {

    private final ExtinctionLaw law = ExtinctionLaw.fitzpatrick1999(ExtinctionLaw.DIFFUSE_RV);

    private static PreparedSpectrum flat(double sigma) {
        return InventedSpectra.of(1, 2, 2000, w -> -10, sigma)
                .with(Finding.note("kept", "findings stay"));
    }

    private static PreparedSpectrum noisy(PreparedSpectrum of, double signalToNoise) {
        return Degraded.noisy(of, signalToNoise, RandomSource.XO_RO_SHI_RO_128_PP.create(3));
    }

    @Test
    void noiseIsTheMedianFluxOverTheSignalToNoise() {
        PreparedSpectrum noisy = noisy(flat(1.2), 20);
        Spectrum spectrum = noisy.spectrum();
        DescriptiveStatistics fluxes = new DescriptiveStatistics(spectrum.fluxes());
        double error = 0.5 / Math.sqrt(spectrum.size());
        assertEquals(-10, fluxes.getMean(), 4 * error);
        assertEquals(0.5, fluxes.getStandardDeviation(), 4 * error);
        double[] expected = new double[spectrum.size()];
        Arrays.fill(expected, 1.3); // 1.2 and 0.5 in quadrature
        assertArrayEquals(expected, spectrum.fluxSigmas(), 1e-12);
        assertEquals(1, noisy.findings().size());
        assertSame(NoiseModel.INDEPENDENT, noisy.noise());
        assertEquals(2000, noisy.resolvingPower().value());
    }

    /** Of 0, 1, 2, ... the median is the middle; pixels without flux do not count for it. */
    @Test
    void theLevelIsTheMedian() {
        double[] wavelengths = {1, 2, 3, 4, 5};
        double[] flux = {100, 7, -2, 1, 3};
        PreparedSpectrum five =
                new PreparedSpectrum(
                        Spectrum.of(wavelengths, flux, new double[5]),
                        flat(0).resolvingPower(),
                        NoiseModel.INDEPENDENT,
                        flat(0).findings());
        assertEquals(0.3, noisy(five, 10).spectrum().fluxSigma(4), 1e-12);
    }

    @Test
    void dustDimsByItsLaw() {
        PreparedSpectrum plain = InventedSpectra.of(0.29, 2.4, 100, w -> 2, 0.1);
        PreparedSpectrum behind = Degraded.reddened(plain, 3, law);
        for (int i = 0; i < plain.spectrum().size(); i++) {
            double micron = plain.spectrum().wavelengthMicron(i);
            double flux = behind.spectrum().flux(i);
            if (micron < 0.3031) {
                assertEquals(0, flux, "the law says nothing at " + micron);
            } else {
                double magnitudes = -2.5 * Math.log10(flux / 2);
                assertEquals(3 * law.relativeTo(micron), magnitudes, 1e-9);
                assertEquals(flux / 20, behind.spectrum().fluxSigma(i), 1e-12);
            }
        }
        assertNotNull(behind.findings());
        assertEquals(100, behind.resolvingPower().value());
    }

    @Test
    void aRedshiftStretches() {
        PreparedSpectrum plain = InventedSpectra.of(1, 2, 100, w -> w, 0.1);
        Spectrum shifted = Degraded.stretched(plain, 1.5).spectrum();
        assertEquals(plain.spectrum().size(), shifted.size());
        for (int i = 0; i < shifted.size(); i++) {
            assertEquals(1.5 * plain.spectrum().wavelengthMicron(i), shifted.wavelengthMicron(i));
            assertEquals(plain.spectrum().flux(i), shifted.flux(i));
        }
    }

    /** A line of the instrument's own width becomes a line of the new resolving power. */
    @Test
    void aLineGetsTheWidthOfTheResolution() {
        double at = 1.5;
        double own = at / 2000 / 2.3548;
        PreparedSpectrum line =
                InventedSpectra.of(1, 2, 2000, w -> Math.exp(-Math.pow((w - at) / own, 2) / 2), 0);
        PreparedSpectrum coarse = Degraded.coarse(line, 100);
        assertEquals(100, coarse.resolvingPower().value());
        Spectrum spectrum = coarse.spectrum();
        double sum = 0;
        double mean = 0;
        double square = 0;
        for (int i = 0; i < spectrum.size(); i++) {
            double off = spectrum.wavelengthMicron(i) - at;
            double weight = spectrum.flux(i) * spectrum.localSpacingMicron(i);
            sum += weight;
            mean += weight * off;
            square += weight * off * off;
        }
        assertEquals(own * Math.sqrt(2 * Math.PI), sum, 0.01 * own * 2.5, "flux is kept");
        double sigma = Math.sqrt(square / sum - Math.pow(mean / sum, 2));
        // the kernel ends at three sigma, which takes 1.4% off its width
        assertEquals(at / 100 / 2.3548, sigma, 0.025 * sigma);
    }

    @Test
    void coarsePixelsAreTwoAndAHalfAnElement() {
        Spectrum spectrum = Degraded.coarse(flat(1), 100).spectrum();
        double step = 1 / 250.0;
        assertEquals(Math.exp(step / 2), spectrum.wavelengthMicron(0), 1e-12);
        for (int i = 1; i < spectrum.size(); i++) {
            double ratio = spectrum.wavelengthMicron(i) / spectrum.wavelengthMicron(i - 1);
            assertEquals(step, Math.log(ratio), 1e-9);
        }
        assertEquals((int) (Math.log(2) * 250), spectrum.size(), 1);
        for (int i = 0; i < spectrum.size(); i++) {
            assertEquals(-10, spectrum.flux(i), 1e-9, "a flat spectrum stays flat");
        }
        PreparedSpectrum red = InventedSpectra.of(2, 4, 2000, w -> 1, 1);
        Spectrum cut = Degraded.coarse(red, 100).spectrum();
        assertEquals(2.6, cut.wavelengthMicron(cut.size() - 1), 0.02, "ends at 2.6 micron");
    }

    /** The error of a mean with Gaussian weights: the spacing over 2 sqrt(pi) widths. */
    @Test
    void smoothingLowersTheNoise() {
        Spectrum spectrum = Degraded.coarse(flat(1), 100).spectrum();
        int middle = spectrum.size() / 2;
        double micron = spectrum.wavelengthMicron(middle);
        double width = micron * Math.sqrt(1e-4 - 1 / 4e6) / 2.3548;
        double spacing = micron / 5000;
        double expected = Math.sqrt(spacing / (2 * Math.sqrt(Math.PI) * width));
        assertEquals(expected, spectrum.fluxSigma(middle), 0.005 * expected);
    }

    /** Bad pixels are left out; where there is a gap there is no flux. */
    @Test
    void gapsStayGaps() {
        PreparedSpectrum gap =
                InventedSpectra.of(1, 2, 2000, w -> w > 1.3 && w < 1.4 ? Double.NaN : 5, 1);
        Spectrum spectrum = Degraded.coarse(gap, 100).spectrum();
        double width = 1.35 / 100 / 2.3548;
        for (int i = 0; i < spectrum.size(); i++) {
            double micron = spectrum.wavelengthMicron(i);
            double inside = Math.min(micron - 1.3, 1.4 - micron);
            if (inside > 1.2 * width) {
                assertTrue(Double.isNaN(spectrum.flux(i)), "" + micron);
            } else if (inside < 0.8 * width) {
                assertEquals(5, spectrum.flux(i), 1e-9, "" + micron);
            }
        }
    }

    @Test
    void whatIsCoarseAlreadyIsNotMadeCoarser() {
        PreparedSpectrum step = InventedSpectra.of(1, 2, 100, w -> w < 1.5 ? 1 : 2, 0);
        Spectrum same = Degraded.coarse(step, 99.99).spectrum();
        for (int i = 0; i < same.size(); i++) {
            double flux = same.flux(i);
            double off = Math.abs(same.wavelengthMicron(i) - 1.5);
            if (off > 0.02 && !Double.isNaN(flux)) {
                assertEquals(same.wavelengthMicron(i) < 1.5 ? 1 : 2, flux, 1e-9);
            }
        }
    }
}
