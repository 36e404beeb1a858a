package emberline.measure;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.SharedSpectra;
import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measurement.Measured;
import emberline.measure.Measurements.Interval68;
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
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.TreeMap;
import org.apache.commons.rng.sampling.distribution.ZigguratSampler;
import org.apache.commons.rng.simple.RandomSource;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;

/**
 * Are the error bars right? Noise is added to ten real spectra, 500 times each, at a
 * signal-to-noise of 5 to 50 a pixel; the 68% interval of each feature must hold the value of the
 * spectrum without added noise in 66% to 70% of the cases. Every feature that is measured on a
 * spectrum is judged there.
 *
 * <p>Tolerance: a feature seen on one spectrum has 500 copies and a binomial error of 2.1%, one
 * seen on ten has 0.66%; where 3.5 of these errors are wider than 2%, they count. With {@code
 * -Demberline.copies=4000} no feature has an error above 0.74%, and all 147 hold 66.6% to 69.2%:
 * {@code emberline/measured/error-bars.csv}.
 */
@Tag("slow")
class ErrorBarsTest {

    private static final int COPIES = Integer.getInteger("emberline.copies", 500);
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

    private static PreparedSpectrum noisy(
            PreparedSpectrum truth, ZigguratSampler.NormalizedGaussian normal) {
        double[] flux = truth.spectrum().fluxes();
        for (int i = 0; i < flux.length; i++) {
            flux[i] += truth.spectrum().fluxSigma(i) * normal.sample();
        }
        return new PreparedSpectrum(
                truth.spectrum().withFluxes(flux, truth.spectrum().fluxSigmas()),
                truth.resolvingPower(),
                truth.noise(),
                List.of());
    }

    /** How often an interval was given, and how often it held the truth. */
    private static final class Tally {
        private int copies;
        private int given;
        private int held;
        private double leastSignal = Double.POSITIVE_INFINITY;

        void add(Tally other) {
            copies += other.copies;
            given += other.given;
            held += other.held;
            leastSignal = Math.min(leastSignal, other.leastSignal);
        }

        double share() {
            return (double) held / given;
        }

        double binomialError() {
            return Math.sqrt(EXPECTED * (1 - EXPECTED) / given);
        }
    }

    /** What happens on noisy copies to each feature that has a value without added noise. */
    private static Map<String, Tally> tallies(PreparedSpectrum truth, int copies, long seed) {
        FeatureCatalogue catalogue = FeatureCatalogue.standard();
        Measurements expected =
                new Measurer(catalogue, Measuring.withDefaults().withLeastContinuumSignal(0))
                        .measure(truth);
        Map<String, Tally> tallies = new TreeMap<>();
        for (FeatureMeasurement one : expected.all()) {
            if (one.result() instanceof Measured) {
                Tally tally = new Tally();
                tally.leastSignal = one.continuumSignal();
                tally.copies = copies;
                tallies.put(one.feature().id(), tally);
            }
        }
        Measurer measurer = new Measurer(catalogue, Measuring.withDefaults());
        ZigguratSampler.NormalizedGaussian normal =
                ZigguratSampler.NormalizedGaussian.of(
                        RandomSource.XO_RO_SHI_RO_128_PP.create(seed));
        for (int copy = 0; copy < copies; copy++) {
            Map<String, Interval68> intervals =
                    measurer.measure(noisy(truth, normal)).intervals68(copy);
            tallies.forEach(
                    (id, tally) -> {
                        Interval68 interval = intervals.get(id);
                        if (interval != null) {
                            double value = expected.measured(id).orElseThrow().value();
                            tally.given++;
                            tally.held +=
                                    value >= interval.low() && value <= interval.high() ? 1 : 0;
                        }
                    });
        }
        return tallies;
    }

    @Test
    void intervalsHoldTheTruthInTwoThirdsOfTheCases() throws Exception {
        List<PreparedSpectrum> spectra = tenSpectra(SharedSpectra.folder());
        Map<String, Tally> byFeature = new TreeMap<>();
        for (int k = 0; k < spectra.size(); k++) {
            PreparedSpectrum truth = truth(spectra.get(k), 5 * Math.pow(10, k / 9.0));
            tallies(truth, COPIES, 20 + k)
                    .forEach(
                            (id, tally) ->
                                    byFeature
                                            .computeIfAbsent(id, unseen -> new Tally())
                                            .add(tally));
        }
        write(byFeature);
        List<String> off = new ArrayList<>();
        double sum = 0;
        for (Map.Entry<String, Tally> entry : byFeature.entrySet()) {
            Tally tally = entry.getValue();
            sum += tally.share();
            boolean all = tally.given == tally.copies;
            double tolerance = Math.max(0.02, 3.5 * tally.binomialError());
            if (!all || !(Math.abs(tally.share() - EXPECTED) <= tolerance)) {
                off.add(entry.getKey() + " " + tally.share() + " of " + tally.given);
            }
        }
        int judged = byFeature.size();
        assertTrue(judged > 140, judged + " features judged");
        assertTrue(off.isEmpty(), judged + " features judged, off: " + off);
        assertTrue(Math.abs(sum / judged - EXPECTED) < 0.005, "mean share " + sum / judged);
    }

    private static void write(Map<String, Tally> byFeature) throws IOException {
        List<String> lines = new ArrayList<>();
        lines.add("feature,copies,held_share,binomial_error,least_continuum_signal");
        byFeature.forEach(
                (id, tally) ->
                        lines.add(
                                String.format(
                                        Locale.ROOT,
                                        "%s,%d,%.4f,%.4f,%.1f",
                                        id,
                                        tally.given,
                                        tally.share(),
                                        tally.binomialError(),
                                        tally.leastSignal)));
        Files.write(Path.of("target", "error-bars.csv"), lines);
    }

    /**
     * Where a continuum is faint: the ten spectra at a signal-to-noise of 0.35 to 3.5 a pixel. Of a
     * continuum of 5 sigma or more the intervals hold as they should; from 3 to 5 they hold
     * somewhat more, since copies with a continuum below 3 sigma have no interval. Below 3 most
     * copies are refused. Those that are not are the ones whose noise lifts the continuum, and
     * their intervals hold less than they say: that is the price of giving any number there. Still,
     * of all copies no more get a wrong interval than of a good spectrum.
     */
    @Test
    void faintContinuaAreRefusedOrWidened() throws Exception {
        List<PreparedSpectrum> spectra = tenSpectra(SharedSpectra.folder());
        double[] limits = {0, 2, 3, 5, 7, 15};
        Tally[] bySignal = new Tally[limits.length];
        Arrays.setAll(bySignal, k -> new Tally());
        for (int k = 0; k < spectra.size(); k++) {
            PreparedSpectrum truth = truth(spectra.get(k), 0.35 * Math.pow(10, k / 9.0));
            for (Tally tally : tallies(truth, 100, 40 + k).values()) {
                int bin = 0;
                while (bin + 1 < limits.length && tally.leastSignal >= limits[bin + 1]) {
                    bin++;
                }
                bySignal[bin].add(tally);
            }
        }
        for (Tally tally : bySignal) {
            String where =
                    String.format(
                            Locale.ROOT,
                            "continuum from %.1f sigma: %d copies, %d given, %d held",
                            tally.leastSignal,
                            tally.copies,
                            tally.given,
                            tally.held);
            // features of one spectrum share pixels, so that a binomial error would be too small
            assertTrue(tally.given - tally.held < 0.34 * tally.copies, where);
            if (tally.leastSignal >= 5) {
                assertTrue(tally.given > 0.97 * tally.copies, where);
                assertEquals(EXPECTED, tally.share(), 0.02, where);
            } else if (tally.leastSignal >= 3) {
                assertTrue(tally.share() > 0.68 && tally.share() < 0.74, where);
            } else {
                assertTrue(tally.given < 0.35 * tally.copies, where);
            }
        }
    }
}
