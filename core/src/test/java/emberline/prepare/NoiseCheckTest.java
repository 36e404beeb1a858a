package emberline.prepare;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.SharedSpectra;
import emberline.read.CandidateListReader;
import emberline.read.ListedCandidate;
import emberline.read.Observation;
import emberline.read.SpectrumReader;
import emberline.spectrum.Finding;
import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import java.util.function.Predicate;
import org.junit.jupiter.api.Test;

class NoiseCheckTest {

    private static final int SIZE = 4000;

    /** Noise of sigma 1, smoothed by the weights a, 1, a, on a smooth spectrum. */
    private static double[] noise(double a, long seed) {
        Random random = new Random(seed);
        double[] white = new double[SIZE + 2];
        Arrays.setAll(white, i -> random.nextGaussian());
        double[] flux = new double[SIZE];
        for (int i = 0; i < SIZE; i++) {
            double mixed = a * white[i] + white[i + 1] + a * white[i + 2];
            flux[i] = 50 + Math.sin(i / 60.0) + mixed / Math.sqrt(1 + 2 * a * a);
        }
        return flux;
    }

    private static NoiseCheck.Settled settle(double[] flux, double sigma) {
        double[] sigmas = new double[flux.length];
        Arrays.fill(sigmas, sigma);
        return NoiseCheck.settle(Optional.of(sigmas), flux);
    }

    private static List<String> codes(NoiseCheck.Settled settled) {
        return settled.findings().stream().map(Finding::code).toList();
    }

    @Test
    void rightNoiseIsLeftAlone() {
        NoiseCheck.Settled settled = settle(noise(0, 1), 1);
        assertEquals(NoiseModel.INDEPENDENT, settled.model());
        assertEquals(List.of(), settled.findings());
        assertTrue(Arrays.stream(settled.sigma()).allMatch(s -> s == 1));
    }

    /** Flux and sigma in different units: the sigma says nothing, the scatter does. */
    @Test
    void noiseOnAnotherScaleIsSetAside() {
        NoiseCheck.Settled settled = settle(noise(0, 1), 5000);
        assertEquals("sigma-estimated", codes(settled).get(0));
        String text = settled.findings().get(0).text();
        assertTrue(text.matches(".*by a factor of (4[5-9]|5[0-5])\\d\\d: .*"), text);
        assertTrue(text.contains("was set aside"));
        assertEquals(1, settled.sigma()[SIZE / 2], 0.5);
    }

    /** A cautious sigma below the flux, and noise above the flux that is noise, stay. */
    @Test
    void cautiousNoiseAndNoiseAboveTheFluxAreKept() {
        assertEquals(List.of("sigma-above-scatter"), codes(settle(noise(0, 1), 45)));
        Random random = new Random(3);
        double[] faint = new double[SIZE];
        Arrays.setAll(faint, i -> 0.001 + random.nextGaussian());
        assertEquals(List.of(), codes(settle(faint, 1)));
        double[] constant = new double[SIZE];
        Arrays.fill(constant, 2);
        assertFalse(codes(settle(constant, 1000)).contains("sigma-estimated"));
    }

    /** The sigma of this public spectrum is 4700 times its scatter, and 770 times its flux. */
    @Test
    void aRealSpectrumWithSigmaOnAnotherScaleIsMeasured() throws IOException {
        Path file =
                SharedSpectra.folder().resolve("montreal/SIMPJ1158+0435_NIR_SpeX_Robert2016.csv");
        PreparedSpectrum prepared =
                new Preparer().prepare(new SpectrumReader().read(file), Preparing.withDefaults());
        double[] signal = new double[prepared.spectrum().size()];
        Arrays.setAll(signal, i -> prepared.spectrum().flux(i) / prepared.spectrum().fluxSigma(i));
        Arrays.sort(signal);
        double median = signal[signal.length / 2];
        assertTrue(median > 3 && median < 100, "median signal-to-noise " + median);
    }

    @Test
    void tooSmallNoiseIsScaledToTheScatter() {
        NoiseCheck.Settled settled = settle(noise(0, 2), 0.1);
        assertEquals(List.of("sigma-too-small"), codes(settled));
        // 4000 pixels: the quiet scatter is good to a few percent
        assertEquals(10, settled.model().scale(), 1);
        assertEquals(1, settled.sigma()[7], 0.1);
    }

    @Test
    void tooSmallNoiseThatIsSharedKeepsItsCorrelation() {
        NoiseCheck.Settled settled = settle(noise(0.3, 3), 0.05);
        assertEquals(List.of("sigma-too-small", "noise-shared"), codes(settled));
        assertEquals(0.6 / 1.18, settled.model().lag1(), 0.1);
        // the correlations are good to 0.03 each, which the deficit of about 1.7 doubles
        assertEquals(20, settled.model().scale(), 4);
    }

    @Test
    void sharedNoiseThatIsStatedRightIsKept() {
        NoiseCheck.Settled settled = settle(noise(0.3, 4), 1);
        assertEquals(List.of("noise-shared"), codes(settled));
        assertEquals(1, settled.model().scale());
        assertTrue(settled.model().lag1() > 0.3);
    }

    @Test
    void cautiousNoiseIsRemarkedOn() {
        NoiseCheck.Settled settled = settle(noise(0, 5), 10);
        assertEquals(List.of("sigma-above-scatter"), codes(settled));
        assertEquals(10, settled.sigma()[0]);
    }

    @Test
    void pixelsWithoutSigmaAreBad() {
        double[] sigma = new double[SIZE];
        Arrays.fill(sigma, 1);
        sigma[10] = 0;
        sigma[11] = -1;
        NoiseCheck.Settled settled = NoiseCheck.settle(Optional.of(sigma), noise(0, 6));
        assertEquals(List.of("pixels-without-sigma"), codes(settled));
        assertTrue(settled.findings().get(0).text().startsWith("2 pixels "));
        assertTrue(Double.isNaN(settled.sigma()[10]) && Double.isNaN(settled.sigma()[11]));
        assertEquals(0, sigma[10], "the caller's array was changed");
    }

    @Test
    void noiseIsEstimatedWhereTheFileHasNone() {
        NoiseCheck.Settled settled = NoiseCheck.settle(Optional.empty(), noise(0, 7));
        assertEquals(List.of("sigma-estimated"), codes(settled));
        assertTrue(settled.model().estimated());
        assertEquals(1, Arrays.stream(settled.sigma()).average().orElseThrow(), 0.1);
        NoiseCheck.Settled empty = NoiseCheck.settle(Optional.of(new double[SIZE]), noise(0, 7));
        assertTrue(empty.findings().get(0).text().startsWith("the sigma column is mostly empty"));
    }

    @Test
    void aConstantFluxWithoutSigmaIsNotMeasured() {
        double[] flux = new double[800];
        Arrays.fill(flux, 1);
        NoiseCheck.Settled settled = NoiseCheck.settle(Optional.empty(), flux);
        assertEquals(List.of("noise-unknown"), codes(settled));
        assertEquals(Finding.Severity.WARNING, settled.findings().get(0).severity());
        assertTrue(Arrays.stream(settled.sigma()).allMatch(Double::isNaN));
    }

    /** What is settled for the real spectra whose path fits. */
    private static List<NoiseCheck.Settled> real(Predicate<ListedCandidate> which)
            throws IOException {
        Path folder = SharedSpectra.folder();
        List<NoiseCheck.Settled> all = new ArrayList<>();
        for (ListedCandidate row :
                new CandidateListReader().read(folder.resolve("list.csv")).rows()) {
            if (which.test(row)) {
                Path path = folder.resolve(row.candidate().spectra().get(0));
                Observation observation = new SpectrumReader().read(path);
                all.add(NoiseCheck.settle(observation.fluxSigmas(), observation.fluxes()));
            }
        }
        return all;
    }

    private static boolean isIn(ListedCandidate row, String part) {
        return row.candidate().spectra().get(0).contains(part);
    }

    /** Cool dwarfs at R = 2000 with true signals of hundreds are full of lines, not of noise. */
    @Test
    void linesOfRealDwarfsAreNotTakenForNoise() throws IOException {
        List<NoiseCheck.Settled> dwarfs =
                real(
                        row ->
                                isIn(row, "irtf_library")
                                        && row.candidate()
                                                .text("known_kind")
                                                .equals(Optional.of("dwarf")));
        assertTrue(dwarfs.size() >= 20, dwarfs.size() + " spectra");
        for (NoiseCheck.Settled settled : dwarfs) {
            assertTrue(settled.model().scale() < 2, settled.model().toString());
        }
    }

    /** The manifest says of these that their errors give unrealistic signals of thousands. */
    @Test
    void realErrorsThatAreFarTooSmallAreFound() throws IOException {
        List<NoiseCheck.Settled> spectra = real(row -> isIn(row, "Flamingos-2"));
        long scaled = spectra.stream().filter(s -> s.model().scale() > 3).count();
        assertTrue(scaled >= 0.8 * spectra.size(), scaled + " of " + spectra.size());
    }

    /** Quantised fluxes: 1348 of 5933 pixels of the first had no scatter of their own. */
    @Test
    void estimatedNoiseOfRealSpectraIsNeverZero() throws IOException {
        for (NoiseCheck.Settled settled : real(row -> isIn(row, "sdss_eigenstar"))) {
            assertTrue(settled.model().estimated());
            assertFalse(Arrays.stream(settled.sigma()).anyMatch(s -> s <= 0));
            assertTrue(Arrays.stream(settled.sigma()).anyMatch(s -> s > 0));
        }
    }
}
