package emberline.measure;

import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.SharedSpectra;
import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measurement.Measured;
import emberline.prepare.NoiseModel;
import emberline.prepare.PreparedSpectrum;
import emberline.prepare.Preparer;
import emberline.prepare.Preparing;
import emberline.read.CandidateList;
import emberline.read.CandidateListReader;
import emberline.read.ListedCandidate;
import emberline.read.SpectrumReader;
import emberline.spectrum.Candidate;
import emberline.spectrum.Spectrum;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Random;
import java.util.TreeMap;
import org.junit.jupiter.api.Test;

/**
 * Are the error bars right? Noise is added to ten real spectra, 500 times each, at a
 * signal-to-noise of 5 to 50 a pixel; the 68% interval of each feature must hold the value of the
 * spectrum without added noise in 68% of the cases. A feature is judged on at least 2000 copies, so
 * the binomial error of its share is at most 1.05%, and of all shares together much less.
 */
class ErrorBarsTest {

    private static final int COPIES = 500;
    private static final double EXPECTED = 0.682689;

    private static List<PreparedSpectrum> tenSpectra(Path folder) throws Exception {
        CandidateList list = new CandidateListReader().read(folder.resolve("list.csv"));
        List<PreparedSpectrum> chosen = new ArrayList<>();
        List<Candidate> good =
                list.rows().stream()
                        .map(ListedCandidate::candidate)
                        .filter(c -> c.text("tier").orElse("").equals("A"))
                        .filter(c -> c.text("known_kind").orElse("").equals("dwarf"))
                        .filter(c -> c.number("resolution").orElse(0) >= 100)
                        .toList();
        for (int k = 0; k < 10; k++) {
            Candidate candidate = good.get(k * good.size() / 10);
            chosen.add(
                    new Preparer()
                            .prepare(
                                    new SpectrumReader()
                                            .read(folder.resolve(candidate.spectra().get(0))),
                                    Preparing.withDefaults()
                                            .withResolvingPower(
                                                    candidate.number("resolution").orElseThrow())));
        }
        return chosen;
    }

    /** The spectrum as truth, with the noise that copies of it will get. */
    private static PreparedSpectrum truth(PreparedSpectrum real, double signalToNoise) {
        Spectrum spectrum = real.spectrum();
        double[] sorted =
                Arrays.stream(spectrum.fluxes()).filter(Double::isFinite).sorted().toArray();
        double level = sorted[sorted.length / 2];
        double[] sigma = new double[spectrum.size()];
        for (int i = 0; i < sigma.length; i++) {
            sigma[i] = Math.max(spectrum.flux(i), 0.3 * level) / signalToNoise;
        }
        return new PreparedSpectrum(
                spectrum.withFluxes(spectrum.fluxes(), sigma),
                real.resolvingPower(),
                NoiseModel.INDEPENDENT,
                List.of());
    }

    private static PreparedSpectrum noisy(PreparedSpectrum truth, Random random) {
        double[] flux = truth.spectrum().fluxes();
        for (int i = 0; i < flux.length; i++) {
            flux[i] += truth.spectrum().fluxSigma(i) * random.nextGaussian();
        }
        return new PreparedSpectrum(
                truth.spectrum().withFluxes(flux, truth.spectrum().fluxSigmas()),
                truth.resolvingPower(),
                truth.noise(),
                List.of());
    }

    @Test
    void intervalsHoldTheTruthInTwoThirdsOfTheCases() throws Exception {
        List<PreparedSpectrum> spectra = tenSpectra(SharedSpectra.folder());
        Measurer measurer = new Measurer(FeatureCatalogue.standard(), Measuring.withDefaults());
        Map<String, int[]> counts = new TreeMap<>();
        Random random = new Random(20);
        for (int k = 0; k < spectra.size(); k++) {
            PreparedSpectrum truth = truth(spectra.get(k), 5 * Math.pow(10, k / 9.0));
            Measurements expected = measurer.measure(truth);
            // a continuum below 5 sigma is refused in some copies: those left are a choice
            List<String> ids =
                    expected.all().stream()
                            .filter(m -> m.result() instanceof Measured)
                            .filter(m -> m.continuumSignal() >= 7)
                            .map(m -> m.feature().id())
                            .toList();
            for (int copy = 0; copy < COPIES; copy++) {
                count(expected, measurer.measure(noisy(truth, random)), ids, copy, counts);
            }
        }
        double sum = 0;
        int judged = 0;
        List<String> off = new ArrayList<>();
        for (Map.Entry<String, int[]> entry : counts.entrySet()) {
            int[] held = entry.getValue();
            if (held[1] >= 4 * COPIES) {
                double share = (double) held[0] / held[1];
                double binomial = Math.sqrt(EXPECTED * (1 - EXPECTED) / held[1]);
                sum += share;
                judged++;
                if (Math.abs(share - EXPECTED) > Math.max(0.02, 3.5 * binomial)) {
                    off.add(entry.getKey() + " " + share + " of " + held[1]);
                }
            }
        }
        assertTrue(judged > 60, judged + " features judged");
        assertTrue(off.isEmpty(), judged + " features judged, off: " + off);
        assertTrue(Math.abs(sum / judged - EXPECTED) < 0.01, "mean share " + sum / judged);
    }

    private static void count(
            Measurements truth,
            Measurements copy,
            List<String> ids,
            long seed,
            Map<String, int[]> counts) {
        for (String id : ids) {
            if (copy.measured(id).isPresent()) {
                Measurements.Interval68 interval = copy.interval68(id, seed).orElseThrow();
                double value = truth.measured(id).orElseThrow().value();
                int[] held = counts.computeIfAbsent(id, unseen -> new int[2]);
                held[0] += value >= interval.low() && value <= interval.high() ? 1 : 0;
                held[1]++;
            }
        }
    }
}
